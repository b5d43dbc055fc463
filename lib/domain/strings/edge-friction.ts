import { exp } from '../units/elementary'
import { positive } from '../units/positive'
import { type Degrees, type Newtons, newtons } from '../units/quantity'

/**
 * Bounds of the tension behind an edge or pulley that holds the string by friction:
 * F e^{−µ_f θ} ≤ T ≤ F e^{+µ_f θ}.
 *
 * F load N, µ_f coefficient of friction, θ break angle in degrees. Taken as rectangular, u = half-width/√3.
 * Keep θ below 0.5° (string and weight vertical, edges only touching) and tap before reading.
 * Throws a RangeError when µ_f or θ is negative. Source: Euler–Eytelwein.
 */
export function edgeFrictionBounds(
  load: Newtons,
  friction: number,
  breakAngle: Degrees,
): { readonly lowest: Newtons; readonly highest: Newtons } {
  if (!(friction >= 0 && breakAngle >= 0))
    throw new RangeError(`friction ${friction} and break angle ${breakAngle}° have to be zero or more`)
  const grip = exp((friction * breakAngle * Math.PI) / 180)
  return { lowest: newtons(positive('F', load) / grip), highest: newtons(load * grip) }
}
