import { positive } from '../units/positive'
import {
  type Kilograms,
  type KilogramsPerCubicMetre,
  type KilogramsPerMetre,
  kilogramsPerCubicMetre,
  type Metres,
  type MetresPerSecondSquared,
  type Newtons,
  newtons,
} from '../units/quantity'
import { CONVENTIONAL_WEIGHT_DENSITY, trueMass } from './conventional-mass'

/**
 * Force of a hanging weight in air: F = m g (1 − ρ_a/ρ_m), m the true mass.
 *
 * m_c conventional mass kg (what a certificate or a balance gives), g local gravity m/s², ρ_a air density
 * kg/m³, ρ_m density of the weight kg/m³, F N. Without ρ_m the conventional 8000 kg/m³ are taken: at
 * ρ_a = 1.2 that is exact for every weight, F = m_c g (1 − 1.5e-4), and 0.1 kg/m³ of air density away it
 * errs by 2e-6 for iron. Hook and carrier belong to the mass; friction and stretch are not in here.
 * Throws a RangeError when g or ρ_m is not above zero. Source: OIML D 28 (2004), OIML R 111-1 (2004).
 */
export const deadWeightForce = (
  conventional: Kilograms,
  gravity: MetresPerSecondSquared,
  airDensity: KilogramsPerCubicMetre,
  weightDensity: KilogramsPerCubicMetre = kilogramsPerCubicMetre(CONVENTIONAL_WEIGHT_DENSITY),
): Newtons =>
  newtons(trueMass(conventional, weightDensity) * positive('g', gravity) * (1 - airDensity / weightDensity))

/**
 * Weight of the string that hangs below the lower edge, which pulls on the span above: F = µ h g.
 * µ kg/m, h m, g m/s², F N: 1.6e-5 of the load for thin steel, 6e-4 for a wound bass. Source: definition.
 */
export const hangingStringForce = (
  massPerMetre: KilogramsPerMetre,
  hanging: Metres,
  gravity: MetresPerSecondSquared,
): Newtons => newtons(massPerMetre * hanging * gravity)
