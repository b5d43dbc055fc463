import type { ReactNode } from 'react'
import type { Actor } from '@/lib/access/actor'
import { may } from '@/lib/access/permit'
import type { StaffChartInput } from '@/lib/domain/charts/staff-chart'
import { parseOrder, parseStaves } from '@/lib/input/drift-view'
import type { SignalView } from '@/lib/services/signal-views'
import { DriftChart } from './DriftChart'
import { type DriftSubject, driftAddress, stavesParameter } from './drift-address'
import { SignalList } from './SignalList'

interface ChartAndSignalsProps {
  readonly actor: Actor
  readonly subject: DriftSubject
  readonly chart: StaffChartInput
  readonly query: Readonly<Record<string, string | undefined>>
  readonly signals: readonly SignalView[]
  readonly timeZone: string
  /** Under the chart. */
  readonly children: ReactNode
}

/** A chart with its signals beside it, and what belongs under it. */
export function ChartAndSignals({
  actor,
  chart,
  children,
  query,
  signals,
  subject,
  timeZone,
}: ChartAndSignalsProps) {
  const charts = parseStaves(query.staves)
  const order = parseOrder(query.order)
  const staves = stavesParameter(charts)
  return (
    <div className="columns drift-columns">
      <div>
        {/* Another chart, other staves, another order start anew. */}
        <DriftChart
          key={`${subject.kind} ${subject.code} ${staves} ${order} ${query.lot ?? ''}`}
          subject={subject}
          input={withWindow(chart, query.from, query.to)}
          staves={staves}
          order={order}
          lot={query.lot}
        />
        {children}
      </div>
      <aside>
        <SignalList
          signals={signals}
          timeZone={timeZone}
          mayAnswer={may(actor, 'signals.answer')}
          onChart={(lot) => driftAddress(subject, { staves, order, lot })}
        />
      </aside>
    </div>
  )
}

/** Lots named in the address, where there are such lots. */
function withWindow(
  chart: StaffChartInput,
  from: string | undefined,
  to: string | undefined,
): StaffChartInput {
  const placeOf = (code: string | undefined): number => chart.lots.findIndex((lot) => lot.code === code)
  const window = { from: placeOf(from), to: placeOf(to) }
  return window.from >= 0 && window.to >= window.from ? { ...chart, window } : chart
}
