import { exp } from '../units/elementary'
import { integrate } from './gauss-legendre'
import { lnPoissonWeight } from './incomplete-gamma'
import { lowerProbability, positiveQuantile } from './quantile-from-tails'
import { relativeRangeCdf, relativeRangeUpperTail } from './relative-range'
import type { Tails } from './tails'

/**
 * Both tails of the studentized range of k normal values with df degrees of freedom of the standard deviation
 * (Infinity: σ known): the relative range averaged over S = √(χ²/df). Throws a RangeError for k below 2.
 * Source: definition; H. L. Harter, Ann. Math. Statist. 31 (1960) 1122.
 */
export function studentizedRangeTails(q: number, k: number, df: number): Tails {
  if (df === Number.POSITIVE_INFINITY)
    return { lower: relativeRangeCdf(q, k), upper: relativeRangeUpperTail(q, k) }
  if (!(df > 0)) throw new RangeError(`studentized range with ${df} degrees of freedom`)
  const a = df / 2
  const density = (s: number) => (df / s) * exp(lnPoissonWeight(a, a * s * s))
  const reach = 8 / Math.sqrt(2 * df)
  const from = Math.max(0, 1 - reach)
  const over = (f: (x: number) => number) => integrate((s) => density(s) * f(q * s), from, 1 + reach, 8)
  return {
    lower: over((w) => relativeRangeCdf(w, k)),
    upper: over((w) => relativeRangeUpperTail(w, k)),
  }
}

/** q with P(Q ≤ q) = p. */
export const studentizedRangeQuantile = (p: number, k: number, df: number): number =>
  positiveQuantile((q) => studentizedRangeTails(q, k, df), lowerProbability(p), 3)
