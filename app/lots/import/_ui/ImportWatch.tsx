'use client'

import { useRouter } from 'next/navigation'
import { useEffect, useState } from 'react'
import { timeLeft } from './time-left'

interface Progress {
  readonly state: string
  readonly rowsDone: number
  readonly rowCount?: number
  readonly rowsPerSecond?: number
}

interface Props {
  readonly id: number
  readonly first: Progress
}

const EVERY = 1000

/** How far a run is, how fast, and how long it will take; the page is read anew when it has ended. */
export function ImportWatch({ id, first }: Props) {
  const router = useRouter()
  const [progress, setProgress] = useState(first)
  useEffect(() => {
    let gone = false
    const timer = setInterval(async () => {
      const reply = await fetch(`/api/v1/imports/${id}`).catch(() => undefined)
      if (gone || !reply?.ok) return
      const next = (await reply.json()) as Progress
      setProgress(next)
      if (next.state !== first.state) router.refresh()
    }, EVERY)
    return () => {
      gone = true
      clearInterval(timer)
    }
  }, [id, first.state, router])
  const { rowCount, rowsDone, rowsPerSecond } = progress
  const left = timeLeft(rowCount, rowsDone, rowsPerSecond)
  return (
    <div className="import-progress">
      <progress value={rowsDone} max={rowCount ?? undefined} aria-label="Rows dealt with" />
      <p role="status">
        {rowCount === undefined ? 'The rows are being counted.' : `${rowsDone} of ${rowCount} rows`}
        {rowsPerSecond ? `, ${Math.round(rowsPerSecond)} rows a second` : ''}
        {left ? `, ${left} left` : ''}
      </p>
    </div>
  )
}
