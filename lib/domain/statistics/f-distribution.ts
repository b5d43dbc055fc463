import { incompleteBeta } from './incomplete-beta'
import { lowerProbability, positiveQuantile } from './quantile-from-tails'
import type { Tails } from './tails'

/** Both tails of F with df1 degrees of freedom above and df2 below. Source: NIST DLMF 8.17(i). */
export function fTails(f: number, df1: number, df2: number): Tails {
  if (f <= 0) return { lower: 0, upper: 1 }
  const scaled = (df1 / df2) * f
  return incompleteBeta(df1 / 2, df2 / 2, 1 / (1 + 1 / scaled), 1 / (1 + scaled))
}

/** f with P(F ≤ f) = p. Throws a RangeError unless 0 < p < 1. */
export const fQuantile = (p: number, df1: number, df2: number): number =>
  positiveQuantile((f) => fTails(f, df1, df2), lowerProbability(p), 1)
