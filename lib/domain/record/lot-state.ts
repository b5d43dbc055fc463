import type { DispositionVerb } from '../quality/propose-disposition'

/** Where a lot stands. */
export const lotStates = [
  'measuring',
  'to-decide',
  'released',
  'held',
  'rework',
  'regraded',
  'concession',
  'scrapped',
] as const

export type LotState = (typeof lotStates)[number]

export const stateAfter: Readonly<Record<DispositionVerb, LotState>> = {
  release: 'released',
  hold: 'held',
  rework: 'rework',
  regrade: 'regraded',
  concession: 'concession',
  scrap: 'scrapped',
}

/** The material has left the shelf, or never will: what is entered afterwards changes the evidence of a decision. */
export const isFinal = (state: LotState): boolean =>
  state === 'released' || state === 'regraded' || state === 'concession' || state === 'scrapped'

/**
 * A lot is on the chart once its plan was complete: a mean of the first specimen alone would raise signals that
 * the next specimen takes back.
 */
export const isCharted = (state: LotState): boolean => state !== 'measuring'

/**
 * The state after an entry. Whether the plan is complete decides as long as nobody has decided; a held lot waits
 * for a person; a lot in rework comes back when its plan has been measured anew.
 */
export function stateAfterEntry(
  state: LotState,
  entry: { readonly planComplete: boolean; readonly measuredAnew: boolean },
): LotState {
  if (state === 'measuring' || state === 'to-decide') return entry.planComplete ? 'to-decide' : 'measuring'
  if (state === 'rework') return entry.measuredAnew ? 'to-decide' : 'rework'
  return state
}
