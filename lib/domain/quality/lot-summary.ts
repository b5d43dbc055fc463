import type { Estimate } from '../metrology/evaluation'

/** What a lot's specimens come to in one characteristic. SI throughout. */
export interface LotSummaryBody {
  readonly n: number
  readonly mean: number
  /** Sum of squares about the mean. */
  readonly m2: number
  readonly min: number
  readonly max: number
  /** Part of the uncertainty that the specimens share: root mean square over them. */
  readonly uCommon: number
  /** Standard uncertainty of the mean: the common part, and the observed spread or the random part over √n. */
  readonly uMean: number
}

/**
 * Summary of the specimens' estimates, always from all of them, never merged incrementally.
 * The random part of the mean's uncertainty is what measuring alone can do (quadratic mean of the random
 * parts over √n): the spread between strings belongs to the lot, not to the measurement of its mean.
 * Undefined for no specimens.
 */
export function summariseLot(estimates: readonly Estimate[]): LotSummaryBody | undefined {
  const n = estimates.length
  const first = estimates[0]
  if (!first) return undefined
  // Differences from the first value keep all digits of numbers that differ only in their last ones.
  let sum = 0
  for (const one of estimates) sum += one.value - first.value
  const offset = sum / n
  const mean = first.value + offset
  let m2 = 0
  let common = 0
  let random = 0
  let min = first.value
  let max = first.value
  for (const one of estimates) {
    const departure = one.value - first.value - offset
    m2 += departure * departure
    common += one.uCommon * one.uCommon
    random += Math.max(0, one.u * one.u - one.uCommon * one.uCommon)
    min = Math.min(min, one.value)
    max = Math.max(max, one.value)
  }
  const uCommon = Math.sqrt(common / n)
  return { n, mean, m2, min, max, uCommon, uMean: Math.sqrt(common / n + random / n / n) }
}

/** Sample standard deviation of the specimens; undefined below two. */
export const sampleStandardDeviationOf = (summary: LotSummaryBody): number | undefined =>
  summary.n < 2 ? undefined : Math.sqrt(summary.m2 / (summary.n - 1))
