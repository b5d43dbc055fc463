import { incompleteGamma } from './incomplete-gamma'
import { lowerProbability, positiveQuantile } from './quantile-from-tails'
import type { Tails } from './tails'

const ALL_ABOVE: Tails = { lower: 0, upper: 1 }

/** Both tails of χ² with df degrees of freedom (df > 0, not necessarily whole). Source: DLMF 8.2 (incomplete gamma function); NIST/SEMATECH e-Handbook 1.3.6.6.6. */
export const chiSquareTails = (x: number, df: number): Tails =>
  x <= 0 ? ALL_ABOVE : incompleteGamma(df / 2, x / 2)

/** x with P(χ² ≤ x) = p. Throws a RangeError unless 0 < p < 1. */
export const chiSquareQuantile = (p: number, df: number): number =>
  positiveQuantile((x) => chiSquareTails(x, df), lowerProbability(p), df)
