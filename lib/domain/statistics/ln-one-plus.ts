import { ln } from '../units/elementary'

/** Σ s^(2k+1)/(2k+1) from k = 1, over s: the part of artanh s beyond s itself, divided by s. Source: DLMF 4.6 (series of ln((1 + s)/(1 − s))). */
function artanhRest(s: number): number {
  const z = s * s
  let rest = 0
  for (let n = 25; n >= 3; n -= 2) rest = z * (1 / n + rest)
  return rest
}

/** ln(1 + e) without the digits that 1 + e loses when e is small. NaN below −1. */
export function lnOnePlus(e: number): number {
  if (Math.abs(e) > 0.25) return ln(1 + e)
  const s = e / (2 + e)
  return 2 * s * (1 + artanhRest(s))
}

/**
 * ln(1 + e) − e with small relative error also near e = 0, where both cancel. With s = e/(2 + e):
 * ln(1 + e) = 2 artanh s and e = 2s + s·e, so that only −s·e + 2s·(s²/3 + s⁴/5 + …) is left.
 * `onePlus` is 1 + e as the caller knows it, for e near −1, where the sum would have lost it.
 */
export function lnOnePlusMinus(e: number, onePlus = 1 + e): number {
  if (Math.abs(e) > 0.25) return ln(onePlus) - e
  const s = e / (2 + e)
  return 2 * s * artanhRest(s) - s * e
}
