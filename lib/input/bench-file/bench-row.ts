import type { Problem } from '@/lib/domain/errors'
import type { DiameterReading, LoadReading, TypedValue } from '@/lib/domain/metrology/sheet'
import type { EquipmentCodes, SheetPart } from '@/lib/domain/record/reading'
import { ok, type Result, refused } from '@/lib/domain/result'
import { parseQuantityAs } from '@/lib/domain/units/parse-quantity'
import { degreesCelsius, hertz, kilograms, metres, newtons, pascals } from '@/lib/domain/units/quantity'
import type { UnitId } from '@/lib/domain/units/unit'
import { paragraphs } from '../plain-text'
import { sheetBounds } from '../sheet-bounds'
import type { ValueRules } from '../typed-value'
import type { BenchColumn, ValueBase } from './columns'
import { problemOf, shown, unfit } from './row-problem'
import { readWords, type Words } from './row-words'

export interface RowReading {
  /** Headers as they stand in the file; `columns` says what each is. */
  readonly headers: readonly string[]
  readonly columns: readonly BenchColumn[]
  readonly decimal: 'point' | 'comma'
  /** IANA zone of times without an offset. */
  readonly timeZone: string
}

/** What a row says of its lot, should the lot not be there yet. */
export interface LotOpening {
  readonly product?: string
  readonly machine?: string
  readonly die?: string
  readonly coil?: string
  readonly spool?: string
  readonly maker?: string
  readonly specification?: number
  readonly madeAt?: number
  readonly lengthMetres?: number
}

/** One row of the bench file, understood: names are not looked up yet. */
export interface BenchRow {
  readonly lot: string
  readonly specimen: number
  readonly opening: LotOpening
  readonly measuredAt?: number
  readonly measurer?: string
  readonly equipment: EquipmentCodes
  readonly weights?: readonly string[]
  readonly values: SheetPart
}

/**
 * Reads one row of a bench file. Refused with every problem of the row: what, in which column (`where`), which
 * value (`details.value`), how to mend.
 */
export function readBenchRow(cells: readonly string[], reading: RowReading): Result<BenchRow> {
  const { columns, headers } = reading
  const problems: Problem[] = []
  if (cells.length > headers.length && cells.slice(headers.length).some((cell) => cell.trim() !== ''))
    return refused({
      code: 'bad-input',
      message: `The row has ${cells.length} cells and the header ${headers.length}.`,
      mend: 'Put cells that hold the delimiter between quotes.',
    })
  const words: { -readonly [Key in keyof Words]: Words[Key] } = {}
  const diameters: DiameterReading[] = []
  const values: Partial<Record<ValueBase, readonly TypedValue<number>[]>> = {}
  const notes: string[] = []
  columns.forEach((column, index) => {
    const cell = cells[index] ?? ''
    const header = headers[index] ?? ''
    if (cell.trim() === '' || column.kind === 'left-out') return
    if (unfit.test(cell)) {
      problems.push(
        problemOf(header, cell, 'holds characters that can’t be shown or stored', 'Type the cell anew.'),
      )
      return
    }
    if (column.kind === 'word') words[column.id] = { text: cell.trim(), header }
    else if (column.kind === 'note') notes.push(`${header}: ${cell.trim()}`)
    else if (column.kind === 'diameter') {
      const value = quantity(cell, column.unit, sheetBounds.diameter, metres, header, reading)
      if (value.ok)
        diameters.push({ position: column.position, direction: column.direction, value: value.value })
      else problems.push(...value.problems)
    } else {
      const value = readValue(column.base, column.unit, cell, header, reading)
      if (value.ok) values[column.base] = value.value
      else problems.push(...value.problems)
    }
  })
  const wordsRead = readWords(words, reading.timeZone, problems)
  const part = partOf(diameters, values, words, notes, problems)
  if (problems.length === 0 && wordsRead.lot === undefined)
    problems.push(problemOf('lot', '', 'is empty', 'Every row names its lot.'))
  if (problems.length === 0 && wordsRead.specimen === undefined)
    problems.push(
      problemOf('specimen', '', 'is empty', 'Every row says which specimen of the lot it is, from 1.'),
    )
  if (problems.length === 0 && diameters.length === 0 && !values.cut_mass && !values.frequency)
    problems.push({
      code: 'bad-input',
      message: 'The row holds no reading: no diameter, no mass, no frequency.',
      mend: 'Fill in what was measured, or take the row out.',
    })
  const { lot, specimen, ...rest } = wordsRead
  if (problems.length > 0 || lot === undefined || specimen === undefined) return refused(...problems)
  const length = values.lot_length?.[0]?.si
  return ok({
    ...rest,
    lot,
    specimen,
    opening: { ...rest.opening, ...(length === undefined ? {} : { lengthMetres: length }) },
    values: part,
  })
}

function quantity<Q extends number>(
  text: string,
  unit: UnitId,
  rules: ValueRules,
  door: (value: number) => Q,
  header: string,
  { decimal }: RowReading,
): Result<TypedValue<Q>> {
  const parsed = parseQuantityAs(text, { ...rules, unit, decimal }, door)
  return parsed.ok
    ? parsed
    : refused(...parsed.problems.map((one) => ({ ...one, where: header, details: { value: shown(text) } })))
}

const rulesOf = {
  lot_length: { name: 'Length of the lot', dimension: 'length', min: 1e-3, max: 1e7 },
  cut_length: sheetBounds.cutLength,
  cut_mass: sheetBounds.cutMass,
  span: sheetBounds.span,
  frequency: sheetBounds.frequency,
  temperature: sheetBounds.temperature,
  pressure: sheetBounds.pressure,
  humidity: { name: 'Humidity', dimension: 'fraction', min: 0, max: 1 },
} as const satisfies Record<Exclude<ValueBase, 'load'>, ValueRules>

const noteSchema = paragraphs('note', { max: 2000 })

const asNumber = (value: number): number => value

function readValue(
  base: ValueBase,
  unit: UnitId,
  cell: string,
  header: string,
  reading: RowReading,
): Result<readonly TypedValue<number>[]> {
  const force = unit === 'N' || unit === 'kgf' || unit === 'lbf'
  const rules = base === 'load' ? (force ? sheetBounds.loadForce : sheetBounds.loadMass) : rulesOf[base]
  // Several plucks stand in one cell, apart by spaces.
  const texts = base === 'frequency' ? cell.trim().split(/\s+/) : [cell]
  if (texts.length > 20)
    return refused(problemOf(header, cell, 'holds more than 20 plucks', 'Keep at most 20.'))
  const read = texts.map((text) => quantity(text, unit, rules, asNumber, header, reading))
  const problems = read.flatMap((one) => (one.ok ? [] : one.problems))
  return problems.length > 0 ? refused(...problems) : ok(read.flatMap((one) => (one.ok ? [one.value] : [])))
}

/** The readings of a row as a part of a sheet. */
function partOf(
  diameters: readonly DiameterReading[],
  values: Partial<Record<ValueBase, readonly TypedValue<number>[]>>,
  words: Words,
  notes: readonly string[],
  problems: Problem[],
): SheetPart {
  const one = <Q extends number>(base: ValueBase, door: (value: number) => Q): TypedValue<Q> | undefined => {
    const value = values[base]?.[0]
    return value && { ...value, si: door(value.si) }
  }
  const load = values.load?.[0]
  const state = words.weighed_state
  if (state && !/^(slack|marked)$/i.test(state.text))
    problems.push(
      problemOf(
        state.header,
        state.text,
        `is slack or marked, not “${shown(state.text)}”`,
        'Write slack or marked.',
      ),
    )
  const takenAt = takenAtOf(words.taken_at, problems)
  const note = [...(words.note ? [words.note.text.replaceAll('\r\n', '\n')] : []), ...notes].join('\n')
  const kept = note === '' ? undefined : noteSchema.safeParse(note.replaceAll('\r', '\n'))
  if (kept && !kept.success)
    problems.push(
      problemOf(
        words.note?.header ?? 'note',
        note,
        'is longer than 2000 characters',
        'Shorten it, or leave unknown columns out.',
      ),
    )
  const loadReading: LoadReading | undefined =
    load === undefined
      ? undefined
      : ['N', 'kgf', 'lbf'].includes(load.unit)
        ? { kind: 'force', value: { ...load, si: newtons(load.si) } }
        : { kind: 'mass', value: { ...load, si: kilograms(load.si) } }
  return defined({
    takenAt,
    diameters: [...diameters].sort((a, b) => a.position - b.position || (a.direction < b.direction ? -1 : 1)),
    weighedState: state && (/^marked$/i.test(state.text) ? ('marked' as const) : ('slack' as const)),
    cutLength: one('cut_length', metres),
    cutMass: one('cut_mass', kilograms),
    load: loadReading,
    span: one('span', metres),
    frequencies: (values.frequency ?? []).map((value) => ({ ...value, si: hertz(value.si) })),
    temperature: one('temperature', degreesCelsius),
    pressure: one('pressure', pascals),
    humidity: values.humidity?.[0]?.si,
    keptDoubts: [],
    note: kept?.success ? kept.data : undefined,
  })
}

function takenAtOf(word: Words['taken_at'], problems: Problem[]): SheetPart['takenAt'] {
  if (!word) return undefined
  const end = word.text.toLowerCase()
  if (end === 'head' || end === 'tail') return { end }
  const parsed = /^\d+(?:[.,]\d+)?(?:\s*m)?$/i.test(word.text)
    ? Number.parseFloat(word.text.replace(',', '.'))
    : Number.NaN
  if (parsed >= sheetBounds.takenAt.min && parsed <= sheetBounds.takenAt.max)
    return { metres: metres(parsed) }
  problems.push(
    problemOf(
      word.header,
      word.text,
      `is head, tail or metres from the head, not “${shown(word.text)}”`,
      'Write head, tail or a number of metres.',
    ),
  )
  return undefined
}

const defined = <T extends object>(part: T): SheetPart =>
  Object.fromEntries(Object.entries(part).filter(([, value]) => value !== undefined))
