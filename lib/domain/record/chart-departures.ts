import { type ControlRule, controlRules, findSignals } from '../control/find-signals'
import type { RuleLimits, RulePoint } from '../control/rule-point'
import {
  type ChartHistory,
  type ChartPoint,
  type FrozenLimits,
  inChartOrder,
  limitsAt,
  targetShift,
} from './chart-history'
import type { RaisedSignal } from './reconcile-signals'

/** The limits of a set as they stand for one lot: moved along with a target that was moved. */
export function limitsFor(set: FrozenLimits, lot: Pick<ChartPoint, 'target'>): RuleLimits {
  const { id, sigma } = set
  const shift = targetShift(set, lot)
  return {
    id,
    sigma,
    centre: set.centre + shift,
    ...(set.lower === undefined ? {} : { lower: set.lower + shift }),
    ...(set.upper === undefined ? {} : { upper: set.upper + shift }),
  }
}

/** Whether a rule is asked of lots under this set. */
export const isAsked = ({ rules }: Pick<FrozenLimits, 'rules'>, rule: ControlRule): boolean =>
  rules?.includes(rule) ?? true

/**
 * What the rules find on one chart, each lot judged by the limit set in force when it was made. A pattern is
 * dated by what it rests on: the newest evaluation among its lots, or the freezing of its limit set, whichever
 * came later; so the same readings give the same signals whenever they are asked for.
 */
export function chartDepartures(
  history: Pick<ChartHistory, 'points' | 'limitSets'>,
): readonly RaisedSignal[] {
  const points = [...history.points].sort(inChartOrder)
  const sets = points.map((point) => limitsAt(history.limitSets, point.madeAt))
  const asked = (Object.keys(controlRules) as ControlRule[]).filter((rule) =>
    history.limitSets.some((set) => isAsked(set, rule)),
  )
  const rulePoints = points.map((point, index): RulePoint => {
    const set = sets[index]
    return {
      value: point.value,
      leftOut: set?.leftOut.includes(point.lotId) ?? false,
      limits: set && limitsFor(set, point),
    }
  })
  return findSignals(rulePoints, asked).flatMap((signal): RaisedSignal[] => {
    const members = signal.members.flatMap((index) => points[index] ?? [])
    const completedBy = points[signal.completedAt]
    const set = sets[signal.completedAt]
    if (!completedBy || !set || !isAsked(set, signal.rule)) return []
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
