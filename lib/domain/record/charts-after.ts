import { characteristicIds } from '../metrology/characteristics'
import type { ChartHistory, ChartPoint, StoredSignal } from './chart-history'
import { chartValue } from './chart-value'
import { isCharted } from './lot-state'
import type { RaisedSignal, SignalChange } from './reconcile-signals'
import type { LotSummaries } from './summarise-specimens'
import { targetOf } from './target-of'
import type { SignalRows, SpecimenWritePlan } from './write-plan'
import type { LotWriteState, MachineSignals } from './write-state'

/** Gives the next free id of a signal that is raised. */
export type SignalId = (raised: RaisedSignal) => number

/**
 * The charts of a lot's product as the store would read them back after the plan was stored: the lot in its new
 * place, signals as they have become. Whoever stores many lots one after the other plans the next one on these.
 */
export function chartsAfter(
  state: LotWriteState,
  plan: SpecimenWritePlan,
  signalId: SignalId,
): readonly ChartHistory[] {
  return state.charts.map((chart) => {
    const point = pointAfter(state, chart, plan)
    const others = chart.points.filter((one) => one.lotId !== state.lot.id)
    const rows = plan.signals.find(
      (one) =>
        one.machineId === undefined &&
        one.characteristic === chart.characteristic &&
        one.statistic === chart.statistic,
    )
    return {
      ...chart,
      points: point ? [...others, point] : others,
      signals: rows ? signalsAfter(chart.signals, rows, signalId) : chart.signals,
    }
  })
}

/** The signals of the machine's own charts after the plan was stored. */
export function machineSignalsAfter(
  machine: NonNullable<LotWriteState['machine']>,
  plan: SpecimenWritePlan,
  signalId: SignalId,
): readonly MachineSignals[] {
  const rows = plan.signals.filter((one) => one.machineId === machine.id)
  const isOf = (a: Pick<SignalRows, 'characteristic' | 'statistic'>) => (b: typeof a) =>
    a.characteristic === b.characteristic && a.statistic === b.statistic
  const known = machine.signals.map((chart) => {
    const own = rows.find(isOf(chart))
    return own ? { ...chart, signals: signalsAfter(chart.signals, own, signalId) } : chart
  })
  const fresh = rows
    .filter((one) => !machine.signals.some(isOf(one)))
    .map(({ changed, characteristic, raised, statistic }) => ({
      characteristic,
      statistic,
      signals: signalsAfter([], { changed, raised }, signalId),
    }))
  return [...known, ...fresh]
}

function pointAfter(
  { facts, lot }: LotWriteState,
  { characteristic, points, statistic }: ChartHistory,
  plan: SpecimenWritePlan,
): ChartPoint | undefined {
  const summaries: LotSummaries = Object.fromEntries(
    characteristicIds.flatMap((id) => {
      const row = plan.summaries.find((one) => one.characteristic === id)
      return row ? [[id, row]] : []
    }),
  )
  const value = chartValue(statistic, summaries[characteristic])
  if (value === undefined || !isCharted(plan.lot.state)) return undefined
  const target = targetOf(facts.specification, characteristic, statistic)
  const before = points.find((one) => one.lotId === lot.id)?.evaluatedAt ?? 0
  return {
    lotId: lot.id,
    code: lot.code,
    madeAt: lot.madeAt,
    value,
    ...(target === undefined ? {} : { target }),
    ...(lot.machineId === null ? {} : { machineId: lot.machineId }),
    evaluatedAt: Math.max(before, ...plan.evaluations.map((one) => one.at)),
  }
}

function signalsAfter(
  before: readonly StoredSignal[],
  { changed, raised }: Pick<SignalRows, 'changed' | 'raised'>,
  signalId: SignalId,
): readonly StoredSignal[] {
  const changes = new Map(changed.map((one): [number, SignalChange] => [one.id, one]))
  return [
    ...before.map((signal) => ({ ...signal, ...changes.get(signal.id) })),
    ...raised.map(
      (one): StoredSignal => ({
        ...one,
        id: signalId(one),
        state: 'open',
        answered: false,
        evidenceChanged: false,
      }),
    ),
  ]
}
