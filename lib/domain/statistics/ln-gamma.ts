import { ln } from '../units/elementary'
import { lnOnePlus } from './ln-one-plus'

const HALF_LN_TWO_PI = 0.9189385332046728

/**
 * Error of Stirling's formula, δ(x) = ln Γ(x+1) − (x + ½) ln x + x − ½ ln 2π, for x > 0. Probabilities are
 * written with it, because the large terms of ln Γ that cancel in them would take their digits along.
 * Below 10 by δ(x) = δ(x+1) + (x + ½) ln(1 + 1/x) − 1, above by the asymptotic series.
 *
 * Source: C. Loader, Fast and Accurate Computation of Binomial Probabilities (2000); series NIST DLMF 5.11.1.
 */
export function stirlingError(x: number): number {
  let below = 0
  let z = x
  while (z < 10) {
    below += (z + 0.5) * (z < 4 ? ln(1 + 1 / z) : lnOnePlus(1 / z)) - 1
    z += 1
  }
  const w = 1 / (z * z)
  const series =
    1 / 12 - w * (1 / 360 - w * (1 / 1260 - w * (1 / 1680 - w * (1 / 1188 - w * (691 / 360360 - w / 156)))))
  return below + series / z
}

/** ln Γ(x) for x > 0. Throws a RangeError otherwise. */
export function lnGamma(x: number): number {
  if (!(x > 0)) throw new RangeError(`ln Γ of ${x}`)
  return (x - 0.5) * ln(x) - x + HALF_LN_TWO_PI + stirlingError(x)
}
