import { findSignals } from '../control/find-signals'
import type { RulePoint } from '../control/rule-point'
import { isAsked } from './chart-departures'
import {
  type ChartHistory,
  type ChartPoint,
  type FrozenLimits,
  inChartOrder,
  limitsAt,
  targetShift,
} from './chart-history'
import type { RaisedSignal } from './reconcile-signals'

/** A charted lot in standard deviations of its own product from that product's centre line. */
export interface StandardisedPoint extends ChartPoint {
  readonly productId: number
  readonly set: FrozenLimits
  /** (value − centre) / σ of the limit set in force when it was made, moved along with its target. */
  readonly z: number
  readonly leftOut: boolean
}

/** One chart of each product that a machine makes: same characteristic, same statistic. */
export type ProductChart = Pick<ChartHistory, 'points' | 'limitSets'> & { readonly productId: number }

/**
 * Lots of one machine over all its products on one scale, in chart order; lots without a limit set in force
 * have no place on it. Source: ISO 7870-8 (short runs: each value from its product's centre, in its product's σ).
 */
export function standardisedPoints(
  machineId: number,
  charts: readonly ProductChart[],
): readonly StandardisedPoint[] {
  return charts
    .flatMap(({ limitSets, points, productId }) =>
      points.flatMap((point): StandardisedPoint[] => {
        const set = point.machineId === machineId ? limitsAt(limitSets, point.madeAt) : undefined
        if (!set || !(set.sigma > 0)) return []
        const z = (point.value - (set.centre + targetShift(set, point))) / set.sigma
        return [{ ...point, productId, set, z, leftOut: set.leftOut.includes(point.lotId) }]
      }),
    )
    .sort(inChartOrder)
}

/**
 * What the rules find on a machine's chart beyond what its products' charts find: runs that lots of several
 * products make together. A lot beyond its limits is its product's own signal, and so is a run within one
 * product: one event has one signal. `departure` is in σ.
 */
export function machineDepartures(
  machineId: number,
  charts: readonly ProductChart[],
): readonly RaisedSignal[] {
  // Runs of one product are that product's own; most machines are asked for nothing more.
  if (charts.filter(({ limitSets, points }) => limitSets.length > 0 && points.length > 0).length < 2)
    return []
  const points = standardisedPoints(machineId, charts)
  const rulePoints = points.map(
    ({ leftOut, set, z }): RulePoint => ({
      // A product whose lots follow each other is not asked for runs: it makes and ends none.
      value: isAsked(set, 'nine-on-one-side') ? z : undefined,
      leftOut,
      limits: { id: machineId, centre: 0, sigma: 1 },
    }),
  )
  return findSignals(rulePoints, ['nine-on-one-side']).flatMap((signal): RaisedSignal[] => {
    const members = signal.members.flatMap((index) => points[index] ?? [])
    const completedBy = points[signal.completedAt]
    if (!completedBy || new Set(members.map((one) => one.productId)).size < 2) return []
    return [
      {
        limitSetId: completedBy.set.id,
        rule: signal.rule,
        side: signal.side,
        lotId: completedBy.lotId,
        productId: completedBy.productId,
        members: members.map((one) => one.lotId),
        departure: signal.departure,
        raisedAt: Math.max(...members.flatMap((one) => [one.set.frozenAt, one.evaluatedAt])),
      },
    ]
  })
}
