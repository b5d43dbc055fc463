import { effectiveDensity } from '../strings/effective-density'
import { loadBearingSection } from '../strings/load-bearing'
import type { MaterialBody } from '../strings/material'
import { frequencyOfNote } from '../strings/pitch'
import { solidWireMassPerMetre } from '../strings/round-section'
import { axialStiffness } from '../strings/stiffness'
import { tensionAtPitch } from '../strings/tension-at-pitch'
import { tensionWithStretch } from '../strings/tension-with-stretch'
import {
  type KilogramsPerMetre,
  kilogramsPerCubicMetre,
  kilogramsPerMetre,
  type Metres,
  metres,
  type Newtons,
} from '../units/quantity'
import type { SpecificationBody } from './specification'

/**
 * What a person decides of a string; the rest follows from the material. Tolerances are half-widths. A string
 * with a core is wound: its mass per metre has to be given, as wraps are not reckoned here.
 */
export interface SpecificationDraft
  extends Pick<SpecificationBody, 'core' | 'ovalityMax' | 'reference' | 'basis' | 'guardFactors' | 'plan'> {
  readonly diameter: { readonly target: Metres; readonly tolerance: Metres }
  /** `target` only where it shall differ from diameter and density; tolerance relative. */
  readonly massPerMetre: { readonly target?: KilogramsPerMetre; readonly tolerance: number }
  /** Relative, about the density of the material, or of core and wraps together. */
  readonly densityTolerance: number
}

/**
 * The whole specification of a string from what a person decides: mass per metre µ = ρπd²/4 unless typed (of
 * a wound string the density is µ over the area of the outer diameter, and the core stretches), and the tension at the reference note, T, of the target and of either mass limit on the stated basis
 * (for a loaded mass that follows from the unloaded one the stretch is solved for, too).
 * SI throughout. Throws a RangeError for values out of the laws' range, or a core without a mass per metre. Source: the laws named, derived.
 */
export function completeSpecification(draft: SpecificationDraft, material: MaterialBody): SpecificationBody {
  const { diameter, massPerMetre, densityTolerance, reference, basis, ...rest } = draft
  const { core } = draft
  if (core && massPerMetre.target === undefined) throw new RangeError('a wound string without mass per metre')
  const mass = massPerMetre.target ?? solidWireMassPerMetre(diameter.target, material.density.value)
  const density = core ? effectiveDensity(mass, diameter.target) : material.density.value
  const massTimes = (factor: number) => kilogramsPerMetre(mass * factor)
  const lightest = massTimes(1 - massPerMetre.tolerance)
  const heaviest = massTimes(1 + massPerMetre.tolerance)
  const stiffness = axialStiffness(
    material.youngsModulus.value,
    loadBearingSection(core, diameter.target).area,
  )
  const frequency = frequencyOfNote(reference.midi, reference.a4)
  const tensionOf = (unloaded: KilogramsPerMetre): Newtons =>
    basis === 'plain-formula'
      ? tensionAtPitch(unloaded, frequency, reference.length)
      : tensionWithStretch(unloaded, frequency, reference.length, stiffness)
  return {
    ...rest,
    basis,
    reference,
    diameter: {
      target: diameter.target,
      lower: metres(diameter.target - diameter.tolerance),
      upper: metres(diameter.target + diameter.tolerance),
    },
    massPerMetre: { target: mass, lower: lightest, upper: heaviest },
    effectiveDensity: {
      target: density,
      lower: kilogramsPerCubicMetre(density * (1 - densityTolerance)),
      upper: kilogramsPerCubicMetre(density * (1 + densityTolerance)),
    },
    tension: { target: tensionOf(mass), lower: tensionOf(lightest), upper: tensionOf(heaviest) },
  }
}
