import { COVERAGE_FACTOR } from './closure'

export interface RouteConsistency {
  /** Difference over its standard uncertainty: beyond 2 a warning, beyond 3 action. */
  readonly zeta: number
  /** Difference over its expanded uncertainty U = 2u: at most 1 agrees. */
  readonly normalisedError: number
}

/**
 * Whether two results for one quantity agree: ζ = (x₁ − x₂)/√(u₁² + u₂² − 2 r u₁ u₂), E_n = ζ/2.
 * x₁, x₂ with standard uncertainties u₁, u₂ in one unit; r correlation of the two, 0 where they share nothing.
 * Throws a RangeError when the difference has no uncertainty.
 * Source: ISO 13528:2015, 9.6 (zeta scores); ISO/IEC 17043:2010, B.3.1.3 (E_n, expanded uncertainties).
 */
export function routeConsistency(
  one: { readonly value: number; readonly u: number },
  other: { readonly value: number; readonly u: number },
  correlation = 0,
): RouteConsistency {
  const variance = one.u * one.u + other.u * other.u - 2 * correlation * one.u * other.u
  if (!(variance > 0)) throw new RangeError(`difference with variance ${variance}`)
  const zeta = (one.value - other.value) / Math.sqrt(variance)
  return { zeta, normalisedError: zeta / COVERAGE_FACTOR }
}
