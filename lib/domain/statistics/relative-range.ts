import { integrate } from './gauss-legendre'
import { normalCdf, normalUpperTail } from './normal'
import { normalDensity } from './normal-density'
import { lowerProbability, positiveQuantile } from './quantile-from-tails'
import type { Tails } from './tails'

/** Normal values beyond this do not count: the tail there is 1e-33. */
const REACH = 12

/** x^n of a whole n ≥ 0, by squaring. */
function wholePower(x: number, n: number): number {
  let result = 1
  for (let base = x, left = n; left > 0; left = Math.floor(left / 2), base *= base)
    if (left % 2 === 1) result *= base
  return result
}

/** Φ(b) − Φ(a) for a ≤ b, from whichever tails are small. */
const between = (a: number, b: number): number =>
  a > 0 ? normalUpperTail(a) - normalUpperTail(b) : normalCdf(b) - normalCdf(a)

function checked(n: number): number {
  if (!Number.isInteger(n) || n < 2) throw new RangeError(`range of ${n} values`)
  return n
}

/**
 * P(W ≤ w) of the relative range W = R/σ of n normal values: n ∫ φ(z)(Φ(z+w) − Φ(z))^(n−1) dz over the least
 * value z. Throws a RangeError unless n is whole and at least 2.
 * Source: H. O. Hartley, Biometrika 32 (1942) 334; definition.
 */
export function relativeRangeCdf(w: number, n: number): number {
  checked(n)
  if (w <= 0) return 0
  const density = (z: number) => n * normalDensity(z) * wholePower(between(z, z + w), n - 1)
  return Math.min(1, integrate(density, -REACH, 9, 21))
}

/** P(W > w), from 1 − F^… by the probability that some value exceeds the least by more than w. */
export function relativeRangeUpperTail(w: number, n: number): number {
  checked(n)
  if (w <= 0) return 1
  // φ(z)·((Q(z))^(n−1) − (Q(z) − Q(z+w))^(n−1)), the difference of powers as a sum of positive terms.
  const density = (z: number) => {
    const all = normalUpperTail(z)
    const near = between(z, z + w)
    let sum = 0
    let power = 1
    for (let k = 0; k < n - 1; k += 1) {
      sum = sum * near + power
      power *= all
    }
    return n * normalDensity(z) * normalUpperTail(z + w) * sum
  }
  return integrate(density, -REACH, 9, 21)
}

export const relativeRangeTails = (w: number, n: number): Tails => ({
  lower: relativeRangeCdf(w, n),
  upper: relativeRangeUpperTail(w, n),
})

/** w with P(W ≤ w) = p. */
export const relativeRangeQuantile = (p: number, n: number): number =>
  positiveQuantile((w) => relativeRangeTails(w, n), lowerProbability(p), 2)

/**
 * d2(n) = E W = ∫ 1 − Φⁿ − (1 − Φ)ⁿ. Throws a RangeError unless n is whole and at least 2.
 * Source: L. H. C. Tippett, Biometrika 17 (1925) 364.
 */
export function meanRelativeRange(n: number): number {
  checked(n)
  if (n === 2) return 2 / Math.sqrt(Math.PI)
  return (
    2 * integrate((x) => 1 - wholePower(normalCdf(x), n) - wholePower(normalUpperTail(x), n), 0, REACH, 12)
  )
}

/** d3(n) = sd W, from E W² = 2 ∫ w P(W > w) dw. */
export function sdOfRelativeRange(n: number): number {
  checked(n)
  const d2 = meanRelativeRange(n)
  if (n === 2) return Math.sqrt(2 - d2 * d2)
  const meanSquare = 2 * integrate((w) => w * relativeRangeUpperTail(w, n), 0, 2 * REACH, 12)
  return Math.sqrt(meanSquare - d2 * d2)
}

/** Median of W for n = 2, √2 z₀.₇₅ (0.954): what the median moving range is divided by. */
export const MEDIAN_RANGE_OF_TWO = Math.SQRT2 * 0.6744897501960817
