import { COVERAGE_FACTOR } from '../metrology/closure'
import type { Known } from '../metrology/evaluation'

/** A value against its tolerance, with its uncertainty taken seriously. */
export type Conformity = 'inside' | 'not proven' | 'outside'

/** Either side may be missing: a one-sided tolerance. */
export interface Limits {
  readonly lower?: number
  readonly upper?: number
}

/**
 * Inside when the value is inside the tolerance by at least the guard band r·U; outside when it is beyond
 * the tolerance by more than that; not proven in between. With r = 0 the tolerance alone decides. A value
 * on a boundary belongs to the inner zone.
 *
 * Source: ISO 14253-1 (proving conformity and non-conformity), JCGM 106:2012, 8.3 (guarded acceptance).
 */
export function judgeSpecimen(value: Known, limits: Limits, guardFactor: 0 | 1): Conformity {
  const guard = guardFactor * COVERAGE_FACTOR * value.u
  const room = roomToLimits(value.value, limits)
  if (room >= guard) return 'inside'
  return room < -guard ? 'outside' : 'not proven'
}

/** Distance to the nearer limit, positive inside; infinite without limits. */
export function roomToLimits(value: number, limits: Limits): number {
  const below = limits.lower === undefined ? Number.POSITIVE_INFINITY : value - limits.lower
  const above = limits.upper === undefined ? Number.POSITIVE_INFINITY : limits.upper - value
  return Math.min(below, above)
}
