import { diameterAt20ByContact } from '../strings/diameter-at-20'
import { sectionFromPairs } from '../strings/section'
import { degreesCelsius, type Metres, metres } from '../units/quantity'
import { type InputValues, offset } from './input-values'
import { type ModelFacts, STEEL_EXPANSION } from './model-facts'
import { diameterPairs } from './sheet-readings'

export interface SectionOutcome {
  /** Diameter of the circle with the mean section, at 20 °C. */
  readonly diameter?: Metres
  /** Largest difference of two directions at one position. */
  readonly ovality?: number
}

/**
 * Diameter d = √ mean(d₁d₂) of all positions, less the known error of the gauge, brought to 20 °C; ovality
 * from the positions with both directions. Nothing where a diameter is missing or not above zero.
 * Inputs: `micrometer` and `section` m, `ovality` m, `temperature` K.
 * Sources: those of `section.ts` and `diameter-at-20.ts`.
 */
export function sectionOutcome(facts: ModelFacts, inputs: InputValues): SectionOutcome {
  const { celsius, context, expansion, sheet } = facts
  const shift = offset(inputs, 'micrometer') - (context.micrometer?.error ?? 0)
  const { pairs, complete } = diameterPairs(sheet, shift)
  if (pairs.some(([a, b]) => !(Math.min(a, b) > 0))) return {}
  const read = sectionFromPairs(pairs)?.areaDiameter
  if (read === undefined) return {}
  const temperature = degreesCelsius(celsius + offset(inputs, 'temperature'))
  const at20 =
    expansion === undefined ? read : diameterAt20ByContact(read, temperature, expansion, STEEL_EXPANSION)
  const diameter = at20 + offset(inputs, 'section')
  if (!(diameter > 0)) return {}
  const ovality = sectionFromPairs(complete)?.ovality
  return {
    diameter: metres(diameter),
    ...(ovality === undefined ? {} : { ovality: ovality + offset(inputs, 'ovality') }),
  }
}
