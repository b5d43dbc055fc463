import type { Problem } from '../errors'
import { ok, type Result, refused } from '../result'
import { currentSheet } from './current-sheet'
import { type Clash, mergeOf } from './merge-clash'
import type { LotWriteState, SpecimenEntry, SpecimenState } from './write-state'

/** What an entry comes to: a new specimen, a further reading of a stored one, or nothing that is not there. */
export type Admission =
  | { readonly kind: 'new' }
  | { readonly kind: 'further'; readonly specimen: SpecimenState }
  | { readonly kind: 'already-there'; readonly specimen: SpecimenState }

/**
 * Decides what to do with an entry. Refused as a conflict, with both values: the same reading stored with
 * another value, a correction of what somebody has corrected meanwhile, an id that was used for something else.
 */
export function admitEntry(state: LotWriteState, entry: SpecimenEntry): Result<Admission> {
  const { specimen, reading } = entry
  const stored = state.specimens.find((one) => one.number === specimen.number)
  const place = `specimen ${specimen.number} of ${state.lot.code}`
  if (reading.supersedes !== undefined) {
    return stored ? admitCorrection(stored, reading.supersedes, place) : refused(missing(place))
  }
  if (!stored) {
    const other = state.specimens.find((one) => one.clientId === specimen.clientId)
    return other ? refused(usedId(place, other.number)) : ok({ kind: 'new' })
  }
  const merge = mergeOf(currentSheet(stored.readings), reading.values, reading.equipment)
  if (merge.clashes.length > 0) return refused(clash(place, merge.clashes))
  return ok({ kind: merge.adds ? 'further' : 'already-there', specimen: stored })
}

function admitCorrection(stored: SpecimenState, supersedes: string, place: string): Result<Admission> {
  if (!stored.readings.some((one) => one.clientId === supersedes)) return refused(missing(place))
  const newer = stored.readings.find((one) => one.supersedes === supersedes)
  if (newer)
    return refused({
      code: 'conflict',
      message: `This reading of ${place} was corrected meanwhile by someone else.`,
      mend: 'Look at the newer value, and correct that one if it is still wrong.',
      details: { newerReading: newer.clientId },
    })
  return ok({ kind: 'further', specimen: stored })
}

const missing = (place: string): Problem => ({
  code: 'not-found',
  message: `There is no such reading of ${place}.`,
  mend: 'Load the lot again and choose the reading to correct.',
})

const usedId = (place: string, number: number): Problem => ({
  code: 'conflict',
  message: `The id sent for ${place} belongs to specimen ${number} already.`,
  mend: 'Load the page again and enter the specimen anew.',
})

function clash(place: string, clashes: readonly Clash[]): Problem {
  const named = clashes
    .map((one) => `${one.field} ${one.stored} is stored, ${one.entered} was sent`)
    .join('; ')
  return {
    code: 'conflict',
    message: `Other values are stored for ${place}: ${named}.`,
    mend: 'Nothing was changed. If the stored value is wrong, correct it with a reason.',
    where: `specimen ${place.match(/\d+/)?.[0] ?? ''}`.trim(),
    details: Object.fromEntries(
      clashes.flatMap((one): [string, string][] => [
        [`${one.field}.stored`, one.stored],
        [`${one.field}.entered`, one.entered],
      ]),
    ),
  }
}
