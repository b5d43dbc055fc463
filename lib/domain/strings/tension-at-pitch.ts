import { positive } from '../units/positive'
import { type Hertz, type KilogramsPerMetre, type Metres, type Newtons, newtons } from '../units/quantity'

/**
 * Tension that brings a flexible string to a fundamental: T = µ (2 L f)².
 *
 * µ mass per metre kg/m, f fundamental Hz, L speaking length m, T N. With the mass of the loaded string this
 * is the basis *loaded mass*; with the unloaded mass it is the *plain formula*, too high by T/EA (0.7 % for
 * a thin steel string, 5 % for nylon): see `tension-with-stretch.ts`.
 * Throws a RangeError unless all are above zero.
 * Source: Rayleigh, Theory of Sound I (1894), ch. VI; Fletcher & Rossing (1998), ch. 2.
 */
export function tensionAtPitch(massPerMetre: KilogramsPerMetre, frequency: Hertz, length: Metres): Newtons {
  const speed = 2 * positive('L', length) * positive('f', frequency)
  return newtons(positive('µ', massPerMetre) * speed * speed)
}
