import { type CharacteristicId, characteristicIds } from '../metrology/characteristics'
import type { SpecimenEvaluation } from '../metrology/evaluation'
import { type LotSummaryBody, summariseLot } from '../quality/lot-summary'

export type LotSummaries = Readonly<Partial<Record<CharacteristicId, LotSummaryBody>>>

/** The summaries of a lot from the results in force of its specimens, in the order of their numbers. */
export function summariseSpecimens(
  specimens: readonly { readonly number: number; readonly results: SpecimenEvaluation['results'] }[],
): LotSummaries {
  const ordered = [...specimens].sort((a, b) => a.number - b.number)
  const summaries = characteristicIds.flatMap((id): [CharacteristicId, LotSummaryBody][] => {
    const summary = summariseLot(ordered.flatMap((one) => one.results[id] ?? []))
    return summary ? [[id, summary]] : []
  })
  return Object.fromEntries(summaries)
}
