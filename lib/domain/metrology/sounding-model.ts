import { airMassPerMetre } from '../strings/air-loading'
import { lengthByRule, massPerMetreAt20 } from '../strings/diameter-at-20'
import { massPerMetreFromResonance } from '../strings/mass-from-resonance'
import { type ResonanceChain, resonanceChain } from '../strings/resonance-chain'
import { inharmonicity } from '../strings/stiffness'
import { unloadedMassPerMetre } from '../strings/stretch'
import {
  degreesCelsius,
  hertz,
  type KilogramsPerMetre,
  kilogramsPerMetre,
  type Metres,
  metres,
  type NewtonSquareMetres,
  type Newtons,
} from '../units/quantity'
import { type InputValues, offset } from './input-values'
import { type ModelFacts, STEEL_EXPANSION } from './model-facts'

/** Above this inharmonicity it is a bar rather than a string, and the chain is not claimed. */
const STIFFEST_STRING = 0.05

export interface SoundingOutcome {
  /** Unloaded mass per metre at 20 °C. */
  readonly massPerMetre?: KilogramsPerMetre
  readonly chain?: ResonanceChain
  /** Why there is none although everything was read. */
  readonly refusal?: string
}

export interface SoundedString {
  readonly force: Newtons | undefined
  /** Outer diameter, which pushes the air. */
  readonly diameter: Metres
  /** Of what bears the load. */
  readonly axialStiffness: Newtons
  readonly bendingStiffness: NewtonSquareMetres
}

/**
 * Mass per metre by load, span and frequency, through the whole chain of corrections, at 20 °C. Nothing where
 * load, frequency or rig is missing; a refusal in words where no string could sound so.
 * Inputs: `plucks` and `counter` Hz, `span` m, `end` and `airMass` relative, `temperature` K.
 * Sources: those of `resonance-chain.ts`, `diameter-at-20.ts`.
 */
export function soundingOutcome(
  facts: ModelFacts,
  inputs: InputValues,
  { axialStiffness, bendingStiffness, diameter, force }: SoundedString,
): SoundingOutcome {
  const { context, expansion, frequency: heard, sheet } = facts
  const { rig } = context
  if (force === undefined || !heard || !rig) return {}
  const temperature = degreesCelsius(facts.celsius + offset(inputs, 'temperature'))
  const read = (sheet.span?.si ?? rig.span.value) + offset(inputs, 'span')
  const sounding =
    heard.value - (context.counter?.error ?? 0) + offset(inputs, 'plucks') + offset(inputs, 'counter')
  if (!(read > 0 && sounding > 0)) return {}
  const span = lengthByRule(metres(read), temperature, STEEL_EXPANSION)
  const frequency = hertz(sounding)
  const air = { density: facts.airDensity, viscosity: facts.airViscosity }
  if (inharmonicity(bendingStiffness, force, span) > STIFFEST_STRING)
    return {
      refusal: 'So thick a string under so small a load sounds like a bar: look at load and diameter.',
    }
  if (massPerMetreFromResonance(force, frequency, span) < 2 * airMassPerMetre(diameter, frequency, air))
    return { refusal: 'The air alone would weigh as much at this frequency: look at frequency and load.' }
  const chain = resonanceChain(
    {
      force,
      span,
      endCondition: rig.endCondition,
      axialStiffness,
      bendingStiffness,
      outerDiameter: diameter,
      air,
    },
    frequency,
  )
  const lifted = chain.raw * (1 + chain.endShift) * (1 + chain.endShift)
  const loaded = chain.loaded + lifted * offset(inputs, 'end') - chain.airMass * offset(inputs, 'airMass')
  const unloaded = unloadedMassPerMetre(kilogramsPerMetre(loaded), chain.strain)
  return {
    chain,
    massPerMetre: expansion === undefined ? unloaded : massPerMetreAt20(unloaded, temperature, expansion),
  }
}
