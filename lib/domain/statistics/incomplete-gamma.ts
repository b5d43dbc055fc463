import { exp, ln } from '../units/elementary'
import { stirlingError } from './ln-gamma'
import { lnOnePlusMinus } from './ln-one-plus'
import type { Tails } from './tails'

const MOST_TERMS = 100_000

/**
 * ln of x^a e^(−x)/Γ(a + 1), the Poisson probability of a at mean x, a not necessarily whole.
 * Source: C. Loader, Fast and Accurate Computation of Binomial Probabilities (2000), saddle-point form.
 */
export const lnPoissonWeight = (a: number, x: number): number =>
  x === 0
    ? Number.NEGATIVE_INFINITY
    : a * lnOnePlusMinus((x - a) / a, x / a) - stirlingError(a) - 0.5 * ln(2 * Math.PI * a)

/**
 * Regularised incomplete gamma functions P(a, x) (lower) and Q(a, x) (upper), a > 0, x ≥ 0. The smaller one
 * is computed directly, by the series below x = a + 1 and by the continued fraction above.
 * Throws a RangeError outside the domain. Source: NIST DLMF 8.7.1, 8.9.2.
 */
export function incompleteGamma(a: number, x: number): Tails {
  if (!(a > 0) || !(x >= 0)) throw new RangeError(`incomplete gamma function of a = ${a}, x = ${x}`)
  if (x === 0) return { lower: 0, upper: 1 }
  if (x === Number.POSITIVE_INFINITY) return { lower: 1, upper: 0 }
  const weight = exp(lnPoissonWeight(a, x))
  if (x < a + 1) {
    const lower = weight * series(a, x)
    return { lower, upper: 1 - lower }
  }
  const upper = weight * a * fraction(a, x)
  return { lower: 1 - upper, upper }
}

function series(a: number, x: number): number {
  let term = 1
  let sum = 1
  for (let k = 1; k < MOST_TERMS; k += 1) {
    term *= x / (a + k)
    sum += term
    if (term < sum * 1e-17) return sum
  }
  throw new RangeError(`incomplete gamma series at a = ${a}, x = ${x}`)
}

/** Modified Lentz. */
function fraction(a: number, x: number): number {
  let b = x + 1 - a
  let d = 1 / b
  let c = Number.MAX_VALUE
  let h = d
  for (let k = 1; k < MOST_TERMS; k += 1) {
    const an = -k * (k - a)
    b += 2
    d = 1 / (an * d + b)
    c = b + an / c
    const step = c * d
    h *= step
    if (Math.abs(step - 1) < 4e-16) return h
  }
  throw new RangeError(`incomplete gamma fraction at a = ${a}, x = ${x}`)
}
