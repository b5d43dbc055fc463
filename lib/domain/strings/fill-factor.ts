import { positive } from '../units/positive'
import type { KilogramsPerCubicMetre, KilogramsPerMetre, Metres } from '../units/quantity'
import { type Core, coreAcrossCorners, coreArea } from './core-section'

/**
 * Share of the ring between core and outer diameter that wrap fills: φ = (µ − ρ_cA_c)/(ρ_w π(D² − d_c²)/4).
 *
 * µ kg/m, ρ kg/m³, D outer diameter m. Close round wrap 0.785 to 0.80, ground or flat wrap up to about 0.95;
 * above 1 or below 0.7 the construction data are wrong. Throws a RangeError when D is not larger than the
 * core. Source: geometry, derived.
 */
export function wrapFillFactor(
  massPerMetre: KilogramsPerMetre,
  core: Core & { readonly density: KilogramsPerCubicMetre },
  wrapDensity: KilogramsPerCubicMetre,
  outerDiameter: Metres,
): number {
  const inner = coreAcrossCorners(core)
  const ring = (Math.PI * (outerDiameter - inner) * (outerDiameter + inner)) / 4
  return (massPerMetre - core.density * coreArea(core)) / positive('ρ_w ring', wrapDensity * ring)
}
