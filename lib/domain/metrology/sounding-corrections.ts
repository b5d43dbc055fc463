import { STANDARD_GRAVITY } from '../strings/standard-gravity'
import { correctionOn, farFrom20, knownError, temperatureFactor, unusualAir } from './correction-parts'
import type { Correction } from './evaluation'
import type { ModelOutcome } from './measurement-model'
import type { ModelFacts } from './model-facts'

/** Corrections that were made to the force and to the sounded mass per metre, in the order of the chain. */
export function soundingCorrections(
  facts: ModelFacts,
  { results, steps }: ModelOutcome,
): readonly Correction[] {
  const { chain, force, hangingForce } = steps
  const sounded = results.massPerMetreSounded
  const { context, frequency, load } = facts
  if (!chain || !frequency || force === undefined || hangingForce === undefined || sounded === undefined)
    return []
  const onMass = (told: Parameters<typeof correctionOn>[2]) =>
    correctionOn('massPerMetreSounded', sounded, told)
  const lift = (1 + chain.endShift) * (1 + chain.endShift) - 1
  const counter = {
    what: 'counter',
    error: context.counter?.error,
    reading: frequency.value,
    power: -2,
  } as const
  return [
    ...forceCorrections(facts, load?.kind === 'mass', force, hangingForce),
    ...knownError('massPerMetreSounded', sounded, counter),
    onMass({
      id: 'end-condition',
      name: `Stiffness and ends: ${context.rig?.endCondition ?? 'knife'}`,
      relative: lift,
      formula: '(1 + e)², B = π²EI/(FL²)',
      source: 'H. Fletcher, J. Acoust. Soc. Am. 36 (1964) 203; knife edge derived.',
      outside:
        chain.inharmonicity > 1e-3 ? 'B is above 0.001: the end formulas are first order there.' : undefined,
    }),
    onMass({
      id: 'air',
      name: 'Air that moves along',
      relative: -chain.airMass / (chain.raw * (1 + lift)),
      formula: '−µ_air',
      source: 'G. G. Stokes (1851).',
    }),
    onMass({
      id: 'stretch',
      name: 'Stretch under the load',
      relative: chain.strain,
      formula: '1 + F/EA',
      source: 'Hooke’s law.',
      outside:
        context.material.kind === 'metal'
          ? undefined
          : 'The stretch of a polymer or gut is known to 20–40 %: mark the piece under load.',
    }),
    onMass({
      id: 'sounded-temperature',
      name: 'Temperature of string and rig',
      relative: temperatureFactor(facts, 2) - 1,
      formula: '(1 + α(t − 20 °C)) / (1 + α_rig(t − 20 °C))²',
      source: 'ISO 1 (reference temperature 20 °C).',
      outside: farFrom20(facts.celsius),
    }),
  ]
}

function forceCorrections(
  facts: ModelFacts,
  weights: boolean,
  force: number,
  hangingForce: number,
): readonly Correction[] {
  const { airDensity, context } = facts
  return [
    correctionOn('force', force, {
      id: 'gravity',
      name: 'Local gravity instead of standard gravity',
      relative: weights ? context.gravity.value / STANDARD_GRAVITY - 1 : 0,
      formula: 'g / 9.80665',
      source: 'Gravity of the works.',
    }),
    correctionOn('force', force, {
      id: 'load-buoyancy',
      name: 'Buoyancy of the load',
      relative: weights ? -airDensity / 8000 : 0,
      formula: '1 − ρ_a/8000',
      source: 'OIML D 28 (2004), OIML R 111-1 (2004).',
      outside: unusualAir(facts),
    }),
    correctionOn('force', force, {
      id: 'hanging-string',
      name: 'String that hangs below the edge',
      relative: hangingForce / (force - hangingForce),
      formula: 'µ h g',
      source: 'Definition.',
    }),
  ]
}
