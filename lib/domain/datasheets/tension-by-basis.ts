import type { TensionBasis } from '../metrology/specification'
import { tensionAtPitch } from '../strings/tension-at-pitch'
import { tensionWithStretch } from '../strings/tension-with-stretch'
import type { Hertz, KilogramsPerMetre, Metres, Newtons } from '../units/quantity'

export interface TensionMasses {
  /** Mass per metre of the unloaded string, kg/m. */
  readonly unloaded: KilogramsPerMetre
  /** Mass per metre under load, kg/m. */
  readonly loaded: KilogramsPerMetre
  /** EA of the load-bearing section, N. */
  readonly axialStiffness: Newtons
}

/**
 * Tension at a note and length on a stated basis:
 * - *unloaded mass, stretch solved*: T = (EA/2)(√(1 + 4T₀/EA) − 1), T₀ = µ₀(2Lf)²;
 * - *loaded mass*: T = µ_loaded (2Lf)²;
 * - *plain formula*: T = µ₀(2Lf)², for comparison.
 *
 * Throws a RangeError for values not above zero. Sources: those of `tension-at-pitch.ts`, `tension-with-stretch.ts`.
 */
export function tensionByBasis(
  basis: TensionBasis,
  masses: TensionMasses,
  frequency: Hertz,
  length: Metres,
): Newtons {
  if (basis === 'unloaded-mass')
    return tensionWithStretch(masses.unloaded, frequency, length, masses.axialStiffness)
  return tensionAtPitch(basis === 'loaded-mass' ? masses.loaded : masses.unloaded, frequency, length)
}

/** The basis as it is printed, with its law. */
export const basisSentences: Readonly<Record<TensionBasis, string>> = {
  'unloaded-mass': 'Basis: unloaded mass, stretch solved. T = (EA/2)(√(1 + 4T₀/EA) − 1), T₀ = µ (2 L f)².',
  'loaded-mass': 'Basis: loaded mass. T = µ_loaded (2 L f)².',
  'plain-formula': 'Basis: plain formula, for comparison. T = µ (2 L f)².',
}

export const basisNames: Readonly<Record<TensionBasis, string>> = {
  'unloaded-mass': 'unloaded mass, stretch solved',
  'loaded-mass': 'loaded mass',
  'plain-formula': 'plain formula',
}
