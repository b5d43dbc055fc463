import { chartDepartures } from './chart-departures'
import type { ChartHistory, ChartPoint, StoredSignal } from './chart-history'
import { chartValue } from './chart-value'
import { isCharted, type LotState } from './lot-state'
import { machineDepartures } from './machine-departures'
import { type RaisedSignal, reconcileSignals } from './reconcile-signals'
import type { LotSummaries } from './summarise-specimens'
import { targetOf } from './target-of'
import type { SignalRows } from './write-plan'
import type { LotWriteState, SpecimenState } from './write-state'

/** How the lot stands after the entries. */
export interface ChartedOutcome {
  readonly lotState: LotState
  readonly summaries: LotSummaries
  readonly specimens: readonly SpecimenState[]
  /** Whether any evaluation of the lot is another than before. */
  readonly changed: boolean
}

/** What the rules find on the charts that a lot belongs to: those of its product, and its machine’s over products. */
export function planSignals(state: LotWriteState, outcome: ChartedOutcome): readonly SignalRows[] {
  const charts = state.charts.map((chart) => withLot(state, chart, outcome))
  const touched = outcome.changed ? state.lot.id : undefined
  return [
    ...charts.flatMap((chart) => rowsOf(state, chart, chartDepartures(chart), chart.signals, touched)),
    ...machineRows(state, charts, touched),
  ]
}

/** A chart with the lot in its place, or without it while it is not charted. */
function withLot({ facts, lot }: LotWriteState, chart: ChartHistory, outcome: ChartedOutcome): ChartHistory {
  const others = chart.points.filter((point) => point.lotId !== lot.id)
  const value = chartValue(chart.statistic, outcome.summaries[chart.characteristic])
  if (value === undefined || !isCharted(outcome.lotState)) return { ...chart, points: others }
  const target = targetOf(facts.specification, chart.characteristic, chart.statistic)
  const point: ChartPoint = {
    lotId: lot.id,
    code: lot.code,
    madeAt: lot.madeAt,
    value,
    ...(target === undefined ? {} : { target }),
    ...(lot.machineId === null ? {} : { machineId: lot.machineId }),
    evaluatedAt: Math.max(...outcome.specimens.map((one) => one.evaluation?.at ?? 0)),
  }
  return { ...chart, points: [...others, point] }
}

type Chart = Pick<ChartHistory, 'characteristic' | 'statistic'>

const isSameChart = (a: Chart) => (b: Chart) =>
  a.characteristic === b.characteristic && a.statistic === b.statistic

function machineRows(
  state: LotWriteState,
  own: readonly ChartHistory[],
  touched: number | undefined,
): readonly SignalRows[] {
  const { lot, machine } = state
  if (!machine) return []
  return own.flatMap((chart) => {
    const others = machine.products.flatMap(({ charts, productId }) =>
      charts.filter(isSameChart(chart)).map((other) => ({ ...other, productId })),
    )
    const found = machineDepartures(machine.id, [{ ...chart, productId: lot.productId }, ...others])
    const stored = machine.signals.find(isSameChart(chart))?.signals ?? []
    return rowsOf(state, chart, found, stored, touched).map((rows) => ({ ...rows, machineId: machine.id }))
  })
}

function rowsOf(
  { lot }: LotWriteState,
  { characteristic, statistic }: Chart,
  found: readonly RaisedSignal[],
  stored: readonly StoredSignal[],
  touched: number | undefined,
): readonly SignalRows[] {
  const { raised, changed } = reconcileSignals(found, stored, touched)
  if (raised.length === 0 && changed.length === 0) return []
  return [{ productId: lot.productId, characteristic, statistic, raised, changed }]
}
