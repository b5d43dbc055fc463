import { exp } from '../units/elementary'
import { stirlingError } from './ln-gamma'
import { lnOnePlusMinus } from './ln-one-plus'
import type { Tails } from './tails'

const MOST_TERMS = 100_000
const TINY = 1e-300

/**
 * Regularised incomplete beta function I_x(a, b) (lower) and its complement (upper), a, b > 0, 0 ≤ x ≤ 1;
 * y is 1 − x as the caller knows it, so that no digits are lost near x = 1. The tail on x's side of the mean is
 * computed directly by the continued fraction. Throws a RangeError outside the domain.
 *
 * Sources: NIST DLMF 8.17.22 (fraction); C. Loader 2000 (the factor x^a y^b/B(a, b) in saddle-point form).
 */
export function incompleteBeta(a: number, b: number, x: number, y: number): Tails {
  if (!(a > 0) || !(b > 0) || !(x >= 0) || !(y >= 0))
    throw new RangeError(`incomplete beta function of a = ${a}, b = ${b}, x = ${x}`)
  if (x === 0) return { lower: 0, upper: 1 }
  if (y === 0) return { lower: 1, upper: 0 }
  const factor = betaFactor(a, b, x, y)
  if (x < (a + 1) / (a + b + 2)) {
    const lower = (factor * fraction(a, b, x)) / a
    return { lower, upper: 1 - lower }
  }
  const upper = (factor * fraction(b, a, y)) / b
  return { lower: 1 - upper, upper }
}

/** x^a y^b/B(a, b). */
function betaFactor(a: number, b: number, x: number, y: number): number {
  const n = a + b
  const distance = b * x - a * y
  const exponent =
    stirlingError(n) -
    stirlingError(a) -
    stirlingError(b) +
    a * lnOnePlusMinus(distance / a, (n * x) / a) +
    b * lnOnePlusMinus(-distance / b, (n * y) / b)
  return exp(exponent) * Math.sqrt((a * b) / (2 * Math.PI * n))
}

const away = (value: number): number => (Math.abs(value) < TINY ? TINY : value)

/** Modified Lentz. */
function fraction(a: number, b: number, x: number): number {
  let c = 1
  let d = 1 / away(1 - ((a + b) * x) / (a + 1))
  let h = d
  for (let m = 1; m < MOST_TERMS; m += 1) {
    const even = (m * (b - m) * x) / ((a + 2 * m - 1) * (a + 2 * m))
    d = 1 / away(1 + even * d)
    c = away(1 + even / c)
    h *= d * c
    const odd = (-(a + m) * (a + b + m) * x) / ((a + 2 * m) * (a + 2 * m + 1))
    d = 1 / away(1 + odd * d)
    c = away(1 + odd / c)
    const step = d * c
    h *= step
    if (Math.abs(step - 1) < 4e-16) return h
  }
  throw new RangeError(`incomplete beta fraction at a = ${a}, b = ${b}, x = ${x}`)
}
