import { positive } from '../units/positive'
import {
  type Hertz,
  hertz,
  type Joules,
  joules,
  type Kilograms,
  type KilogramsPerCubicMetre,
  type Metres,
  type MetresPerSecondSquared,
  type Newtons,
  newtons,
  type Pascals,
  pascals,
  type SquareMetres,
} from '../units/quantity'
import type { MaterialBody } from './material'

export interface StrengthRange {
  readonly low: Pascals
  readonly high: Pascals
}

/**
 * Tensile strength of a material at a diameter: linear between the rows of its table, else its strength of
 * any size; undefined outside the table or when nothing is known. d m, strength Pa.
 */
export function tensileStrengthAt(
  material: Pick<MaterialBody, 'strengthByDiameter' | 'tensileStrength'>,
  diameter: Metres,
): StrengthRange | undefined {
  const rows = material.strengthByDiameter
  if (!rows || rows.length === 0) return material.tensileStrength
  const upper = rows.find((row) => row.diameter >= diameter)
  const lower = rows.findLast((row) => row.diameter <= diameter)
  if (!upper || !lower) return undefined
  const span = upper.diameter - lower.diameter
  const share = span === 0 ? 0 : (diameter - lower.diameter) / span
  return {
    low: pascals(lower.low + share * (upper.low - lower.low)),
    high: pascals(lower.high + share * (upper.high - lower.high)),
  }
}

/** Breaking load F_b = R_m A, N; A the load-bearing area (core alone when wound). Source: definition of R_m. */
export const breakingLoad = (strength: Pascals, area: SquareMetres): Newtons =>
  newtons(positive('R_m', strength) * positive('A', area))

/** Share of the breaking load at work: T/F_b. Steel works at 0.4–0.75, nylon and gut lower (practice). */
export const workingFraction = (tension: Newtons, breaking: Newtons): number =>
  tension / positive('F_b', breaking)

/** Above this share of the minimum breaking load a caution is shown; above the other a test load is refused. */
export const CAUTION_FRACTION = 0.75
export const REFUSAL_FRACTION = 0.85

/** Tensile stress T/A, Pa. */
export const tensileStress = (tension: Newtons, area: SquareMetres): Pascals =>
  pascals(tension / positive('A', area))

/**
 * Pitch at which a plain string breaks, whatever its diameter: f_b = √(R_m/ρ)/(2L).
 * R_m Pa, ρ kg/m³, L m. Source: T = R_m A and µ = ρA in f = √(T/µ)/(2L).
 */
export const breakingPitch = (strength: Pascals, density: KilogramsPerCubicMetre, length: Metres): Hertz =>
  hertz(Math.sqrt(positive('R_m', strength) / positive('ρ', density)) / (2 * positive('L', length)))

/** Elastic energy of a loaded string: T² L/(2EA), J. Source: Hooke's law. */
export const storedEnergy = (tension: Newtons, length: Metres, axialStiffness: Newtons): Joules =>
  joules((tension * tension * length) / (2 * positive('EA', axialStiffness)))

/** Energy of a load that falls: m g h, J; usually far more than the string stores. */
export const dropEnergy = (mass: Kilograms, height: Metres, gravity: MetresPerSecondSquared): Joules =>
  joules(mass * gravity * height)

/** Strength in thousands of pounds-force per square inch as Pa: × 6 894 757.293168… Source: exact units. */
export const pascalsFromKsi = (ksi: number): Pascals => pascals((ksi * 1000 * 4.4482216152605) / 0.00064516)
