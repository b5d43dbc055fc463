import { exp, ln } from '../units/elementary'
import { normalCdf } from './normal'

const CENTRAL = {
  above: [
    2509.0809287301227, 33430.57558358813, 67265.7709270087, 45921.95393154987, 13731.69376550946,
    1971.5909503065513, 133.14166789178438, 3.3871328727963665,
  ],
  below: [
    5226.495278852854, 28729.085735721943, 39307.89580009271, 21213.794301586597, 5394.196021424751,
    687.1870074920579, 42.31333070160091, 1,
  ],
}
const MIDDLE = {
  above: [
    0.0007745450142783414, 0.022723844989269184, 0.2417807251774506, 1.2704582524523684, 3.6478483247632045,
    5.769497221460691, 4.630337846156546, 1.4234371107496835,
  ],
  below: [
    1.0507500716444169e-9, 0.0005475938084995345, 0.015198666563616457, 0.14810397642748008, 0.6897673349851,
    1.6763848301838038, 2.053191626637759, 1,
  ],
}
const FAR = {
  above: [
    2.0103343992922881e-7, 0.000027115555687434876, 0.0012426609473880784, 0.026532189526576124,
    0.29656057182850487, 1.7848265399172913, 5.463784911164114, 6.657904643501103,
  ],
  below: [
    2.0442631033899397e-15, 1.421511758316446e-7, 0.000018463183175100548, 0.0007868691311456133,
    0.014875361290850615, 0.1369298809227358, 0.599832206555888, 1,
  ],
}

function ratio(x: number, { above, below }: typeof FAR): number {
  let numerator = 0
  let denominator = 0
  above.forEach((coefficient, index) => {
    numerator = numerator * x + coefficient
    denominator = denominator * x + (below[index] ?? 0)
  })
  return numerator / denominator
}

/** AS 241 for p ≤ ½: zero or negative. */
function approximation(p: number): number {
  const q = p - 0.5
  if (q > -0.425) return q * ratio(0.180625 - q * q, CENTRAL)
  const r = Math.sqrt(-ln(p))
  return -(r <= 5 ? ratio(r - 1.6, MIDDLE) : ratio(r - 5, FAR))
}

/**
 * Quantile of the standard normal distribution, z with P(Z ≤ z) = p, 0 < p < 1; one Newton step follows the
 * approximation. Throws a RangeError for other p.
 *
 * Source: M. J. Wichura, Algorithm AS 241, Applied Statistics 37 (1988) 477 (PPND16; coefficients from memory,
 * checked against the reference cases).
 */
export function normalQuantile(p: number): number {
  if (!(p > 0 && p < 1)) throw new RangeError(`normal quantile at p = ${p}`)
  const tail = p <= 0.5 ? p : 1 - p
  const z = approximation(tail)
  const density = exp(-0.5 * z * z) / Math.sqrt(2 * Math.PI)
  const newton = z - (normalCdf(z) - tail) / density
  return p <= 0.5 ? newton : -newton
}

/** z with P(Z > z) = q, for upper tails too small for 1 − q to keep their digits. */
export const normalUpperQuantile = (q: number): number => -normalQuantile(q)
