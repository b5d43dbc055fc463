import { exp, ln } from '../units/elementary'
import { lnPoissonWeight } from './incomplete-gamma'
import { integrateLogConcave } from './integrate-log-concave'
import { normalCdf, normalUpperTail } from './normal'
import { lnNormalCdf } from './normal-density'
import { lowerProbability, realQuantile } from './quantile-from-tails'
import type { Tails } from './tails'

/**
 * Both tails of noncentral t, T = (Z + δ)/√(χ²/df), df ≥ 1 (Infinity: normal about δ). P(T ≤ t) is
 * ∫ f(s) Φ(ts − δ) ds over s = √(χ²/df) with f its density; each tail is integrated on its own where its
 * logarithm is within e^−45 of the peak, so that far tails and any noncentrality keep their digits. Central to
 * tolerance intervals and acceptance constants. Throws a RangeError for df below 1.
 *
 * Source: definition (N. L. Johnson, B. L. Welch, Biometrika 31 (1940) 362); Gauss–Legendre panels.
 */
export function noncentralTTails(t: number, df: number, delta: number): Tails {
  if (!(df >= 1)) throw new RangeError(`noncentral t with ${df} degrees of freedom`)
  if (df === Number.POSITIVE_INFINITY)
    return { lower: normalCdf(t - delta), upper: normalUpperTail(t - delta) }
  if (t === 0) return { lower: normalUpperTail(delta), upper: normalCdf(delta) }
  const a = df / 2
  const lnDensity = (s: number) => ln(df / s) + lnPoissonWeight(a, a * s * s)
  // Φ(ts − δ) turns from 0 to 1 within these places: panels get short there.
  const turns = [(delta - 9) / t, (delta + 9) / t]
  const lower = exp(integrateLogConcave((s) => lnDensity(s) + lnNormalCdf(t * s - delta), turns))
  const upper = exp(integrateLogConcave((s) => lnDensity(s) + lnNormalCdf(delta - t * s), turns))
  // The smaller of the two is the one that counts.
  return lower < upper ? { lower, upper: 1 - lower } : { lower: 1 - upper, upper }
}

/** t with P(T ≤ t) = p. Throws a RangeError unless 0 < p < 1. */
export const noncentralTQuantile = (p: number, df: number, delta: number): number =>
  realQuantile((t) => noncentralTTails(t, df, delta), lowerProbability(p), delta, 1)
