import type { ControlRule } from '../control/find-signals'
import type { Side } from '../control/rule-point'
import type { CharacteristicId } from '../metrology/characteristics'

/** What of a lot is charted: its mean, or the spread of its specimens. */
export const chartedStatistics = ['mean', 'within-lot-sd'] as const

export type ChartedStatistic = (typeof chartedStatistics)[number]

export interface ChartPoint {
  readonly lotId: number
  readonly code: string
  /** Epoch milliseconds. */
  readonly madeAt: number
  readonly value: number
  /** What the specification asks of this lot, where it asks for a target; SI. */
  readonly target?: number
  readonly machineId?: number
  /** When the newest of the evaluations that the value rests on was made, epoch milliseconds. */
  readonly evaluatedAt: number
}

/** A frozen limit set, as the rules need it. */
export interface FrozenLimits {
  readonly id: number
  readonly number: number
  readonly centre: number
  readonly sigma: number
  readonly lower?: number
  readonly upper?: number
  /** Epoch milliseconds; the set holds for lots made from then on, until a later set does. */
  readonly effectiveFrom: number
  readonly frozenAt: number
  /** Lots that were left out of the baseline, each for a reason. */
  readonly leftOut: readonly number[]
  /** What the specification asked for when the baseline was made, SI. */
  readonly target?: number
  /** Rules that are asked; all of them when not said. */
  readonly rules?: readonly ControlRule[]
}

/** A pattern that a rule finds on a chart. */
export interface Departure {
  readonly limitSetId: number
  readonly rule: ControlRule
  readonly side: Side
  /** The lot that completed the pattern. */
  readonly lotId: number
  /** All lots of the pattern, in chart order. */
  readonly members: readonly number[]
  /** Mean distance of the members from the centre: SI; over several products in σ. */
  readonly departure: number
}

/** A signal as it is kept. */
export interface StoredSignal extends Departure {
  readonly id: number
  readonly state: 'open' | 'answered' | 'no-longer-holds'
  readonly answered: boolean
  readonly evidenceChanged: boolean
  readonly raisedAt: number
}

/** One chart of a product: everything that its rules and its signals rest on. */
export interface ChartHistory {
  readonly characteristic: CharacteristicId
  readonly statistic: ChartedStatistic
  /** Charted lots in any order. */
  readonly points: readonly ChartPoint[]
  readonly limitSets: readonly FrozenLimits[]
  readonly signals: readonly StoredSignal[]
}

/**
 * How far the limits of a set lie off for a lot, SI: a target that a specification moved takes centre and limits
 * along, as the process is set to the new one; its spread stays. Nothing where either has no target.
 */
export const targetShift = (set: Pick<FrozenLimits, 'target'>, lot: Pick<ChartPoint, 'target'>): number =>
  set.target === undefined || lot.target === undefined ? 0 : lot.target - set.target

/** Chart order: time made, then code by UTF-16 code units, alike on every engine. */
export const inChartOrder = (
  a: Pick<ChartPoint, 'madeAt' | 'code'>,
  b: Pick<ChartPoint, 'madeAt' | 'code'>,
): number => a.madeAt - b.madeAt || (a.code < b.code ? -1 : a.code > b.code ? 1 : 0)

/** The limit set that a lot made at this time is judged by: of those in force by then the newest. */
export const limitsAt = (sets: readonly FrozenLimits[], madeAt: number): FrozenLimits | undefined => {
  let newest: FrozenLimits | undefined
  for (const set of sets)
    if (set.effectiveFrom <= madeAt && (newest === undefined || set.number > newest.number)) newest = set
  return newest
}
