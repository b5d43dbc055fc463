import { STANDARD_GRAVITY } from '../strings/standard-gravity'
import { ln } from '../units/elementary'
import type { Correction } from './evaluation'
import type { ModelFacts, ModelOutcome } from './measurement-model'

/** A relative change of mass per metre as cents of the fundamental. */
const centsOfMass = (relative: number): number => (600 * ln(1 + relative)) / Math.LN2

/** Every correction that was made, in the order of the chain, each with its size, sign and source. */
export function evaluationCorrections(facts: ModelFacts, outcome: ModelOutcome): readonly Correction[] {
  return [
    ...diameterCorrections(facts, outcome),
    ...weighingCorrections(facts, outcome),
    ...soundingCorrections(facts, outcome),
  ]
}

function diameterCorrections(
  { celsius, context }: ModelFacts,
  { results }: ModelOutcome,
): readonly Correction[] {
  const { diameter } = results
  if (diameter === undefined) return []
  const error = context.micrometer?.error ?? 0
  const expansion = context.material.kind === 'metal' ? context.material.thermalExpansion?.value : undefined
  const thermal = expansion === undefined ? 0 : -(expansion - 11.5e-6) * (celsius - 20)
  return [
    {
      id: 'micrometer-error',
      name: 'Known error of the micrometer',
      on: 'diameter',
      relative: -error / diameter,
      amount: -error,
      formula: 'd − e',
      source: 'Calibration of the equipment.',
    },
    {
      id: 'diameter-temperature',
      name: 'Temperature of specimen and gauge',
      on: 'diameter',
      relative: thermal,
      amount: thermal * diameter,
      formula: 'd (1 − (α − α_gauge)(t − 20 °C))',
      source: 'ISO 1 (reference temperature 20 °C).',
    },
  ]
}

function weighingCorrections(facts: ModelFacts, { results, steps }: ModelOutcome): readonly Correction[] {
  const weighed = results.massPerMetreWeighed
  if (weighed === undefined) return []
  const { material } = facts.context
  const buoyancy = (1 - facts.airDensity / 8000) / (1 - facts.airDensity / material.density.value) - 1
  const strain = steps.weighedLoaded === undefined ? 0 : weighed / steps.weighedLoaded - 1
  return [
    {
      id: 'specimen-buoyancy',
      name: 'Buoyancy of the weighed piece',
      on: 'massPerMetreWeighed',
      relative: buoyancy,
      amount: buoyancy * weighed,
      cents: centsOfMass(buoyancy),
      formula: '(1 − ρ_a/8000) / (1 − ρ_a/ρ)',
      source: 'OIML D 28 (2004).',
    },
    ...(strain === 0
      ? []
      : [
          {
            id: 'marked-stretch',
            name: 'Stretch between the marks',
            on: 'massPerMetreWeighed' as const,
            relative: strain,
            amount: strain * weighed,
            cents: centsOfMass(strain),
            formula: 'µ (1 + F/EA)',
            source: 'Hooke’s law.',
          },
        ]),
  ]
}

function soundingCorrections(facts: ModelFacts, { results, steps }: ModelOutcome): readonly Correction[] {
  const { chain, force, hangingForce } = steps
  const sounded = results.massPerMetreSounded
  if (!chain || force === undefined || hangingForce === undefined || sounded === undefined) return []
  const { context, load } = facts
  const buoyancy = load?.kind === 'mass' ? -facts.airDensity / 8000 : 0
  const gravity = load?.kind === 'mass' ? context.gravity.value / STANDARD_GRAVITY - 1 : 0
  const lift = (1 + chain.endShift) * (1 + chain.endShift) - 1
  const lifted = chain.raw * (1 + lift)
  const onForce = (
    id: string,
    name: string,
    relative: number,
    formula: string,
    source: string,
  ): Correction => ({
    id,
    name,
    on: 'force',
    relative,
    amount: relative * force,
    cents: centsOfMass(relative),
    formula,
    source,
  })
  const onMass = (
    id: string,
    name: string,
    relative: number,
    formula: string,
    source: string,
    outside?: string,
  ): Correction => ({
    id,
    name,
    on: 'massPerMetreSounded',
    relative,
    amount: relative * sounded,
    cents: centsOfMass(relative),
    formula,
    source,
    ...(outside === undefined ? {} : { outside }),
  })
  return [
    onForce(
      'gravity',
      'Local gravity instead of standard gravity',
      gravity,
      'g / 9.80665',
      'Gravity of the works.',
    ),
    onForce(
      'load-buoyancy',
      'Buoyancy of the load',
      buoyancy,
      '1 − ρ_a/8000',
      'OIML D 28 (2004), OIML R 111-1 (2004).',
    ),
    onForce(
      'hanging-string',
      'String that hangs below the edge',
      hangingForce / (force - hangingForce),
      'µ h g',
      'Definition.',
    ),
    onMass(
      'end-condition',
      `Stiffness and ends: ${context.rig?.endCondition ?? 'knife'}`,
      lift,
      '(1 + e)², B = π²EI/(FL²)',
      'H. Fletcher, J. Acoust. Soc. Am. 36 (1964) 203; knife edge derived.',
      chain.inharmonicity > 1e-3 ? 'B is above 0.001: the end formulas are first order there.' : undefined,
    ),
    onMass('air', 'Air that moves along', -chain.airMass / lifted, '−µ_air', 'G. G. Stokes (1851).'),
    onMass(
      'stretch',
      'Stretch under the load',
      chain.strain,
      '1 + F/EA',
      'Hooke’s law.',
      context.material.kind === 'metal'
        ? undefined
        : 'The stretch of a polymer or gut is known to 20–40 %: mark the piece under load.',
    ),
  ]
}
