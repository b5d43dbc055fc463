import { incompleteBeta } from './incomplete-beta'
import { normalCdf, normalUpperTail } from './normal'
import { normalQuantile } from './normal-quantile'
import { lowerProbability, positiveQuantile } from './quantile-from-tails'
import type { Tails } from './tails'

/**
 * Both tails of Student's t with df degrees of freedom (not necessarily whole; Infinity gives the normal
 * distribution). Source: definition by the incomplete beta function, NIST DLMF 8.17(i).
 */
export function tTails(t: number, df: number): Tails {
  if (!(df > 0)) throw new RangeError(`Student's t with ${df} degrees of freedom`)
  if (df === Number.POSITIVE_INFINITY) return { lower: normalCdf(t), upper: normalUpperTail(t) }
  const square = (t / df) * t
  const beyond = incompleteBeta(df / 2, 0.5, 1 / (1 + square), 1 / (1 + 1 / square)).lower / 2
  return t >= 0 ? { lower: 1 - beyond, upper: beyond } : { lower: beyond, upper: 1 - beyond }
}

/** t with P(T ≤ t) = p. Throws a RangeError unless 0 < p < 1. */
export function tQuantile(p: number, df: number): number {
  if (df === Number.POSITIVE_INFINITY) return normalQuantile(p)
  const { probability } = lowerProbability(p)
  if (p === 0.5) return 0
  // By symmetry from the upper half.
  const found = positiveQuantile((t) => tTails(t, df), { tail: 'upper', probability }, 1)
  return p < 0.5 ? -found : found
}
