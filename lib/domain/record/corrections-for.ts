import { currentSheet } from './current-sheet'
import { mergeOf } from './merge-clash'
import { type Act, actOfField, acts, holdsAct, type SheetPart } from './reading'
import type { SpecimenEntry, SpecimenState } from './write-state'

/**
 * What has to be recorded so that a stored specimen says what a differing entry says: each act that clashes is
 * corrected by the entry's, with a reason; acts that are not there yet are added by one further reading. In the
 * order in which they have to be stored. `newId` gives a client id for each.
 */
export function correctionsFor(
  stored: SpecimenState,
  entry: SpecimenEntry,
  reason: string,
  newId: () => string,
): readonly SpecimenEntry[] {
  const current = currentSheet(stored.readings)
  const { reading } = entry
  const clashing = new Set(
    mergeOf(current, reading.values, reading.equipment).clashes.map(
      ({ field }) => actOfField(field) ?? (field === 'micrometer' ? 'section' : 'weighing'),
    ),
  )
  const specimen = { clientId: stored.clientId, number: stored.number }
  const corrections = acts.flatMap((act): SpecimenEntry[] => {
    const supersedes = current.sources[act]
    if (!clashing.has(act) || supersedes === undefined || !holdsAct(reading.values, act)) return []
    return [
      {
        specimen,
        reading: {
          ...reading,
          clientId: newId(),
          kind: act,
          values: actPart(reading.values, act),
          supersedes,
          reason,
        },
      },
    ]
  })
  const missing = acts.filter((act) => current.sources[act] === undefined && holdsAct(reading.values, act))
  const added = missing.map(
    (act): SpecimenEntry => ({
      specimen,
      reading: { ...reading, clientId: newId(), kind: act, values: actPart(reading.values, act) },
    }),
  )
  return [...corrections, ...added]
}

/** What of a sheet belongs to one act. */
function actPart(values: SheetPart, act: Act): SheetPart {
  const {
    cutLength,
    cutMass,
    diameters,
    frequencies,
    humidity,
    load,
    pressure,
    span,
    temperature,
    weighedState,
  } = values
  const part: SheetPart =
    act === 'section'
      ? { diameters }
      : act === 'weighing'
        ? { weighedState, cutLength, cutMass }
        : { load, span, frequencies, temperature, pressure, humidity }
  return Object.fromEntries(Object.entries(part).filter(([, value]) => value !== undefined))
}
