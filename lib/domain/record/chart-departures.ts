import { findSignals } from '../control/find-signals'
import type { RulePoint } from '../control/rule-point'
import { type ChartHistory, type FrozenLimits, inChartOrder, limitsAt } from './chart-history'
import type { RaisedSignal } from './reconcile-signals'

/**
 * What the rules find on one chart, each lot judged by the limit set in force when it was made. A pattern is
 * dated by what it rests on: the newest evaluation among its lots, or the freezing of its limit set, whichever
 * came later; so the same readings give the same signals whenever they are asked for.
 */
export function chartDepartures(
  history: Pick<ChartHistory, 'points' | 'limitSets'>,
): readonly RaisedSignal[] {
  const points = [...history.points].sort(inChartOrder)
  const limits = points.map((point) => limitsAt(history.limitSets, point.madeAt))
  const rulePoints = points.map(
    (point, index): RulePoint => ({
      value: point.value,
      leftOut: limits[index]?.leftOut.includes(point.lotId) ?? false,
      limits: limits[index],
    }),
  )
  return findSignals(rulePoints).flatMap((signal): RaisedSignal[] => {
    const members = signal.members.flatMap((index) => points[index] ?? [])
    const completedBy = points[signal.completedAt]
    const set: FrozenLimits | undefined = limits[signal.completedAt]
    if (!completedBy || !set) return []
    return [
      {
        limitSetId: set.id,
        rule: signal.rule,
        side: signal.side,
        lotId: completedBy.lotId,
        members: members.map((one) => one.lotId),
        departure: signal.departure,
        raisedAt: Math.max(set.frozenAt, ...members.map((one) => one.evaluatedAt)),
      },
    ]
  })
}
