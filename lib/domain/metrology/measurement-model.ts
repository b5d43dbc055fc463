import { effectiveDensity } from '../strings/effective-density'
import { loadBearingSection } from '../strings/load-bearing'
import type { ResonanceChain } from '../strings/resonance-chain'
import {
  axialStiffness as axialStiffnessOf,
  bendingStiffness as bendingStiffnessOf,
} from '../strings/stiffness'
import { ln } from '../units/elementary'
import { type KilogramsPerMetre, type Newtons, pascals } from '../units/quantity'
import type { CharacteristicId } from './characteristics'
import { forceOutcome } from './force-model'
import type { InputValues } from './input-values'
import type { ModelFacts } from './model-facts'
import { sectionOutcome } from './section-model'
import { soundingOutcome } from './sounding-model'
import { tensionOutcome } from './tension-model'
import { weighingOutcome } from './weighing-model'

/** Steps between readings and results that corrections and screens show. */
export interface ModelSteps {
  readonly force?: Newtons
  readonly hangingForce?: Newtons
  readonly chain?: ResonanceChain
  readonly axialStiffness: Newtons
  /** Loaded mass per metre found by weighing between marks. */
  readonly weighedLoaded?: KilogramsPerMetre
  /** Why the sounding gave nothing although everything was read. */
  readonly refusal?: string
}

export interface ModelOutcome {
  readonly results: Readonly<Partial<Record<CharacteristicId, number>>>
  readonly steps: ModelSteps
}

/**
 * The whole chain from readings to results in one reference state (unloaded, 20 °C), as one function of its
 * inputs, so that results which share an input stay correlated as they are: diameter enters both routes by
 * stretch and stiffness, gravity and load only the sounded one. Inputs by id: see the models it is made of;
 * `modulus` Pa and `gravity` m/s² are values, the rest are offsets or relative errors, zero at the centre.
 * A wound string stretches and bends by its core, and pushes the air by its outer diameter.
 * Closure and density checks are natural logarithms of ratios. Where no diameter was read, the target stands
 * in for it in the corrections, and density and diameter are left out.
 */
export function measurementModel(facts: ModelFacts, inputs: InputValues): ModelOutcome {
  const { material, specification } = facts.context
  const section = sectionOutcome(facts, inputs)
  const diameter = section.diameter ?? specification.diameter.target
  const modulus = pascals(inputs.modulus ?? material.youngsModulus.value)
  const bearing = loadBearingSection(specification.core, diameter)
  const axialStiffness = axialStiffnessOf(modulus, bearing.area)
  const bendingStiffness = bendingStiffnessOf(modulus, bearing.secondMoment)
  const { force, hangingForce } = forceOutcome(facts, inputs)
  const weighing = weighingOutcome(facts, inputs, force, axialStiffness)
  const sounding = soundingOutcome(facts, inputs, { force, diameter, axialStiffness, bendingStiffness })
  const weighed = weighing.massPerMetre
  const sounded = sounding.massPerMetre
  const density = (mass: KilogramsPerMetre | undefined): number | undefined =>
    mass === undefined || section.diameter === undefined
      ? undefined
      : effectiveDensity(mass, section.diameter)
  const expected = specification.effectiveDensity.target
  const byWeighing = density(weighed)
  const bySounding = density(sounded)
  const { tension, pitchError } = tensionOutcome(facts, axialStiffness, weighed ?? sounded, weighing.loaded)
  return {
    results: given({
      diameter: section.diameter,
      ovality: section.ovality,
      massPerMetreWeighed: weighed,
      massPerMetreSounded: sounded,
      closure: weighed === undefined || sounded === undefined ? undefined : ln(weighed / sounded),
      densityCheckWeighed: byWeighing === undefined ? undefined : ln(byWeighing / expected),
      densityCheckSounded: bySounding === undefined ? undefined : ln(bySounding / expected),
      effectiveDensity: byWeighing,
      tension,
      pitchError,
    }),
    steps: {
      axialStiffness,
      ...given({ force, hangingForce, chain: sounding.chain, refusal: sounding.refusal }),
      ...given({ weighedLoaded: weighing.loaded }),
    },
  }
}

/** Only what there is: a result that cannot be had is absent, never NaN. */
const given = <T extends object>(all: T): { readonly [Key in keyof T]?: NonNullable<T[Key]> } =>
  Object.fromEntries(Object.entries(all).filter(([, value]) => value !== undefined)) as {
    readonly [Key in keyof T]?: NonNullable<T[Key]>
  }
