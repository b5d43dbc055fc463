import { positive } from '../units/positive'
import {
  type Kilograms,
  type KilogramsPerCubicMetre,
  kilograms,
  kilogramsPerCubicMetre,
} from '../units/quantity'
import { CONVENTIONAL_WEIGHT_DENSITY } from './conventional-mass'

/**
 * Mass of a sample from the reading of a balance: m = R (1 − ρ_a/ρ_ref)/(1 − ρ_a/ρ_s).
 *
 * R reading kg, ρ_a air density, ρ_s density of the sample, ρ_ref density of the weights the balance is
 * adjusted with (8000, conventional), all kg/m³. +3e-6 for steel, +9e-4 for nylon.
 * Throws a RangeError unless the densities are above zero. Source: OIML D 28 (2004); buoyancy.
 */
export const weighedMass = (
  reading: Kilograms,
  airDensity: KilogramsPerCubicMetre,
  sampleDensity: KilogramsPerCubicMetre,
  referenceDensity: KilogramsPerCubicMetre = kilogramsPerCubicMetre(CONVENTIONAL_WEIGHT_DENSITY),
): Kilograms =>
  kilograms(
    (reading * (1 - airDensity / positive('ρ_ref', referenceDensity))) /
      (1 - airDensity / positive('ρ_s', sampleDensity)),
  )
