import { positive } from '../units/positive'
import {
  type Hertz,
  type KilogramsPerMetre,
  type Metres,
  type MetresToTheFourth,
  metres,
  type NewtonSquareMetres,
  type Newtons,
  newtonSquareMetres,
  newtons,
  type Pascals,
  type SquareMetres,
} from '../units/quantity'
import { roundArea, roundSecondMoment } from './round-section'

/** Bending stiffness EI, N·m². For a wound string EI of the core is a lower bound: fit B, do not predict it. */
export const bendingStiffness = (modulus: Pascals, secondMoment: MetresToTheFourth): NewtonSquareMetres =>
  newtonSquareMetres(positive('E', modulus) * secondMoment)

/** Axial stiffness EA, N, of the load-bearing section (the core alone of a wound string). */
export const axialStiffness = (modulus: Pascals, area: SquareMetres): Newtons =>
  newtons(positive('E', modulus) * positive('A', area))

/** EI of solid round wire: E π d⁴/64. */
export const plainWireBendingStiffness = (modulus: Pascals, diameter: Metres): NewtonSquareMetres =>
  bendingStiffness(modulus, roundSecondMoment(diameter))

/** EA of solid round wire: E π d²/4. */
export const plainWireAxialStiffness = (modulus: Pascals, diameter: Metres): Newtons =>
  axialStiffness(modulus, roundArea(diameter))

/**
 * Inharmonicity B = π² E I/(T L²); for plain round wire π³ E d⁴/(64 T L²). Dimensionless.
 *
 * EI bending stiffness N·m², T tension N, L speaking length m. EI may be zero (a perfectly flexible string).
 * Throws a RangeError when T or L is not above zero. Source: H. Fletcher, J. Acoust. Soc. Am. 36 (1964) 203.
 */
export const inharmonicity = (stiffness: NewtonSquareMetres, tension: Newtons, length: Metres): number =>
  (Math.PI * Math.PI * stiffness) / (positive('T', tension) * positive('L', length) * length)

/** Bending length λ = √(EI/T), m: the distance over which an end bends the string. √B = πλ/L. */
export const bendingLength = (stiffness: NewtonSquareMetres, tension: Newtons): Metres =>
  metres(Math.sqrt(stiffness / positive('T', tension)))

/**
 * First-order rise of the fundamental by stiffness with pinned ends: (π/2) E A² µ f²/T², equal to B/2.
 * E Pa, A m², µ kg/m, f Hz, T N. Round wire only. Source: R. P. Feynman, letter of 1961, Physics Today
 * 62 (12) (2009) 46, from memory; the identity with B/2 was checked.
 */
export function stiffnessFirstOrder(
  modulus: Pascals,
  area: SquareMetres,
  massPerMetre: KilogramsPerMetre,
  frequency: Hertz,
  tension: Newtons,
): number {
  const share = (area * frequency) / positive('T', tension)
  return (Math.PI / 2) * modulus * massPerMetre * share * share
}
