'use client'

import { type PointerEvent, type RefObject, useEffect, useRef, useState } from 'react'
import { clampWindow } from '@/lib/domain/charts/build-staff-chart'
import type { StaffLayout } from '@/lib/domain/charts/layout-staff-chart'
import { panReach, panWindow, zoomWindow } from '@/lib/domain/charts/pan-zoom'
import type { LotWindow, StaffChartInput } from '@/lib/domain/charts/staff-chart'
import { wideLayout } from '@/lib/domain/charts/wide-layout'

/** px before a press becomes a drag: a finger trembles more than a mouse. */
const THRESHOLD = { mouse: 4, pen: 6, touch: 8 } as const
/** A hand that rests so long, in ms, sees the chart drawn anew. */
const REST = 180
/** How much a notch of the wheel, or the pinch that a trackpad sends as one, zooms. */
const PER_WHEEL_PX = 0.004

interface Facts {
  readonly input: StaffChartInput
  readonly layout: StaffLayout
  readonly window: LotWindow
  /** The layout shows the window: nothing is still being drawn. */
  readonly settled: boolean
  readonly onWindow: (window: LotWindow) => void
}

interface Drag {
  readonly pointerId: number
  x0: number
  dx: number
  layer?: StaffLayout
}

interface Finger {
  readonly x: number
  readonly y: number
}

export interface PanZoom {
  /** On the element that holds the plot: for the wheel. */
  readonly box: RefObject<HTMLDivElement | null>
  readonly moved: RefObject<SVGGElement | null>
  /** The dragged layer, and the layout that it lies on. */
  readonly layer: { readonly layout: StaffLayout; readonly wide: StaffLayout } | undefined
  readonly down: (event: PointerEvent<HTMLElement>) => void
  /** True when the movement was a gesture and not a reading. */
  readonly move: (event: PointerEvent<HTMLElement>) => boolean
  readonly up: (event: PointerEvent<HTMLElement>) => void
  /** The click that ends a drag is none; asking forgets it. */
  readonly wasDragged: () => boolean
}

const distance = (a: Finger, b: Finger): number => Math.max(24, Math.hypot(a.x - b.x, a.y - b.y))

/**
 * Dragging pans, the wheel with ctrl (and a trackpad’s pinch) and two fingers zoom about where they are, the wheel
 * sideways pans. While dragged, a drawn layer is translated; it is drawn anew when the hand rests or lets go.
 */
export function usePanZoom(facts: Facts): PanZoom {
  const now = useRef(facts)
  now.current = facts
  const box = useRef<HTMLDivElement>(null)
  const moved = useRef<SVGGElement>(null)
  const drag = useRef<Drag | undefined>(undefined)
  const fingers = useRef(new Map<number, Finger>())
  const pinch = useRef<{ apart: number; window: LotWindow; anchor: number } | undefined>(undefined)
  const rest = useRef<ReturnType<typeof setTimeout> | undefined>(undefined)
  const dragged = useRef(false)
  const [layer, setLayer] = useState<PanZoom['layer']>()

  const indexAt = (clientX: number): number => {
    const left = box.current?.getBoundingClientRect().left ?? 0
    return now.current.layout.frame.indexAt(clientX - left)
  }
  const zoomTo = (from: LotWindow, factor: number, anchor: number): LotWindow => {
    const { layout, onWindow, window } = now.current
    const lotCount = layout.chart.lots.length
    const wanted = zoomWindow(from, factor, anchor, lotCount)
    const next = clampWindow(wanted, lotCount)
    if (next.from !== window.from || next.to !== window.to) onWindow(next)
    return wanted
  }
  /** Draws the chart anew where it was dragged to; the drag may go on from there. */
  const settle = (): void => {
    clearTimeout(rest.current)
    const { current } = drag
    if (!current?.layer) return
    const { window, onWindow, layout } = now.current
    const next = panWindow(layout, current.dx)
    current.layer = undefined
    // What the redrawn chart has moved is behind the hand; the rest of a lot's width is still to come.
    current.x0 += (layout.chart.window.from - next.from) * layout.frame.step
    current.dx = 0
    setLayer(undefined)
    if (next.from !== window.from || next.to !== window.to) onWindow(next)
  }
  const dragTo = (held: Drag, clientX: number): void => {
    const { layout, input, settled } = now.current
    if (!held.layer) {
      if (!settled) return
      held.layer = wideLayout(input, layout)
      setLayer({ layout, wide: held.layer })
    }
    const { older, newer } = panReach(layout)
    held.dx = Math.min(older, Math.max(-newer, clientX - held.x0))
    moved.current?.setAttribute('transform', `translate(${held.dx} 0)`)
    const { frame } = held.layer
    const [before, after] = [layout.frame.x - frame.x, frame.x + frame.w - layout.frame.x - layout.frame.w]
    clearTimeout(rest.current)
    const isOut = held.dx > Math.max(0, before) || -held.dx > Math.max(0, after)
    if (isOut && Math.abs(held.dx) >= frame.step) settle()
    else rest.current = setTimeout(settle, REST)
  }

  useEffect(() => () => clearTimeout(rest.current), [])

  // A layer that has just been put on the page stands where the hand is by now.
  useEffect(() => {
    if (layer && drag.current) moved.current?.setAttribute('transform', `translate(${drag.current.dx} 0)`)
  }, [layer])

  // React listens to the wheel without the right to keep the page from zooming.
  useEffect(() => {
    const element = box.current
    if (!element) return
    let held: { window: LotWindow; at: number; left: number } | undefined
    const wheel = (event: WheelEvent): void => {
      const { layout, window, onWindow } = now.current
      const unit = event.deltaMode === 1 ? 16 : event.deltaMode === 2 ? 400 : 1
      const sideways = event.shiftKey && event.deltaX === 0 ? event.deltaY : event.deltaX
      const fresh = !held || event.timeStamp - held.at > 300
      const from = held && !fresh ? held : { window, at: 0, left: 0 }
      if (event.ctrlKey || event.metaKey) {
        event.preventDefault()
        const factor = Math.exp(Math.max(-120, Math.min(120, event.deltaY * unit)) * PER_WHEEL_PX)
        held = {
          window: zoomTo(from.window, factor, indexAt(event.clientX)),
          at: event.timeStamp,
          left: 0,
        }
      } else if (Math.abs(sideways) > Math.abs(event.shiftKey ? 0 : event.deltaY)) {
        event.preventDefault()
        const left = from.left + sideways * unit
        const next = panWindow(layout, -left)
        const isMoved = next.from !== window.from || next.to !== window.to
        held = { window: next, at: event.timeStamp, left: isMoved ? 0 : left }
        if (isMoved) onWindow(next)
      }
    }
    // Notes are links, which a browser would drag off as addresses.
    const stay = (event: Event): void => event.preventDefault()
    element.addEventListener('wheel', wheel, { passive: false })
    element.addEventListener('dragstart', stay)
    return () => {
      element.removeEventListener('wheel', wheel)
      element.removeEventListener('dragstart', stay)
    }
  })

  const up = (event: PointerEvent<HTMLElement>): void => {
    fingers.current.delete(event.pointerId)
    if (fingers.current.size < 2) pinch.current = undefined
    if (drag.current?.pointerId !== event.pointerId) return
    settle()
    drag.current = undefined
  }

  return {
    box,
    moved,
    layer,
    up,
    down(event) {
      dragged.current = false
      if (event.pointerType === 'mouse' && event.button !== 0) return
      fingers.current.set(event.pointerId, { x: event.clientX, y: event.clientY })
      const [one, other] = [...fingers.current.values()]
      if (one && other) {
        settle()
        drag.current = undefined
        dragged.current = true
        const middle = indexAt((one.x + other.x) / 2)
        pinch.current = { apart: distance(one, other), window: now.current.window, anchor: middle }
      } else drag.current = { pointerId: event.pointerId, x0: event.clientX, dx: 0 }
    },
    move(event) {
      if (fingers.current.has(event.pointerId))
        fingers.current.set(event.pointerId, { x: event.clientX, y: event.clientY })
      const [one, other] = [...fingers.current.values()]
      if (pinch.current && one && other) {
        zoomTo(pinch.current.window, pinch.current.apart / distance(one, other), pinch.current.anchor)
        return true
      }
      const held = drag.current
      if (held?.pointerId !== event.pointerId) return false
      // A button let go outside the window was never heard of.
      if (event.pointerType === 'mouse' && event.buttons === 0) {
        up(event)
        return false
      }
      if (!dragged.current) {
        const kind =
          event.pointerType === 'touch' || event.pointerType === 'pen' ? event.pointerType : 'mouse'
        if (Math.abs(event.clientX - held.x0) < THRESHOLD[kind]) return false
        dragged.current = true
        event.currentTarget.setPointerCapture?.(event.pointerId)
      }
      dragTo(held, event.clientX)
      return true
    },
    wasDragged() {
      const { current } = dragged
      dragged.current = false
      return current
    },
  }
}
