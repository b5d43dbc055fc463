import { ln } from '../units/elementary'
import { positive } from '../units/positive'

/** The force of air on an oscillating cylinder: −iωρπr²U (k − ik′). k is inertia, k′ is drag. */
export interface StokesFactors {
  readonly inertia: number
  readonly drag: number
}

interface Complex {
  readonly re: number
  readonly im: number
}

const multiply = (a: Complex, b: Complex): Complex => ({
  re: a.re * b.re - a.im * b.im,
  im: a.re * b.im + a.im * b.re,
})

const divide = (a: Complex, b: Complex): Complex => {
  const size = b.re * b.re + b.im * b.im
  return { re: (a.re * b.re + a.im * b.im) / size, im: (a.im * b.re - a.re * b.im) / size }
}

const EULER = 0.5772156649015329

/** K₁(z)/(z K₀(z)) by the ascending series; z²/4 = i M². Without loss of digits up to M about 1.5. */
function ratioBySeries(M: number): Complex {
  // Sums of i^k w^k/(k!)² and the like, w = M²; each is kept as its real and imaginary part.
  const w = M * M
  const i0 = { re: 0, im: 0 }
  const k0 = { re: 0, im: 0 }
  const i1 = { re: 0, im: 0 }
  const k1 = { re: 0, im: 0 }
  let term = 1
  let harmonic = 0
  for (let k = 0; k <= 40; k += 1) {
    if (k > 0) {
      term *= w / (k * k)
      harmonic += 1 / k
    }
    const part = k % 2 === 0 ? 're' : 'im'
    const signed = k % 4 < 2 ? term : -term
    i0[part] += signed
    k0[part] += signed * harmonic
    i1[part] += signed / (k + 1)
    k1[part] += (signed / (k + 1)) * (2 * harmonic + 1 / (k + 1) - 2 * EULER)
  }
  // ln(z/2) = ln M + iπ/4.
  const log = { re: ln(M), im: Math.PI / 4 }
  const leading = multiply({ re: log.re + EULER, im: log.im }, i0)
  const K0 = { re: k0.re - leading.re, im: k0.im - leading.im }
  // K₁/z = 1/z² + ln(z/2) (I₁/z) − …/4, where I₁/z = Σ/2 and 1/z² = −i/(4M²).
  const growing = multiply(log, i1)
  const K1overZ = { re: growing.re / 2 - k1.re / 4, im: -1 / (4 * w) + growing.im / 2 - k1.im / 4 }
  return divide(K1overZ, K0)
}

/**
 * K₁(z)/(z K₀(z)) by the continued fraction
 * K₁/K₀ = 1 + 1/(2z) − (1/z) (1/4)/(2(1+z) − (9/4)/(2(2+z) − (25/4)/(2(3+z) − …))).
 */
function ratioByFraction(M: number): Complex {
  const part = Math.SQRT2 * M
  const z = { re: part, im: part }
  let below: Complex = { re: 1, im: 0 }
  for (let i = 120; i >= 1; i -= 1) {
    const b = { re: 2 * (i + z.re), im: 2 * z.im }
    if (i === 120) {
      below = b
      continue
    }
    const step = divide({ re: (i + 0.5) * (i + 0.5), im: 0 }, below)
    below = { re: b.re - step.re, im: b.im - step.im }
  }
  const h = divide({ re: 0.25, im: 0 }, below)
  const inner = divide({ re: 0.5 - h.re, im: -h.im }, z)
  return divide({ re: 1 + inner.re, im: inner.im }, z)
}

/**
 * Stokes' factors by the exact Bessel form: k − ik′ = 1 + 4 K₁(x)/(x K₀(x)), x = r √(iω/ν) = 2M √i.
 *
 * M = (r/2)√(ω/ν): size of the cylinder over the thickness of the viscous layer, dimensionless. Valid for
 * amplitudes small against the diameter. Throws a RangeError unless M is above zero.
 * Source: G. G. Stokes, Trans. Cambridge Phil. Soc. 9 (1851) 8; Bessel functions as in Abramowitz & Stegun §9.6.
 */
export function stokesFactors(M: number): StokesFactors {
  const { re, im } = positive('M', M) <= 1.5 ? ratioBySeries(M) : ratioByFraction(M)
  return { inertia: 1 + 4 * re, drag: -4 * im }
}

/**
 * The same for large M: k ≈ 1 + √2/M, k′ ≈ √2/M + 1/(2M²). 3 % off in k′ at M = 0.73, 15 % at 0.22.
 * Source: Fletcher & Rossing, The Physics of Musical Instruments, 2nd ed. (1998), §2.12 (from memory).
 */
export const stokesFactorsAsymptotic = (M: number): StokesFactors => ({
  inertia: 1 + Math.SQRT2 / positive('M', M),
  drag: Math.SQRT2 / M + 1 / (2 * M * M),
})
