import { cos, exp, sin } from '../units/elementary'
import { positive } from '../units/positive'

const tanh = (x: number): number => {
  const decay = exp(-2 * x)
  return (1 - decay) / (1 + decay)
}
const cot = (x: number): number => cos(x) / sin(x)

/** Root of a falling function between two places, to the last bit. */
function bisect(f: (x: number) => number, low: number, high: number): number {
  let [a, b] = [low, high]
  for (let step = 0; step < 200; step += 1) {
    const middle = (a + b) / 2
    if (middle <= a || middle >= b) break
    if (f(middle) > 0) a = middle
    else b = middle
  }
  return (a + b) / 2
}

/** Wave numbers of waves and exponentials, L = 1: k₂² = k₁² + 1/λ², λ² = B/π². */
const exponentNumber = (k1: number, lambdaSquared: number): number => Math.sqrt(k1 * k1 + 1 / lambdaSquared)

/**
 * Where the string runs on over the edge into a tail of length a, clamped at its far end: slope over moment at
 * the edge is R/(k₁² + k₂²), R = above/below, both divided by cosh k₂a.
 */
function tailTerms(k1: number, k2: number, a: number): { above: number; below: number } {
  const th = tanh(k2 * a)
  const sech = 2 / (exp(k2 * a) + exp(-k2 * a))
  const [s, c] = [sin(k1 * a), cos(k1 * a)]
  return {
    above: 2 * c - 2 * sech + (k1 / k2 - k2 / k1) * th * s,
    below: (th * c) / k2 - s / k1,
  }
}

/** The first k₁ above nπ at which the tail's R leaps from +∞ to −∞. */
function leapOfTail(n: number, lambdaSquared: number, a: number): number {
  const whole = Math.floor(n * a)
  const below = (k1: number) => tailTerms(k1, exponentNumber(k1, lambdaSquared), a).below
  const before = (k: number): number => (k % 2 === 0 ? 1 : -1)
  const start = n * Math.PI
  const soon = before(whole) * below(start) > 0
  const turn = soon ? whole : whole + 1
  const from = soon ? start : (turn * Math.PI) / a
  return bisect((k1) => before(turn) * below(k1), from, ((turn + 0.5) * Math.PI) / a)
}

/**
 * Exact partial n, over n f₀, of a stiff string that keeps deflection zero at both ends of the span and is
 * symmetric about its middle. The deflection is made of waves k₁ and exponentials k₂; k₁ = nπ + δ, where
 *   k₁ cot δ/2 = k₂ (tanh k₂/2 for odd n, coth for even n) + R,
 * R from the tail beyond a knife edge, absent for clamped ends.
 */
function exactRatio(inharmonicity: number, n: number, tail: number | undefined): number {
  const lambdaSquared = positive('B', inharmonicity) / (Math.PI * Math.PI)
  if (!(Number.isInteger(n) && n >= 1)) throw new RangeError(`partial ${n} is not a whole number from 1`)
  const excess = (delta: number): number => {
    const k1 = n * Math.PI + delta
    const k2 = exponentNumber(k1, lambdaSquared)
    const own = n % 2 === 1 ? tanh(k2 / 2) : 1 / tanh(k2 / 2)
    const clamped = k1 * cot(delta / 2) - k2 * own
    if (tail === undefined) return clamped
    const { above, below } = tailTerms(k1, k2, tail)
    return clamped - above / below
  }
  const leap =
    tail === undefined ? Math.PI : leapOfTail(n, lambdaSquared, positive('tail', tail)) - n * Math.PI
  // From δ = 0 to the leap the excess falls from +∞ to −∞.
  const k1 = n * Math.PI + bisect(excess, 0, Math.min(2 * Math.PI, leap))
  return (k1 * Math.sqrt(1 + lambdaSquared * k1 * k1)) / (n * Math.PI)
}

/**
 * Exact f_n/(n f₀) of a stiff string clamped at both ends: the root of
 * 2k₁k₂(1 − cos k₁L cosh k₂L) + (k₂² − k₁²) sin k₁L sinh k₂L = 0, factored by symmetry.
 * B > 0. For large B n², where Fletcher's form is low. Source: the bar under tension, Rayleigh, Theory of
 * Sound I (1894), ch. VIII; solved numerically.
 */
export const clampedPartialRatioExact = (inharmonicity: number, n: number): number =>
  exactRatio(inharmonicity, n, undefined)

/**
 * Exact f_n/(n f₀) of a stiff string running over two sharp, frictionless, rigid knife edges into equal
 * tails of `tailOverLength` spans, clamped at their far ends; slope and moment go on over the edges.
 * B > 0, tail > 0. Source: derived here, three spans with the same tension.
 */
export const knifePartialRatioExact = (inharmonicity: number, n: number, tailOverLength: number): number =>
  exactRatio(inharmonicity, n, tailOverLength)
