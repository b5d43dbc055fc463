import { elasticStrain, loadedMassPerMetre } from '../strings/stretch'
import { tensionAtPitch } from '../strings/tension-at-pitch'
import { tensionWithStretch } from '../strings/tension-with-stretch'
import { ln } from '../units/elementary'
import type { KilogramsPerMetre, Newtons } from '../units/quantity'
import type { ModelFacts } from './model-facts'

export interface TensionOutcome {
  readonly tension?: number
  readonly pitchError?: number
}

/**
 * Tension at the reference note and length on the specification's basis, and how far the note is off, in
 * cents, when the string hangs at the reference tension: f ∝ √(T/µ), so 600 log₂ of the target over the
 * tension that the mass which then hangs needs at the note. A piece weighed between marks made under load
 * gives the loaded mass itself. Sources: those of `tension-at-pitch.ts`, `tension-with-stretch.ts`.
 */
export function tensionOutcome(
  { context, referenceFrequency }: ModelFacts,
  axialStiffness: Newtons,
  unloaded: KilogramsPerMetre | undefined,
  weighedLoaded: KilogramsPerMetre | undefined,
): TensionOutcome {
  if (unloaded === undefined) return {}
  const { basis, reference, tension } = context.specification
  const stretched = loadedMassPerMetre(unloaded, elasticStrain(tension.target, axialStiffness))
  const hung = basis === 'plain-formula' ? unloaded : (weighedLoaded ?? stretched)
  const plainAt = (mass: KilogramsPerMetre): number =>
    tensionAtPitch(mass, referenceFrequency, reference.length)
  return {
    tension:
      basis === 'unloaded-mass'
        ? tensionWithStretch(unloaded, referenceFrequency, reference.length, axialStiffness)
        : plainAt(basis === 'loaded-mass' ? hung : unloaded),
    pitchError: (600 * ln(tension.target / plainAt(hung))) / Math.LN2,
  }
}
