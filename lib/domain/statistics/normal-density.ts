import { exp, ln } from '../units/elementary'
import { normalCdf } from './normal'

/** Density of the standard normal distribution. */
export function normalDensity(z: number): number {
  // z² in two parts, as its own rounding would cost digits in the far tail.
  const coarse = Math.trunc(z * 16) / 16
  return (exp(-0.5 * coarse * coarse) * exp(-0.5 * (z - coarse) * (z + coarse))) / Math.sqrt(2 * Math.PI)
}

/** ln Φ(z), also where Φ itself underflows. Below −30 by the asymptotic series (NIST DLMF 7.12.1). */
export function lnNormalCdf(z: number): number {
  if (z > -30) return ln(normalCdf(z))
  const w = 1 / (z * z)
  return -0.5 * z * z - ln(-z) - 0.9189385332046728 + ln(1 - w * (1 - w * (3 - w * 15)))
}
