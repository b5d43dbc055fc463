import { airDensity } from '../strings/air-density'
import { airViscosity } from '../strings/air-viscosity'
import { deadWeightForce, hangingStringForce } from '../strings/dead-weight-force'
import { diameterAt20ByContact, massPerMetreAt20 } from '../strings/diameter-at-20'
import { effectiveDensity } from '../strings/effective-density'
import { frequencyOfNote } from '../strings/pitch'
import { type ResonanceChain, resonanceChain } from '../strings/resonance-chain'
import { sectionFromPairs } from '../strings/section'
import { plainWireAxialStiffness, plainWireBendingStiffness } from '../strings/stiffness'
import { elasticStrain, loadedMassPerMetre, unloadedMassPerMetre } from '../strings/stretch'
import { tensionAtPitch } from '../strings/tension-at-pitch'
import { tensionWithStretch } from '../strings/tension-with-stretch'
import { weighedMass } from '../strings/weighed-mass'
import { ln } from '../units/elementary'
import {
  degreesCelsius,
  hertz,
  type KilogramsPerMetre,
  kilograms,
  kilogramsPerMetre,
  metres,
  metresPerSecondSquared,
  type Newtons,
  newtons,
  pascals,
  perKelvin,
} from '../units/quantity'
import type { CharacteristicId } from './characteristics'
import type { EvaluationContext } from './evaluation'
import type { InputValues } from './propagate'
import type { SpecimenSheet } from './sheet'
import { diameterPairs, fundamentalOfPlucks, type LoadFacts, loadOf } from './sheet-readings'

/** Linear expansion taken for the frame of a contact gauge, 1/K: steel (common practice, no source). */
const GAUGE_EXPANSION = perKelvin(11.5e-6)

/** The facts that do not change while inputs are varied. */
export interface ModelFacts {
  readonly sheet: SpecimenSheet
  readonly context: EvaluationContext
  readonly celsius: number
  readonly airDensity: ReturnType<typeof airDensity>
  readonly airViscosity: ReturnType<typeof airViscosity>
  readonly frequency: ReturnType<typeof fundamentalOfPlucks>
  readonly load: LoadFacts | undefined
  readonly unknownWeights: readonly string[]
  readonly referenceFrequency: ReturnType<typeof frequencyOfNote>
}

export function modelFacts(sheet: SpecimenSheet, context: EvaluationContext): ModelFacts {
  const celsius: number = sheet.temperature?.si ?? context.air.celsius
  const air = {
    temperature: degreesCelsius(celsius),
    pressure: pascals(sheet.pressure?.si ?? context.air.pascals),
    humidity: sheet.humidity ?? context.air.humidity,
  }
  const density = airDensity(air)
  const { load, unknown } = loadOf(sheet, context)
  const { midi, a4 } = context.specification.reference
  return {
    sheet,
    context,
    celsius,
    airDensity: density,
    airViscosity: airViscosity(air.temperature, density),
    frequency: fundamentalOfPlucks(sheet),
    load,
    unknownWeights: unknown,
    referenceFrequency: frequencyOfNote(midi, a4),
  }
}

/** Steps between readings and results that corrections and screens show. */
export interface ModelSteps {
  readonly force?: Newtons
  readonly hangingForce?: Newtons
  readonly chain?: ResonanceChain
  readonly axialStiffness: Newtons
  /** Loaded mass per metre found by weighing between marks. */
  readonly weighedLoaded?: KilogramsPerMetre
}

export interface ModelOutcome {
  readonly results: Readonly<Partial<Record<CharacteristicId, number>>>
  readonly steps: ModelSteps
}

/**
 * The whole chain from readings to results in one reference state (unloaded, 20 °C), as one function of its
 * inputs, so that results which share an input stay correlated as they are. Inputs by id (SI): see
 * `evaluation-inputs.ts`; offsets are zero and factors one at the centre.
 */
export function measurementModel(facts: ModelFacts, inputs: InputValues): ModelOutcome {
  const { context, sheet } = facts
  const { material, specification } = context
  const at = (id: string): number => inputs[id] ?? 0
  const results: Partial<Record<CharacteristicId, number>> = {}
  const expansion = material.kind === 'metal' ? material.thermalExpansion?.value : undefined
  const temperature = degreesCelsius(facts.celsius)

  const { pairs, complete } = diameterPairs(sheet, at('micrometer') - (context.micrometer?.error ?? 0))
  const read = sectionFromPairs(pairs)?.areaDiameter
  const contact =
    read === undefined || expansion === undefined
      ? read
      : diameterAt20ByContact(read, temperature, expansion, GAUGE_EXPANSION)
  const measured = contact === undefined ? undefined : metres(contact + at('section'))
  if (measured !== undefined) results.diameter = measured
  const ovality = sectionFromPairs(complete)?.ovality
  if (ovality !== undefined) results.ovality = ovality + at('ovality')

  const diameter = measured ?? specification.diameter.target
  const modulus = pascals(inputs.modulus ?? material.youngsModulus.value)
  const axialStiffness = plainWireAxialStiffness(modulus, diameter)
  const { force, hangingForce } = forceOf(facts, inputs)

  const at20 = (mass: KilogramsPerMetre): KilogramsPerMetre =>
    expansion === undefined ? mass : massPerMetreAt20(mass, temperature, expansion)

  let weighedLoaded: KilogramsPerMetre | undefined
  if (sheet.cutMass && sheet.cutLength) {
    const mass = weighedMass(
      kilograms(sheet.cutMass.si - (context.balance?.error ?? 0) + at('balance') + at('balanceReading')),
      facts.airDensity,
      material.density.value,
    )
    const length = sheet.cutLength.si - (context.rule?.error ?? 0) + at('rule') + at('ruleReading')
    if (mass > 0 && length > 0) {
      const perMetre = at20(kilogramsPerMetre(mass / length))
      if (sheet.weighedState === 'slack') results.massPerMetreWeighed = perMetre
      else if (force !== undefined) {
        weighedLoaded = perMetre
        results.massPerMetreWeighed = unloadedMassPerMetre(perMetre, elasticStrain(force, axialStiffness))
      }
    }
  }

  const span = sheet.span?.si ?? context.rig?.span.value
  let chain: ResonanceChain | undefined
  if (force !== undefined && facts.frequency && span !== undefined && context.rig) {
    const frequency = hertz(
      (facts.frequency.value - (context.counter?.error ?? 0) + at('plucks')) * (1 + at('counterRate')),
    )
    chain = resonanceChain(
      {
        force,
        span: metres(span + at('span')),
        endCondition: context.rig.endCondition,
        axialStiffness,
        bendingStiffness: plainWireBendingStiffness(modulus, diameter),
        outerDiameter: diameter,
        air: { density: facts.airDensity, viscosity: facts.airViscosity },
      },
      frequency,
    )
    const lifted = chain.raw * (1 + chain.endShift) * (1 + chain.endShift)
    const loaded = kilogramsPerMetre(chain.loaded + lifted * at('end') - chain.airMass * at('airMass'))
    results.massPerMetreSounded = at20(unloadedMassPerMetre(loaded, chain.strain))
  }

  const weighed = results.massPerMetreWeighed
  const sounded = results.massPerMetreSounded
  const expected = specification.effectiveDensity.target
  if (weighed !== undefined && sounded !== undefined) results.closure = ln(weighed / sounded)
  if (measured !== undefined && weighed !== undefined) {
    results.effectiveDensity = effectiveDensity(kilogramsPerMetre(weighed), measured)
    results.densityCheckWeighed = ln(results.effectiveDensity / expected)
  }
  if (measured !== undefined && sounded !== undefined)
    results.densityCheckSounded = ln(effectiveDensity(kilogramsPerMetre(sounded), measured) / expected)
  Object.assign(results, tensionResults(facts, axialStiffness, weighed ?? sounded, weighedLoaded))
  return {
    results,
    steps: {
      axialStiffness,
      ...(force === undefined ? {} : { force, hangingForce }),
      ...(chain ? { chain } : {}),
      ...(weighedLoaded === undefined ? {} : { weighedLoaded }),
    },
  }
}

/** Tension of the span: weights in air, the string that hangs below, friction at the edges. */
function forceOf(
  facts: ModelFacts,
  inputs: InputValues,
): { readonly force?: Newtons; readonly hangingForce?: Newtons } {
  const { context, load } = facts
  if (!load) return {}
  const gravity = metresPerSecondSquared(inputs.gravity ?? context.gravity.value)
  const value = load.value + (inputs.load ?? 0)
  const carried =
    load.kind === 'force' ? newtons(value) : deadWeightForce(kilograms(value), gravity, facts.airDensity)
  // Its own share of the load is below a per mille: the target stands for the mass that is looked for.
  const hangingForce = hangingStringForce(
    context.specification.massPerMetre.target,
    metres(context.rig?.hangingLength ?? 0),
    gravity,
  )
  return { force: newtons((carried + hangingForce) * (1 + (inputs.friction ?? 0))), hangingForce }
}

/** Tension at the reference note by the specification's basis, and the pitch when hung at its target. */
function tensionResults(
  facts: ModelFacts,
  axialStiffness: Newtons,
  massPerMetre: number | undefined,
  weighedLoaded: KilogramsPerMetre | undefined,
): Readonly<Partial<Record<CharacteristicId, number>>> {
  if (massPerMetre === undefined) return {}
  const { basis, reference, tension } = facts.context.specification
  const unloaded = kilogramsPerMetre(massPerMetre)
  const frequency = facts.referenceFrequency
  const stretched = loadedMassPerMetre(unloaded, elasticStrain(tension.target, axialStiffness))
  const hung = basis === 'plain-formula' ? unloaded : (weighedLoaded ?? stretched)
  const plainAt = (mass: KilogramsPerMetre): number => tensionAtPitch(mass, frequency, reference.length)
  return {
    tension:
      basis === 'unloaded-mass'
        ? tensionWithStretch(unloaded, frequency, reference.length, axialStiffness)
        : plainAt(basis === 'loaded-mass' ? hung : unloaded),
    // f ∝ √(T/µ): cents = 600 log₂(T_target / T needed at the note by the mass that then hangs).
    pitchError: (600 * ln(tension.target / plainAt(hung))) / Math.LN2,
  }
}
