'use client'

import { useRouter } from 'next/navigation'
import { useEffect } from 'react'
import { PageHead } from '@/app/_ui/shell/PageHead'

const every_ms = 1000

/** Asks the server each second how far the demo is; the page leads on by itself when it is in. */
export function DemoProgress({ line }: { readonly line: string }) {
  const router = useRouter()
  useEffect(() => {
    const timer = setInterval(() => router.refresh(), every_ms)
    return () => clearInterval(timer)
  }, [router])
  return (
    <>
      <PageHead
        title="The demo works is being made"
        under="Every reading goes through the same checks as yours will."
      />
      <p className="waiting" role="status">
        {line || 'One moment …'}
      </p>
    </>
  )
}
