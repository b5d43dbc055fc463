import { correctionOn, farFrom20, knownError, temperatureFactor, unusualAir } from './correction-parts'
import type { Correction } from './evaluation'
import type { ModelOutcome } from './measurement-model'
import { type ModelFacts, pieceDensity } from './model-facts'
import { pieceLength } from './weighing-model'

/** Corrections that were made to the weighed mass per metre. */
export function weighingCorrections(
  facts: ModelFacts,
  { results, steps }: ModelOutcome,
): readonly Correction[] {
  const weighed = results.massPerMetreWeighed
  const { context, sheet } = facts
  const { by, reading = 0 } = pieceLength(facts)
  if (weighed === undefined || !sheet.cutMass) return []
  const on = 'massPerMetreWeighed'
  const buoyancy = (1 - facts.airDensity / 8000) / (1 - facts.airDensity / pieceDensity(context)) - 1
  const strain = steps.weighedLoaded === undefined ? 0 : weighed / steps.weighedLoaded - 1
  const { balance, rule } = context
  return [
    ...knownError(on, weighed, {
      what: 'balance',
      error: balance?.error,
      reading: sheet.cutMass.si,
      power: 1,
    }),
    ...(by === 'rule'
      ? knownError(on, weighed, { what: 'rule', error: rule?.error, reading, power: -1 })
      : []),
    correctionOn(on, weighed, {
      id: 'specimen-buoyancy',
      name: 'Buoyancy of the weighed piece',
      relative: buoyancy,
      formula: '(1 − ρ_a/8000) / (1 − ρ_a/ρ)',
      source: 'OIML D 28 (2004).',
      outside: unusualAir(facts),
    }),
    correctionOn(on, weighed, {
      id: 'weighed-temperature',
      name: 'Temperature of piece and rule',
      relative: temperatureFactor(facts, 1) - 1,
      formula: '(1 + α(t − 20 °C)) / (1 + α_rule(t − 20 °C))',
      source: 'ISO 1 (reference temperature 20 °C).',
      outside: farFrom20(facts.celsius),
    }),
    ...(strain === 0
      ? []
      : [
          correctionOn(on, weighed, {
            id: 'marked-stretch',
            name: 'Stretch between the marks',
            relative: strain,
            formula: 'µ (1 + F/EA)',
            source: 'Hooke’s law.',
            outside:
              context.material.kind === 'metal'
                ? undefined
                : 'Elastic part only: the loaded mass per metre is the surer one for a polymer or gut.',
          }),
        ]),
  ]
}
