import { positive } from '../units/positive'
import { type Hertz, hertz, type KilogramsPerMetre, type Metres, type Newtons } from '../units/quantity'
import { waveSpeed } from './wave-speed'

/**
 * Partial n of a flexible string between rigid ends: f_n = n √(T/µ) / (2L).
 *
 * T tension N, µ mass per metre of the loaded string kg/m, L speaking length m, n partial from 1. Stiffness,
 * end conditions, air and amplitude shift it: see the files of those names.
 * Throws a RangeError unless all are above zero.
 * Source: Rayleigh, Theory of Sound I (1894), ch. VI; Fletcher & Rossing, The Physics of Musical
 * Instruments, 2nd ed. (1998), ch. 2.
 */
export const partialFrequency = (
  tension: Newtons,
  massPerMetre: KilogramsPerMetre,
  length: Metres,
  n: number,
): Hertz => hertz((positive('n', n) * waveSpeed(tension, massPerMetre)) / (2 * positive('L', length)))

/** The first partial: f_1 = √(T/µ) / (2L). */
export const fundamental = (tension: Newtons, massPerMetre: KilogramsPerMetre, length: Metres): Hertz =>
  partialFrequency(tension, massPerMetre, length, 1)
