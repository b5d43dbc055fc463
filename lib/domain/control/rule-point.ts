/** Limits as a rule sees them. One-sided characteristics have no lower limit. */
export interface RuleLimits {
  /** Points under different ids never belong to one run. */
  readonly id: number
  readonly centre: number
  readonly sigma: number
  readonly lower?: number
  readonly upper?: number
}

/** One lot on a chart, in chart order. */
export interface RulePoint {
  /** Undefined for a lot without a value: it neither makes nor ends a run. */
  readonly value: number | undefined
  /** Left out of the baseline with a reason: ends every run and raises nothing. */
  readonly leftOut: boolean
  /** Undefined while no limit set holds: nothing is judged. */
  readonly limits: RuleLimits | undefined
}

export type Side = 'above' | 'below'

/** One event: the pattern's members as indices in chart order, and the index that completed it. */
export interface RuleEvent {
  readonly side: Side
  readonly members: readonly number[]
  readonly completedAt: number
}

/**
 * Comparisons with a zone boundary allow 1e-9 σ, so that a value on the boundary belongs to the inner zone
 * whatever its last binary digit says: on a 0.1 grid with centre 10.1 and σ 0.1, 10.4 is on the limit.
 */
export const GUARD = 1e-9
