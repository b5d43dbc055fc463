import { median } from './median'

/**
 * Median of |x − median|, without the factor 1.4826 that makes it estimate σ of normal values: a spread that
 * single wild values do not move. Undefined for no values. Source: NIST/SEMATECH e-Handbook 1.3.5.6.
 */
export function medianAbsoluteDeviation(values: readonly number[]): number | undefined {
  const middle = median(values)
  return middle === undefined ? undefined : median(values.map((value) => Math.abs(value - middle)))
}
