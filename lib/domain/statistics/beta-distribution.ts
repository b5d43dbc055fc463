import { incompleteBeta } from './incomplete-beta'
import { lowerProbability, unitQuantile } from './quantile-from-tails'
import type { Tails } from './tails'

/** Both tails of the beta distribution with parameters a and b. Source: DLMF 8.17 (incomplete beta function). */
export const betaTails = (x: number, a: number, b: number): Tails =>
  x <= 0 ? { lower: 0, upper: 1 } : x >= 1 ? { lower: 1, upper: 0 } : incompleteBeta(a, b, x, 1 - x)

/** x with P(X ≤ x) = p. Throws a RangeError unless 0 < p < 1. */
export const betaQuantile = (p: number, a: number, b: number): number =>
  unitQuantile((x) => betaTails(x, a, b), lowerProbability(p))
