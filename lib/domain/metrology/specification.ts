import type { Core } from '../strings/core-section'
import type { Hertz, KilogramsPerCubicMetre, KilogramsPerMetre, Metres, Newtons } from '../units/quantity'
import type { CharacteristicId } from './characteristics'

export interface Tolerance<Q extends number> {
  readonly target: Q
  readonly lower: Q
  readonly upper: Q
}

/**
 * What a published tension rests on (DESIGN §2): unloaded mass with the stretch solved, loaded mass,
 * or the plain formula, for comparison.
 */
export type TensionBasis = 'unloaded-mass' | 'loaded-mass' | 'plain-formula'

/** How a lot is inspected. */
export interface InspectionPlan {
  readonly specimens: number
  readonly positions: number
  readonly directions: 1 | 2
  /** Ends from which specimens 1, 2, … are taken. */
  readonly takenAt: readonly ('head' | 'tail')[]
  readonly weighedState: 'slack' | 'marked'
  readonly cutLength: Metres
  /** Acceptance constant k of the plan by variables: (limit − mean)/s ≥ k. */
  readonly acceptanceConstant: number
  readonly rigCode: string
}

/** One dated revision of what a product has to be, SI throughout. */
export interface SpecificationBody {
  /** What bears the load of a wound string, made of the specification’s material; a plain string has none. */
  readonly core?: Core
  readonly diameter: Tolerance<Metres>
  readonly massPerMetre: Tolerance<KilogramsPerMetre>
  readonly ovalityMax: Metres
  readonly effectiveDensity: Tolerance<KilogramsPerCubicMetre>
  /** Note (MIDI number), concert A and length at which tension is stated. */
  readonly reference: { readonly midi: number; readonly a4: Hertz; readonly length: Metres }
  readonly tension: Tolerance<Newtons>
  readonly basis: TensionBasis
  /** Guard factor r of the guard band r·U, 0 or 1; 1 for tension and mass, 0 for ovality by default. */
  readonly guardFactors: Readonly<Partial<Record<CharacteristicId, 0 | 1>>>
  readonly plan: InspectionPlan
}
