/**
 * exp, ln, sin, cos and the hyperbolic pair, made of + − × ÷ √ alone.
 *
 * Why not `Math.exp`: the language leaves the last bit of the transcendental functions to the engine, and
 * two versions of one engine, or two processors, do differ there. A result shown in the browser has to equal
 * the stored one to the last bit; the five operations used here are exact by IEEE 754 everywhere. For the
 * same reason the domain has no `**`: write x * x.
 *
 * Method: reduction of the argument by ln 2 or π/2 split into two or three parts (W. J. Cody, W. Waite,
 * Software Manual for the Elementary Functions, 1980), then the Taylor or area-tangent series. Errors stay
 * below two units in the last place. Arguments out of range follow IEEE 754 (ln of a negative number is NaN)
 * except sine and cosine, which throw beyond 1e6, where the reduction would lose digits.
 */
const LN2_HIGH = 6.9314718036912382e-1
const LN2_LOW = 1.9082149292705877e-10
const HALF_PI_HIGH = 1.5707963267341256
const HALF_PI_MIDDLE = 6.077100506303966e-11
const HALF_PI_LOW = 2.0222662487959506e-21

const bits = new DataView(new ArrayBuffer(8))

/** 2^k for −1022 ≤ k ≤ 1023, exactly. */
function powerOfTwo(k: number): number {
  bits.setUint32(0, (k + 1023) * 0x100000)
  bits.setUint32(4, 0)
  return bits.getFloat64(0)
}

/** e^x. */
export function exp(x: number): number {
  if (Number.isNaN(x) || x > 710) return x > 710 ? Number.POSITIVE_INFINITY : Number.NaN
  if (x < -746) return 0
  const k = Math.round(x / (LN2_HIGH + LN2_LOW))
  const r = x - k * LN2_HIGH - k * LN2_LOW
  // Taylor to r^14; |r| ≤ ln 2 / 2, so that the first term left out is below 1e-18.
  let tail = 0
  for (let n = 14; n >= 2; n -= 1) tail = ((1 + tail) * r) / n
  const value = 1 + (r + r * tail)
  // In two steps, because 2^k itself may be out of range where the result is not.
  const half = Math.trunc(k / 2)
  return value * powerOfTwo(half) * powerOfTwo(k - half)
}

/** Natural logarithm. */
export function ln(x: number): number {
  if (Number.isNaN(x) || x < 0) return Number.NaN
  if (x === 0) return Number.NEGATIVE_INFINITY
  if (x === Number.POSITIVE_INFINITY) return x
  const subnormal = x < 2.2250738585072014e-308
  bits.setFloat64(0, subnormal ? x * 18014398509481984 : x)
  const high = bits.getUint32(0)
  bits.setUint32(0, (high % 0x100000) + 1023 * 0x100000)
  let m = bits.getFloat64(0)
  let k = Math.floor(high / 0x100000) - 1023 - (subnormal ? 54 : 0)
  if (m > Math.SQRT2) {
    m /= 2
    k += 1
  }
  // ln m = 2 artanh s with s = (m−1)/(m+1), |s| ≤ 0.1716; written as f − s·(f − rest) with f = m − 1 exact.
  const f = m - 1
  const s = f / (2 + f)
  const z = s * s
  let rest = 0
  for (let n = 23; n >= 3; n -= 2) rest = z * (2 / n + rest)
  return k * LN2_HIGH - (s * (f - rest) - k * LN2_LOW - f)
}

/** sin and cos of a reduced argument |r| ≤ π/4 + a little. */
const sineSeries = (r: number): number => {
  const z = r * r
  let rest = 0
  for (let n = 19; n >= 3; n -= 2) rest = (-z / (n * (n - 1))) * (1 + rest)
  return r + r * rest
}

const cosineSeries = (r: number): number => {
  const z = r * r
  let rest = 0
  for (let n = 18; n >= 4; n -= 2) rest = (-z / (n * (n - 1))) * (1 + rest)
  return 1 - (z / 2 + (z / 2) * rest)
}

/** The value at a quarter turn further each: 0 sin, 1 cos, 2 −sin, 3 −cos. */
function circular(x: number, quarter: number): number {
  if (!(Math.abs(x) <= 1e6)) throw new RangeError(`sine and cosine take up to 1e6 radians, not ${x}`)
  const k = Math.round(x / (HALF_PI_HIGH + HALF_PI_MIDDLE))
  const r = x - k * HALF_PI_HIGH - k * HALF_PI_MIDDLE - k * HALF_PI_LOW
  const turn = (((k + quarter) % 4) + 4) % 4
  const size = turn % 2 === 0 ? sineSeries(r) : cosineSeries(r)
  return turn >= 2 ? -size : size
}

/** Sine of an angle in radians. Throws a RangeError beyond 1e6. */
export const sin = (x: number): number => circular(x, 0)

/** Cosine of an angle in radians. Throws a RangeError beyond 1e6. */
export const cos = (x: number): number => circular(x, 1)

/** Hyperbolic cosine. */
export const cosh = (x: number): number => (exp(x) + exp(-x)) / 2

/** Hyperbolic sine; by its series below 1, where the difference of exponentials would lose digits. */
export function sinh(x: number): number {
  if (Math.abs(x) >= 1) return (exp(x) - exp(-x)) / 2
  const z = x * x
  let rest = 0
  for (let n = 19; n >= 3; n -= 2) rest = (z / (n * (n - 1))) * (1 + rest)
  return x + x * rest
}
