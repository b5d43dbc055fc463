import type { SpecimenSheet } from '../metrology/sheet'
import {
  type Act,
  actOfField,
  acts,
  actsOf,
  type EquipmentCodes,
  holdsAct,
  type ReadingFact,
  type SheetPart,
} from './reading'

/** The sheet in force: what the readings of a specimen come to when corrections have replaced what they correct. */
export interface CurrentSheet {
  readonly sheet: SpecimenSheet
  readonly equipment: EquipmentCodes
  /** Client id of the reading that each act comes from. */
  readonly sources: Readonly<Partial<Record<Act, string>>>
}

export const emptySheet: SpecimenSheet = {
  diameters: [],
  weighedState: 'slack',
  frequencies: [],
  keptDoubts: [],
}

const emptyCurrent: CurrentSheet = { sheet: emptySheet, equipment: {}, sources: {} }

/**
 * Folds the readings of one specimen, in the order they were recorded, into the sheet in force. A first entry
 * or an addition fills what is still empty; a correction replaces the act it is about, even by nothing, and
 * leaves the other acts alone. Each act brings its own equipment; until it does, what was named for it counts (a
 * piece marked under load needs the rig before it is sounded).
 */
export const currentSheet = (readings: readonly ReadingFact[]): CurrentSheet =>
  readings.reduce(
    (current, reading) =>
      reading.supersedes === undefined ? added(current, reading) : corrected(current, reading),
    emptyCurrent,
  )

function added(current: CurrentSheet, reading: ReadingFact): CurrentSheet {
  const part = reading.values
  // Temperature and the like are those of the sounding, which depends on them most.
  const sounded = holdsAct(part, 'sounding') && !holdsAct(current.sheet, 'sounding')
  const started: CurrentSheet = {
    ...current,
    sheet: {
      ...current.sheet,
      ...(sounded
        ? { ...shared(current.sheet), ...shared(part) }
        : { ...shared(part), ...shared(current.sheet) }),
      keptDoubts: [...current.sheet.keptDoubts, ...(part.keptDoubts ?? [])],
    },
  }
  return acts.reduce((sum, act) => withAddition(sum, reading, act), started)
}

function withAddition(current: CurrentSheet, reading: ReadingFact, act: Act): CurrentSheet {
  const { sheet } = current
  if (!holdsAct(sheet, act))
    return holdsAct(reading.values, act)
      ? withAct(current, reading, act)
      : {
          ...current,
          sheet: { ...sheet, ...setUp(reading.values, act), ...setUp(sheet, act) },
          equipment: { ...defined(equipmentOf(reading, act)), ...current.equipment },
        }
  return act === 'section'
    ? { ...current, sheet: { ...sheet, diameters: withDiameters(sheet, reading.values) } }
    : current
}

function corrected(current: CurrentSheet, reading: ReadingFact): CurrentSheet {
  const replaced = actsOf(reading.kind)
  const started: CurrentSheet = {
    ...current,
    sheet: {
      ...current.sheet,
      ...shared(reading.values),
      keptDoubts: [
        ...current.sheet.keptDoubts.filter(
          (doubt) => !replaced.some((act) => act === actOfField(doubt.field)),
        ),
        ...(reading.values.keptDoubts ?? []),
      ],
    },
  }
  return replaced.reduce((sum, act) => withAct(sum, reading, act), started)
}

/** The act's values and equipment, taken whole from this reading. */
function withAct(current: CurrentSheet, reading: ReadingFact, act: Act): CurrentSheet {
  const part = reading.values
  const equipment = { ...current.equipment, ...equipmentOf(reading, act) }
  const sources = { ...current.sources, [act]: reading.clientId }
  if (act === 'section')
    return {
      sheet: { ...current.sheet, diameters: sorted(part.diameters ?? []) },
      equipment,
      sources,
    }
  if (act === 'weighing')
    return {
      sheet: {
        ...current.sheet,
        weighedState: part.weighedState ?? current.sheet.weighedState,
        cutLength: part.cutLength,
        cutMass: part.cutMass,
      },
      equipment,
      sources,
    }
  return {
    sheet: { ...current.sheet, load: part.load, span: part.span, frequencies: part.frequencies ?? [] },
    equipment,
    sources,
  }
}

function equipmentOf({ equipment }: ReadingFact, act: Act): EquipmentCodes {
  const { micrometer, balance, rule, rig, counter } = equipment
  if (act === 'section') return { micrometer }
  return act === 'weighing' ? { balance, rule } : { rig, counter }
}

/** Values that belong to no single act, where there are any. */
const shared = ({ takenAt, temperature, pressure, humidity, note }: SheetPart): SheetPart =>
  defined({ takenAt, temperature, pressure, humidity, note })

/** Values set before the act itself; they stay until the act brings its own. */
function setUp(part: SheetPart, act: Act): SheetPart {
  if (act === 'weighing') return defined({ cutLength: part.cutLength })
  if (act === 'sounding') return defined({ load: part.load, span: part.span })
  return {}
}

const withDiameters = (sheet: SpecimenSheet, part: SheetPart): SpecimenSheet['diameters'] =>
  sorted([
    ...sheet.diameters,
    ...(part.diameters ?? []).filter(
      (one) =>
        !sheet.diameters.some(
          (there) => there.position === one.position && there.direction === one.direction,
        ),
    ),
  ])

const sorted = (diameters: SpecimenSheet['diameters']): SpecimenSheet['diameters'] =>
  [...diameters].sort((a, b) => a.position - b.position || (a.direction < b.direction ? -1 : 1))

const defined = <T extends object>(part: T): T =>
  Object.fromEntries(Object.entries(part).filter(([, value]) => value !== undefined)) as T
