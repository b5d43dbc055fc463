import { lengthByRule, massPerMetreAt20 } from '../strings/diameter-at-20'
import { elasticStrain, unloadedMassPerMetre } from '../strings/stretch'
import { weighedMass } from '../strings/weighed-mass'
import {
  degreesCelsius,
  type KilogramsPerMetre,
  kilograms,
  kilogramsPerMetre,
  metres,
  type Newtons,
} from '../units/quantity'
import { type InputValues, offset } from './input-values'
import { type ModelFacts, pieceDensity, STEEL_EXPANSION } from './model-facts'

export interface WeighingOutcome {
  /** Unloaded mass per metre at 20 °C. */
  readonly massPerMetre?: KilogramsPerMetre
  /** Of the string under the load under which it was marked, at 20 °C. */
  readonly loaded?: KilogramsPerMetre
}

/**
 * Length of the weighed piece as read. A piece marked at both edges under load is as long as the span, unless
 * another length was typed.
 */
export function pieceLength({ context, sheet }: Pick<ModelFacts, 'context' | 'sheet'>): {
  readonly reading: number | undefined
  readonly by: 'rule' | 'span'
} {
  if (sheet.cutLength || sheet.weighedState === 'slack') return { reading: sheet.cutLength?.si, by: 'rule' }
  return { reading: sheet.span?.si ?? context.rig?.span.value, by: 'span' }
}

/**
 * Mass per metre by balance and rule: reading less known errors, buoyancy, mass over length, at 20 °C. Slack:
 * that is the unloaded one. Marked under load: it is the loaded one, and stretch brings it to the unloaded.
 * Nothing where mass, length or the load of a marked piece is missing or not above zero.
 * Inputs: `balance`, `balanceReading` kg; `rule`, `ruleReading`, `span` m; `temperature` K.
 * Sources: those of `weighed-mass.ts`, `stretch.ts`, `diameter-at-20.ts`.
 */
export function weighingOutcome(
  facts: ModelFacts,
  inputs: InputValues,
  force: Newtons | undefined,
  axialStiffness: Newtons,
): WeighingOutcome {
  const { airDensity, context, expansion, sheet } = facts
  const { reading, by } = pieceLength(facts)
  if (!sheet.cutMass || reading === undefined) return {}
  const balance = offset(inputs, 'balance') + offset(inputs, 'balanceReading')
  const mass = weighedMass(
    kilograms(sheet.cutMass.si - (context.balance?.error ?? 0) + balance),
    airDensity,
    pieceDensity(context),
  )
  const length =
    by === 'span'
      ? reading + offset(inputs, 'span')
      : reading - (context.rule?.error ?? 0) + offset(inputs, 'rule') + offset(inputs, 'ruleReading')
  if (!(mass > 0 && length > 0)) return {}
  const temperature = degreesCelsius(facts.celsius + offset(inputs, 'temperature'))
  const measured = kilogramsPerMetre(mass / lengthByRule(metres(length), temperature, STEEL_EXPANSION))
  const at20 = expansion === undefined ? measured : massPerMetreAt20(measured, temperature, expansion)
  if (sheet.weighedState === 'slack') return { massPerMetre: at20 }
  if (force === undefined) return {}
  return { massPerMetre: unloadedMassPerMetre(at20, elasticStrain(force, axialStiffness)), loaded: at20 }
}
