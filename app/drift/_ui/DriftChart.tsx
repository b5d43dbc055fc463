'use client'

import dynamic from 'next/dynamic'
import Link from 'next/link'
import { useRouter } from 'next/navigation'
import { useState } from 'react'
import { clampWindow, newestWindow } from '@/lib/domain/charts/build-staff-chart'
import { lotHref } from '@/lib/domain/charts/draw-notes'
import type { LotWindow, StaffChartInput } from '@/lib/domain/charts/staff-chart'
import type { DriftOrder } from '@/lib/input/drift-view'
import { type DriftSubject, driftAddress, driftParameters } from './drift-address'

// The drawing of charts is a large part of the script: it comes after the page stands.
const StaffChart = dynamic(() => import('@/app/_ui/charts/StaffChart').then((part) => part.StaffChart), {
  ssr: false,
  loading: () => <div className="drift-waits">The chart is being drawn.</div>,
})

interface Props {
  readonly subject: DriftSubject
  readonly input: StaffChartInput
  /** Staves as the address names them; empty for the usual ones. */
  readonly staves: string
  readonly order: DriftOrder
  /** The lot that somebody followed here. */
  readonly lot?: string
}

/** Opens around the lot that was followed, else on what the address names, else on the newest lots. */
function startOf(input: StaffChartInput, pointer: number): LotWindow {
  const open = input.window ?? newestWindow(input.lots.length)
  if (pointer < 0 || input.window || (pointer >= open.from && pointer <= open.to)) return open
  const half = Math.floor((open.to - open.from) / 2)
  return clampWindow({ from: pointer - half, to: pointer + half }, input.lots.length)
}

/** The chart, and the files of what it shows. What is shown stands in the address, so that it can be sent on. */
export function DriftChart({ subject, input, staves, order, lot }: Props) {
  const router = useRouter()
  const followed = input.lots.findIndex((one) => one.code === lot)
  const [window, setWindow] = useState<LotWindow>(() => startOf(input, followed))
  const [pointer, setPointer] = useState<number | undefined>(followed < 0 ? undefined : followed)
  const first = input.lots[window.from]?.code
  const last = input.lots[window.to]?.code

  const keep = (next: LotWindow): void => {
    setWindow(next)
    const address = driftAddress(subject, {
      staves,
      order,
      from: input.lots[next.from]?.code,
      to: input.lots[next.to]?.code,
    })
    globalThis.history.replaceState(globalThis.history.state, '', address)
  }
  const follow = (signal: string): void => {
    const place = document.getElementById(`signal-${signal}`)
    place?.scrollIntoView({ block: 'nearest' })
    place?.focus({ preventScroll: true })
  }
  const file = (format: string): string => {
    const parameters = driftParameters(subject, { staves, order, from: first, to: last })
    parameters.delete(subject.kind)
    const whose = subject.kind === 'machine' ? 'machines/' : ''
    return `/api/v1/drift/${whose}${encodeURIComponent(subject.code)}/${format}?${parameters}`
  }

  return (
    <>
      <StaffChart
        input={input}
        window={window}
        onWindow={keep}
        pointer={pointer}
        onPointer={setPointer}
        onOpen={(code) => router.push(lotHref(code))}
        onSignal={follow}
      />
      {first === undefined ? null : (
        <p className="drift-files no-print">
          <span>Save {first === last ? first : `${first} to ${last}`} as</span>
          {/* Files, not pages: the browser takes them itself. */}
          <a href={file('svg')} download>
            drawing (SVG)
          </a>
          <a href={file('png')} download>
            picture (PNG)
          </a>
          <a href={file('pdf')} download>
            document (PDF)
          </a>
          <a href={file('csv')} download>
            data (CSV)
          </a>
          {pointer === undefined || !input.lots[pointer] ? null : (
            <Link href={lotHref(input.lots[pointer].code)}>Open {input.lots[pointer].code}</Link>
          )}
        </p>
      )}
    </>
  )
}
