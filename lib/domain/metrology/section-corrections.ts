import { correctionOn, farFrom20 } from './correction-parts'
import type { Correction } from './evaluation'
import type { ModelOutcome } from './measurement-model'
import { type ModelFacts, STEEL_EXPANSION } from './model-facts'

/** Corrections that were made to the diameter. */
export function sectionCorrections(
  { celsius, context, expansion }: ModelFacts,
  { results }: ModelOutcome,
): readonly Correction[] {
  const { diameter } = results
  if (diameter === undefined) return []
  const error = context.micrometer?.error ?? 0
  const thermal = expansion === undefined ? 0 : -(expansion - STEEL_EXPANSION) * (celsius - 20)
  return [
    correctionOn('diameter', diameter, {
      id: 'micrometer-error',
      name: 'Known error of the micrometer',
      relative: error === 0 ? 0 : -error / diameter,
      formula: 'd − e',
      source: 'Calibration of the equipment.',
    }),
    correctionOn('diameter', diameter, {
      id: 'diameter-temperature',
      name: 'Temperature of specimen and gauge',
      relative: thermal === 0 ? 0 : thermal,
      formula: 'd (1 − (α − α_gauge)(t − 20 °C))',
      source: 'ISO 1 (reference temperature 20 °C).',
      outside:
        expansion === undefined
          ? 'No expansion is taken for a polymer or gut: measure near 20 °C.'
          : farFrom20(celsius),
    }),
  ]
}
