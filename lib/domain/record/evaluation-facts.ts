import type { EvaluationContext, GaugeFacts, Known, RigFacts, WeightFacts } from '../metrology/evaluation'
import type { SpecimenSheet } from '../metrology/sheet'
import type { SpecificationBody } from '../metrology/specification'
import type { MaterialBody } from '../strings/material'
import type { CurrentSheet } from './current-sheet'

/** What the works knows at a moment and an evaluation may draw on. */
export interface EvaluationFacts {
  readonly gravity: Known
  readonly air: EvaluationContext['air']
  readonly material: MaterialBody
  readonly specification: SpecificationBody
  readonly rigs: readonly RigFacts[]
  readonly weights: readonly WeightFacts[]
  readonly gauges: readonly GaugeFacts[]
}

/** Codes of what hangs, hanger first; none when the load was typed as a mass or a force. */
export const hangingCodes = (sheet: Pick<SpecimenSheet, 'load'>): readonly string[] =>
  sheet.load?.kind === 'weights'
    ? [sheet.load.hanger, ...sheet.load.weights].filter((code) => code !== '')
    : []

/**
 * The context of one evaluation: of all that the works knows, only what this sheet rests on, so that equal
 * contents have one snapshot. Where an earlier context is given, everything whose identity has not changed is
 * taken from it: a corrected reading is judged with the equipment as it was known when it was used.
 */
export function contextFor(
  facts: EvaluationFacts,
  current: Pick<CurrentSheet, 'sheet' | 'equipment'>,
  earlier?: EvaluationContext,
): EvaluationContext {
  const { equipment } = current
  const gauge = (code: string | undefined, before: GaugeFacts | undefined): GaugeFacts | undefined =>
    before?.code === code ? before : facts.gauges.find((one) => one.code === code)
  const codes = [...new Set(hangingCodes(current.sheet))].sort()
  const weights = codes.flatMap((code) => {
    const found =
      earlier?.weights.find((one) => one.code === code) ?? facts.weights.find((one) => one.code === code)
    return found ? [found] : []
  })
  const basis = earlier ?? facts
  return {
    gravity: basis.gravity,
    air: basis.air,
    material: basis.material,
    specification: basis.specification,
    rig:
      earlier?.rig?.code === equipment.rig
        ? earlier?.rig
        : facts.rigs.find((one) => one.code === equipment.rig),
    weights,
    micrometer: gauge(equipment.micrometer, earlier?.micrometer),
    balance: gauge(equipment.balance, earlier?.balance),
    rule: gauge(equipment.rule, earlier?.rule),
    counter: gauge(equipment.counter, earlier?.counter),
  }
}
