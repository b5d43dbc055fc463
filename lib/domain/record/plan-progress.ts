import type { SpecimenSheet } from '../metrology/sheet'
import type { InspectionPlan } from '../metrology/specification'
import { holdsAct } from './reading'

export interface PlanProgress {
  readonly complete: boolean
  /** Sentences: what is still to be measured. */
  readonly missing: readonly string[]
}

/**
 * What a lot's plan still asks for. A specimen is done when it has the planned diameters, was weighed and was
 * sounded; the plan is complete when as many specimens as it asks for are done.
 */
export function planProgress(
  plan: InspectionPlan,
  specimens: readonly { readonly number: number; readonly sheet: SpecimenSheet }[],
): PlanProgress {
  const unfinished = specimens.flatMap(({ number, sheet }) => {
    const missing = missingOf(plan, sheet)
    return missing.length === 0 ? [] : [`Specimen ${number} lacks ${missing.join(', ')}.`]
  })
  const done = specimens.length - unfinished.length
  if (done >= plan.specimens) return { complete: true, missing: [] }
  const toCome = plan.specimens - specimens.length
  return {
    complete: false,
    missing: [
      ...unfinished,
      ...(toCome > 0 ? [`${toCome} of ${plan.specimens} specimens are still to be measured.`] : []),
    ],
  }
}

/**
 * What one specimen lacks by the plan, in words that follow "lacks". A piece marked at both edges under load is
 * as long as the span, which stands in for its cut length.
 */
export function missingOf(plan: InspectionPlan, sheet: SpecimenSheet): readonly string[] {
  const planned = plan.positions * plan.directions
  const missing: string[] = []
  if (sheet.diameters.length < planned) missing.push(`diameters (${sheet.diameters.length} of ${planned})`)
  const needsLength = sheet.weighedState === 'slack' && sheet.cutLength === undefined
  if (!holdsAct(sheet, 'weighing') || needsLength) missing.push('the weighing')
  if (!holdsAct(sheet, 'sounding') || sheet.load === undefined || sheet.span === undefined)
    missing.push('the sounding')
  return missing
}
