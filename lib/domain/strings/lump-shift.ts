import { sin } from '../units/elementary'
import { positive } from '../units/positive'
import type { Kilograms, KilogramsPerMetre, Metres } from '../units/quantity'

/**
 * Relative shift of partial n by a small lump: δf_n/f_n = −(m/µL) sin²(nπx/L).
 *
 * m lump kg, x its place from one end m, µ kg/m, L m. First order in m/µL: fair below a few per cent.
 * Throws a RangeError when µ or L is not above zero. Source: Rayleigh, Theory of Sound I, §91 (from memory).
 */
export function lumpShift(
  lump: Kilograms,
  place: Metres,
  massPerMetre: KilogramsPerMetre,
  length: Metres,
  n: number,
): number {
  const s = sin((n * Math.PI * place) / positive('L', length))
  return -(lump / (positive('µ', massPerMetre) * length)) * s * s
}
