import { sumOfSquaresAboutMean } from './sum-of-squares'

/** What a set of values comes to; two sets' summaries can be merged without going back to the values. */
export interface Summary {
  readonly n: number
  readonly mean: number
  /** Sum of squares about the mean. */
  readonly m2: number
  readonly min: number
  readonly max: number
}

/** Summary of values in two passes, the precise way. Undefined for no values. */
export function summarise(values: readonly number[]): Summary | undefined {
  const first = values[0]
  const m2 = sumOfSquaresAboutMean(values)
  if (first === undefined || m2 === undefined) return undefined
  let sum = 0
  let min = first
  let max = first
  for (const value of values) {
    sum += value - first
    min = Math.min(min, value)
    max = Math.max(max, value)
  }
  return { n: values.length, mean: first + sum / values.length, m2, min, max }
}

/**
 * Summary with one more value, in one pass, for values that come one after another and are not kept.
 *
 * Source: B. P. Welford, Technometrics 4 (1962) 419.
 */
export function withValue(summary: Summary | undefined, value: number): Summary {
  if (!summary) return { n: 1, mean: value, m2: 0, min: value, max: value }
  const n = summary.n + 1
  const delta = value - summary.mean
  const mean = summary.mean + delta / n
  return {
    n,
    mean,
    m2: summary.m2 + delta * (value - mean),
    min: Math.min(summary.min, value),
    max: Math.max(summary.max, value),
  }
}

/**
 * Summary of two sets together: δ = x̄b − x̄a, x̄ = x̄a + δ nb/n, M2 = M2a + M2b + δ² na nb/n. For aggregates over
 * lots; the summary of one lot is always made from its results.
 *
 * Source: T. F. Chan, G. H. Golub, R. J. LeVeque, Stanford report STAN-CS-79-773 (1979).
 */
export function mergeSummaries(a: Summary | undefined, b: Summary | undefined): Summary | undefined {
  if (!a || !b) return a ?? b
  const n = a.n + b.n
  const delta = b.mean - a.mean
  return {
    n,
    mean: a.mean + (delta * b.n) / n,
    m2: a.m2 + b.m2 + (delta * delta * a.n * b.n) / n,
    min: Math.min(a.min, b.min),
    max: Math.max(a.max, b.max),
  }
}
