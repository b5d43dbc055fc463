import { loadBearingSection } from '../strings/load-bearing'
import { breakingLoad, tensileStrengthAt } from '../strings/strength'
import { type CharacteristicId, characteristicIds } from './characteristics'
import type { BudgetLine, Estimate, EvaluationContext, SpecimenEvaluation } from './evaluation'
import { evaluationCorrections } from './evaluation-corrections'
import { evaluationInputs } from './evaluation-inputs'
import { type ModelOutcome, measurementModel } from './measurement-model'
import { type ModelFacts, modelFacts } from './model-facts'
import { MODEL_VERSION } from './model-version'
import { propagate } from './propagate'
import type { SpecimenSheet } from './sheet'
import { pieceLength } from './weighing-model'

/**
 * All results of one specimen, with uncertainty, budgets and corrections, from what was read and what the
 * works knows. The one function that runs in the browser while a person types and on the server when the
 * specimen is stored: equal to the last bit. A partial sheet gives the results that can be had, and `missing`
 * says what the others wait for. Never a NaN, and no throw for finite readings within the bounds of a bench.
 */
export function evaluateSpecimen(sheet: SpecimenSheet, context: EvaluationContext): SpecimenEvaluation {
  const facts = modelFacts(sheet, context)
  const outcome = measurementModel(facts, {})
  const inputs = evaluationInputs(facts, outcome.steps)
  const propagated = propagate<CharacteristicId>(inputs, (values) => measurementModel(facts, values).results)
  const results: Partial<Record<CharacteristicId, Estimate>> = {}
  const budgets: Partial<Record<CharacteristicId, readonly BudgetLine[]>> = {}
  for (const id of characteristicIds) {
    const one = propagated[id]
    if (!one) continue
    results[id] = one.estimate
    budgets[id] = one.budget
  }
  return {
    modelVersion: MODEL_VERSION,
    results,
    budgets,
    corrections: evaluationCorrections(facts, outcome),
    steps: shownSteps(facts, outcome),
    missing: missingParts(facts, outcome),
  }
}

function shownSteps(facts: ModelFacts, { steps }: ModelOutcome): Readonly<Record<string, number>> {
  const { material, specification } = facts.context
  const bearing = loadBearingSection(specification.core, specification.diameter.target)
  const strength = tensileStrengthAt(material, bearing.size)
  const breaking = strength && breakingLoad(strength.low, bearing.area)
  const { axialStiffness, chain, force } = steps
  return {
    axialStiffness,
    airDensity: facts.airDensity,
    ...(facts.frequency ? { frequency: facts.frequency.value } : {}),
    ...(force === undefined ? {} : { force }),
    ...(chain ? { strain: chain.strain, inharmonicity: chain.inharmonicity } : {}),
    ...(breaking === undefined ? {} : { breakingLoad: breaking }),
    ...(breaking === undefined || force === undefined ? {} : { workingFraction: force / breaking }),
  }
}

function missingParts(facts: ModelFacts, { results, steps }: ModelOutcome): readonly string[] {
  const { context } = facts
  const missing: string[] = []
  if (results.diameter === undefined)
    missing.push(
      facts.sheet.diameters.length === 0
        ? 'No diameter has been read.'
        : 'A diameter less the known error of the micrometer is not above zero.',
    )
  else if (!context.micrometer) missing.push('No micrometer is named: its uncertainty is not in the budget.')
  if (results.massPerMetreWeighed === undefined) missing.push(...missingForWeighing(facts))
  else {
    if (!context.balance) missing.push('No balance is named: its uncertainty is not in the budget.')
    if (!context.rule && pieceLength(facts).by === 'rule')
      missing.push('No rule is named: its uncertainty is not in the budget.')
  }
  if (results.massPerMetreSounded === undefined) missing.push(...missingForSounding(facts))
  else if (!context.counter) missing.push('No counter is named: its uncertainty is not in the budget.')
  if (steps.refusal !== undefined) missing.push(steps.refusal)
  return missing
}

function missingForWeighing(facts: ModelFacts): readonly string[] {
  const { load, sheet } = facts
  const missing: string[] = []
  if (!sheet.cutMass) missing.push('The piece has not been weighed.')
  if (pieceLength(facts).reading === undefined) missing.push('The length of the piece is missing.')
  if (sheet.weighedState === 'marked' && !load) missing.push('The load under which it was marked is missing.')
  return missing
}

function missingForSounding({ context, frequency, load, unknownWeights }: ModelFacts): readonly string[] {
  const missing: string[] = []
  if (!frequency) missing.push('The string has not been sounded.')
  if (unknownWeights.length > 0) missing.push(`Not registered: ${unknownWeights.join(', ')}.`)
  else if (!load) missing.push('What hangs is not said.')
  if (!context.rig) missing.push('No rig is named.')
  return missing
}
