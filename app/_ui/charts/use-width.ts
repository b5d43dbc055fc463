'use client'

import { type RefObject, useLayoutEffect, useRef, useState } from 'react'

/** Width of an element in whole px, following it; undefined until it stands on the page. */
export function useWidth<T extends HTMLElement>(): readonly [RefObject<T | null>, number | undefined] {
  const ref = useRef<T>(null)
  const [width, setWidth] = useState<number>()
  useLayoutEffect(() => {
    const element = ref.current
    if (!element) return
    const measure = (): void => setWidth(Math.floor(element.clientWidth) || undefined)
    measure()
    const observer = new ResizeObserver(measure)
    observer.observe(element)
    return () => observer.disconnect()
  }, [])
  return [ref, width]
}
