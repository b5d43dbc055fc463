import { positive } from '../units/positive'
import {
  type KilogramsPerCubicMetre,
  type KilogramsPerMetre,
  kilogramsPerCubicMetre,
  type Metres,
} from '../units/quantity'
import { roundArea } from './round-section'

/**
 * Effective density: ρ_eff = µ/(π d²/4).
 *
 * µ kg/m, d outer diameter m, ρ_eff kg/m³. A plain string has the density of its material within 2u(d)/d;
 * close-wound metal on metal lies between min(ρ_c, 0.785ρ_w) and max(ρ_c, ρ_w), typically 6300–7200.
 * Throws a RangeError unless both are above zero. Source: definition.
 */
export const effectiveDensity = (massPerMetre: KilogramsPerMetre, diameter: Metres): KilogramsPerCubicMetre =>
  kilogramsPerCubicMetre(positive('µ', massPerMetre) / roundArea(diameter))
