import type { DiameterReading } from '../metrology/sheet'
import { type CurrentSheet, currentSheet } from './current-sheet'
import { mergeOf } from './merge-clash'
import { type Act, actOfField, acts, holdsAct, type SheetPart } from './reading'
import type { SpecimenEntry, SpecimenState } from './write-state'

/**
 * What has to be recorded so that a stored specimen says what a differing entry says: each act that clashes is
 * corrected by the entry's, with a reason; acts that are not there yet are added by one further reading. In the
 * order in which they have to be stored. A reading is corrected once: where several acts of one reading clash, or
 * another of its acts was corrected before, one correction of the whole sheet takes the newest one's place. `newId`
 * gives a client id for each.
 */
export function correctionsFor(
  stored: SpecimenState,
  entry: SpecimenEntry,
  reason: string,
  newId: () => string,
): readonly SpecimenEntry[] {
  const current = currentSheet(stored.readings)
  const { reading } = entry
  const specimen = { clientId: stored.clientId, number: stored.number }
  const clashing = clashingActs(current, reading).flatMap((act) => {
    const source = current.sources[act]
    return source === undefined || !holdsAct(reading.values, act) ? [] : [{ act, source }]
  })
  const newest = clashing.map(({ source }) => newestOf(stored.readings, source))
  const apart = clashing.every(({ source }, index) => newest.indexOf(source) === index)
  const [first] = newest
  const corrections = apart
    ? clashing.map(({ act, source }) => ({
        specimen,
        reading: {
          ...reading,
          clientId: newId(),
          kind: act,
          values: correctedPart(current.sheet, reading.values, act),
          supersedes: source,
          reason,
        },
      }))
    : first === undefined
      ? []
      : [
          {
            specimen,
            reading: wholeSheet(current, reading, clashing, { clientId: newId(), supersedes: first, reason }),
          },
        ]
  const added = acts
    .filter((act) => current.sources[act] === undefined && holdsAct(reading.values, act))
    .map((act) => ({
      specimen,
      reading: { ...reading, clientId: newId(), kind: act, values: actPart(reading.values, act) },
    }))
  return [...corrections, ...added]
}

/** Acts in which the entry says something else than what is in force. */
function clashingActs(current: CurrentSheet, { equipment, values }: Reading): readonly Act[] {
  const clashing = new Set(
    mergeOf(current, values, equipment).clashes.map(
      ({ field }) => actOfField(field) ?? (field === 'micrometer' ? 'section' : 'weighing'),
    ),
  )
  return acts.filter((act) => clashing.has(act))
}

/** The reading at the end of the corrections that began with this one. */
function newestOf(readings: SpecimenState['readings'], clientId: string): string {
  const newer = readings.find((one) => one.supersedes === clientId)
  return newer ? newestOf(readings, newer.clientId) : clientId
}

/** The sheet in force with the entry's acts where they clash, as one correction. */
function wholeSheet(
  { equipment, sheet }: CurrentSheet,
  reading: Reading,
  clashing: readonly { readonly act: Act }[],
  change: Pick<Reading, 'clientId' | 'supersedes' | 'reason'>,
): Reading {
  const isClashing = (act: Act | undefined) => clashing.some((one) => one.act === act)
  const of = (act: Act) => (isClashing(act) ? correctedPart(sheet, reading.values, act) : {})
  const { balance, counter, micrometer, rig, rule } = reading.equipment
  return {
    ...reading,
    ...change,
    kind: 'sheet',
    values: {
      ...sheet,
      ...of('section'),
      ...of('weighing'),
      ...of('sounding'),
      keptDoubts: sheet.keptDoubts.filter((doubt) => !isClashing(actOfField(doubt.field))),
    },
    equipment: {
      ...equipment,
      ...(isClashing('section') ? { micrometer } : {}),
      ...(isClashing('weighing') ? { balance, rule } : {}),
      ...(isClashing('sounding') ? { rig, counter } : {}),
    },
  }
}

type Reading = SpecimenEntry['reading']

/** An act as the entry says it; diameters that the entry does not speak of stay as they are stored. */
function correctedPart(stored: SheetPart, values: SheetPart, act: Act): SheetPart {
  const part = actPart(values, act)
  if (act !== 'section') return part
  const spoken = values.diameters ?? []
  const silent = (stored.diameters ?? []).filter(
    (one) =>
      !spoken.some(({ direction, position }) => position === one.position && direction === one.direction),
  )
  return { ...part, diameters: [...spoken, ...silent].sort(byPlace) }
}

const byPlace = (a: DiameterReading, b: DiameterReading): number =>
  a.position - b.position || (a.direction < b.direction ? -1 : 1)

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
