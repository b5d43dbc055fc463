import { cos } from '../units/elementary'

/** Mass per metre along the string over its reference value, at ξ = x/L from 0 to 1. */
export type MassProfile = (xi: number) => number

/** Taper: linear, ±half of `endToEnd` at the ends, mean 1. */
export const taperProfile =
  (endToEnd: number): MassProfile =>
  (xi) =>
    1 + endToEnd * (xi - 0.5)

/** Periodic unevenness: 1 + c cos(kπξ), k half waves in the length. */
export const cosineProfile =
  (amplitude: number, halfWaves: number): MassProfile =>
  (xi) =>
    1 + amplitude * cos(halfWaves * Math.PI * xi)

const STEPS = 2000

/** The profile at 0, h/2, h, … as the integration needs it. */
const sample = (profile: MassProfile): readonly number[] =>
  Array.from({ length: 2 * STEPS + 1 }, (_, index) => profile(index / (2 * STEPS)))

/** y(1) of y″ = −ω²p(ξ)y, y(0) = 0, y′(0) = 1, by the classical Runge–Kutta rule of fourth order. */
function endDeflection(omega: number, p: readonly number[]): number {
  const h = 1 / STEPS
  const w = omega * omega
  let y = 0
  let v = 1
  for (let i = 0; i < STEPS; i += 1) {
    const q0 = w * (p[2 * i] ?? Number.NaN)
    const q1 = w * (p[2 * i + 1] ?? Number.NaN)
    const q2 = w * (p[2 * i + 2] ?? Number.NaN)
    const a1 = -q0 * y
    const v2 = v + (h / 2) * a1
    const a2 = -q1 * (y + (h / 2) * v)
    const v3 = v + (h / 2) * a2
    const a3 = -q1 * (y + (h / 2) * v2)
    const v4 = v + h * a3
    const a4 = -q2 * (y + h * v3)
    y += (h / 6) * (v + 2 * v2 + 2 * v3 + v4)
    v += (h / 6) * (a1 + 2 * a2 + 2 * a3 + a4)
  }
  return y
}

/**
 * Relative shift of partial n of an uneven string against a uniform one of the reference mass per metre:
 * eigenvalue of y″ + ω²p(ξ)y = 0, y(0) = y(1) = 0, by shooting.
 *
 * A slow taper does nothing in first order (5 % end to end: about 2e-5); of a cosine with k half waves only
 * k = 2n touches partial n, by c/4. Good for unevenness below about 30 % of mass and n up to 20: the
 * integration errs by (nπ/2000)⁴/120, 1e-8 there and 1e-11 at n = 4. Source: Sturm–Liouville theory; Rayleigh, Theory of Sound I, §§91, 140 (from memory).
 */
export function unevenPartialShift(profile: MassProfile, n: number): number {
  const p = sample(profile)
  // Between half-way to either neighbour y(1) changes its sign once.
  let low = (n - 0.5) * Math.PI
  let high = (n + 0.5) * Math.PI
  const sign = n % 2 === 1 ? 1 : -1
  for (let step = 0; step < 60; step += 1) {
    const middle = (low + high) / 2
    if (sign * endDeflection(middle, p) > 0) low = middle
    else high = middle
  }
  return (low + high) / 2 / (n * Math.PI) - 1
}
