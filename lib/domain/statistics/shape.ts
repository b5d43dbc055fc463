import { mean } from './mean'

/**
 * Central moments m2, m3, m4 with divisor n, in units of the largest departure from the mean: only their ratios are
 * used, and fourth powers of huge or tiny values would leave the range of numbers. Source: NIST/SEMATECH e-Handbook 1.3.5.11.
 */
function centralMoments(values: readonly number[]): { m2: number; m3: number; m4: number } | undefined {
  const middle = mean(values)
  if (middle === undefined) return undefined
  const largest = values.reduce((most, value) => Math.max(most, Math.abs(value - middle)), 0)
  if (!(largest > 0)) return undefined
  const sums = { m2: 0, m3: 0, m4: 0 }
  for (const value of values) {
    const d = (value - middle) / largest
    sums.m2 += d * d
    sums.m3 += d * d * d
    sums.m4 += d * d * d * d
  }
  const n = values.length
  return { m2: sums.m2 / n, m3: sums.m3 / n, m4: sums.m4 / n }
}

/** Moment skewness g1 = m3/m2^1.5, divisor n. Undefined when the values do not vary. */
export function momentSkewness(values: readonly number[]): number | undefined {
  const moments = centralMoments(values)
  if (!moments || !(moments.m2 > 0)) return undefined
  return moments.m3 / (moments.m2 * Math.sqrt(moments.m2))
}

/** Moment excess kurtosis g2 = m4/m2² − 3, divisor n. Undefined when the values do not vary. */
export function momentExcessKurtosis(values: readonly number[]): number | undefined {
  const moments = centralMoments(values)
  if (!moments || !(moments.m2 > 0)) return undefined
  return moments.m4 / (moments.m2 * moments.m2) - 3
}

/** Sample skewness G1 = g1 √(n(n−1))/(n−2): unbiased for normal values. Undefined below three values. */
export function sampleSkewness(values: readonly number[]): number | undefined {
  const n = values.length
  const g1 = momentSkewness(values)
  return n < 3 || g1 === undefined ? undefined : (g1 * Math.sqrt(n * (n - 1))) / (n - 2)
}

/** Sample excess kurtosis G2 = ((n+1)g2 + 6)(n−1)/((n−2)(n−3)). Undefined below four values. */
export function sampleExcessKurtosis(values: readonly number[]): number | undefined {
  const n = values.length
  const g2 = momentExcessKurtosis(values)
  return n < 4 || g2 === undefined ? undefined : (((n + 1) * g2 + 6) * (n - 1)) / ((n - 2) * (n - 3))
}
