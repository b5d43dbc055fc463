import { positive } from '../units/positive'
import { type Kilograms, type KilogramsPerCubicMetre, kilograms } from '../units/quantity'

/** Conventional air and weights of the definition. Source: OIML D 28 (2004). */
export const CONVENTIONAL_AIR_DENSITY = 1.2
export const CONVENTIONAL_WEIGHT_DENSITY = 8000

/**
 * True mass of a body whose conventional mass is known: m = m_c (1 − 1.2/8000)/(1 − 1.2/ρ_m).
 *
 * A certificate or a balance gives m_c: the mass of a weight of 8000 kg/m³ that balances the body in air of
 * 1.2 kg/m³ at 20 °C. m_c and m kg, ρ_m density of the body kg/m³. Throws a RangeError unless ρ_m is above
 * zero. Source: OIML D 28 (2004), OIML R 111-1 (2004).
 */
export const trueMass = (conventional: Kilograms, density: KilogramsPerCubicMetre): Kilograms =>
  kilograms(
    (conventional * (1 - CONVENTIONAL_AIR_DENSITY / CONVENTIONAL_WEIGHT_DENSITY)) /
      (1 - CONVENTIONAL_AIR_DENSITY / positive('ρ_m', density)),
  )

/** By how much the conventional mass of a body exceeds its mass, relative: about −3e-4 for aluminium. */
export const conventionalMassExcess = (density: KilogramsPerCubicMetre): number =>
  (1 - CONVENTIONAL_AIR_DENSITY / positive('ρ_m', density)) /
    (1 - CONVENTIONAL_AIR_DENSITY / CONVENTIONAL_WEIGHT_DENSITY) -
  1
