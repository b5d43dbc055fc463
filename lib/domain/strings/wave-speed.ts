import { positive } from '../units/positive'
import {
  type KilogramsPerMetre,
  type MetresPerSecond,
  metresPerSecond,
  type Newtons,
} from '../units/quantity'

/**
 * Speed of a transverse wave on a flexible string: v = √(T/µ).
 *
 * T tension N, µ mass per metre of the loaded string kg/m, v m/s. Valid for a perfectly flexible uniform
 * string and small amplitudes. Throws a RangeError unless both are above zero.
 * Source: Rayleigh, Theory of Sound I (1894), ch. VI; University Physics 1, §16.3 (OpenStax).
 */
export const waveSpeed = (tension: Newtons, massPerMetre: KilogramsPerMetre): MetresPerSecond =>
  metresPerSecond(Math.sqrt(positive('T', tension) / positive('µ', massPerMetre)))
