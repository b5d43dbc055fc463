import {
  type DoubtChoice,
  doubtDigits,
  doubtFrequency,
  doubtMass,
  type EntryDoubt,
} from '@/lib/domain/metrology/entry-doubts'
import { measurementModel } from '@/lib/domain/metrology/measurement-model'
import { modelFacts } from '@/lib/domain/metrology/model-facts'
import type { SpecimenSheet, TypedValue } from '@/lib/domain/metrology/sheet'
import { understandEntry } from '@/lib/domain/metrology/understand-entry'
import type { Result } from '@/lib/domain/result'
import { loadBearingSection } from '@/lib/domain/strings/load-bearing'
import { soundedFundamental } from '@/lib/domain/strings/sounding-forward'
import { axialStiffness, bendingStiffness } from '@/lib/domain/strings/stiffness'
import { formatQuantity } from '@/lib/domain/units/format'
import {
  degreesCelsius,
  type Hertz,
  hertz,
  kilograms,
  kilogramsPerMetre,
  metres,
} from '@/lib/domain/units/quantity'
import { fromSi, type UnitId } from '@/lib/domain/units/unit'
import { type BenchCell, benchFields, cellKey } from '@/lib/input/bench-cells'
import { sheetBounds } from '@/lib/input/sheet-bounds'
import type { BenchView } from './bench-view'
import type { DraftValue } from './draft-store'

export type BenchEntry = DraftValue

type Values = Readonly<Record<string, DraftValue>>

export type QuestionChoice =
  | { readonly kind: 'measure-again'; readonly label: string }
  | { readonly kind: 'meant'; readonly label: string; readonly entry: BenchEntry }
  | { readonly kind: 'keep'; readonly label: string }

export interface Question {
  readonly question: string
  readonly detail: string
  readonly choices: readonly QuestionChoice[]
}

interface FieldRules {
  readonly name: string
  readonly dimension: 'length' | 'mass' | 'frequency' | 'temperature'
  readonly unit: UnitId
  readonly decimals: number
  readonly min: number
  readonly max: number
}

/** Decimals in which a reading is shown, by unit: those a good bench instrument has. */
const readingDecimals: Readonly<Partial<Record<string, number>>> = {
  mm: 1,
  µm: 1,
  mg: 1,
  g: 4,
  in: 3,
  thou: 2,
  m: 4,
  Hz: 2,
  '°C': 1,
}

const asUnit = (text: string): UnitId => text as UnitId

export function fieldRules(view: BenchView, id: string): FieldRules {
  const { units } = view
  const bounds = id.startsWith('d')
    ? sheetBounds.diameter
    : id === 'cutMass'
      ? sheetBounds.cutMass
      : id === 'frequency'
        ? sheetBounds.frequency
        : id === 'temperature'
          ? sheetBounds.temperature
          : id === 'span'
            ? sheetBounds.span
            : sheetBounds.cutLength
  const unit = asUnit(
    id.startsWith('d')
      ? units.diameter
      : id === 'cutMass'
        ? units.mass
        : id === 'frequency'
          ? 'Hz'
          : id === 'temperature'
            ? '°C'
            : units.length,
  )
  const decimals =
    id.startsWith('d') && unit === 'mm'
      ? 4
      : id.startsWith('d') && unit === 'in'
        ? 5
        : (readingDecimals[unit] ?? 2)
  return { ...bounds, unit, decimals }
}

/** A value of a field as the sheet shows it, in the sheet's unit. */
export function shownValue(
  view: BenchView,
  id: string,
  value?: DraftValue,
): { readonly text: string; readonly unit: string } {
  const { decimals, unit } = fieldRules(view, id)
  const options = { decimals, decimal: view.decimal }
  return { unit, text: value === undefined ? '' : formatQuantity(value.si, unit, options) }
}

/** What the plan and the rig lead one to expect of a field before anything is typed, SI. */
function plannedValue(view: BenchView, id: string): number | undefined {
  const { rig, specification } = view.context
  if (id.startsWith('d')) return specification.diameter.target
  if (id === 'cutLength') return view.plan.cutLength
  if (id === 'cutMass') return specification.massPerMetre.target * view.plan.cutLength
  if (id === 'span') return rig?.span.value
  return undefined
}

/** Reads what is typed into a field; a plain number may be in the unit that makes sense of it. */
export function readEntry(view: BenchView, field: { readonly id: string }, text: string): Result<BenchEntry> {
  const expected = plannedValue(view, field.id)
  return understandEntry(text, { ...fieldRules(view, field.id), expected, where: field.id })
}

/** Values already stored, and the set-up prefilled from plan and rig. */
export function startValues(view: BenchView): { readonly values: Values; readonly setUp: Values } {
  const values: Record<string, DraftValue> = {}
  const put = (number: number, id: string, value: TypedValue<number> | undefined) => {
    if (value) values[cellKey(number, id)] = value
  }
  for (const { number, sheet } of view.stored) {
    for (const { position, direction, value } of sheet.diameters)
      put(number, `d${position}${direction}`, value)
    put(number, 'cutMass', sheet.cutMass)
    put(number, 'cutLength', sheet.cutLength)
    put(number, 'span', sheet.span)
    put(number, 'temperature', sheet.temperature)
    put(number, 'frequency', sheet.frequencies[0])
  }
  const setUp: Record<string, DraftValue> = {}
  for (const [id, si] of [
    ['cutLength', view.plan.cutLength as number],
    ['span', view.context.rig?.span.value],
    ['temperature', view.context.air.celsius],
  ] as const) {
    if (si === undefined) continue
    const { unit } = fieldRules(view, id)
    // Typed as it will be shown, so that both sides read the same number from the text.
    const typed = String(Number(fromSi(si, unit).toPrecision(12)))
    const entry = readEntry(view, { id }, typed)
    if (entry.ok) setUp[id] = entry.value
  }
  return { values, setUp }
}

const typed = <Q extends number>(value: DraftValue, door: (si: number) => Q): TypedValue<Q> => ({
  typed: value.typed,
  unit: value.unit,
  si: door(value.si),
})

/** The sheet of one specimen from what is typed so far. */
export function sheetOf(view: BenchView, values: Values, setUp: Values, specimen: number): SpecimenSheet {
  const at = (id: string): DraftValue | undefined => values[cellKey(specimen, id)] ?? setUp[id]
  const { rig } = view.context
  const end = view.plan.takenAt[specimen - 1]
  const diameters = benchFields(view.plan).flatMap((field) => {
    const value = field.station === 'micrometer' ? values[cellKey(specimen, field.id)] : undefined
    if (!value) return []
    const direction = field.id.endsWith('b') ? ('b' as const) : ('a' as const)
    return [{ position: Number.parseInt(field.id.slice(1), 10), direction, value: typed(value, metres) }]
  })
  const cutMass = values[cellKey(specimen, 'cutMass')]
  const frequency = values[cellKey(specimen, 'frequency')]
  const cutLength = at('cutLength')
  const span = at('span')
  const temperature = at('temperature')
  const keptDoubts = Object.entries(values).flatMap(([key, value]) => {
    const [number, field = ''] = key.split('.')
    return value.kept && Number(number) === specimen ? [{ field, ...value.kept }] : []
  })
  return {
    ...(end ? { takenAt: { end } } : {}),
    diameters,
    weighedState: view.plan.weighedState,
    ...(cutLength ? { cutLength: typed(cutLength, metres) } : {}),
    ...(cutMass ? { cutMass: typed(cutMass, kilograms) } : {}),
    ...(rig ? { load: { kind: 'weights' as const, hanger: rig.hangerCode, weights: rig.weightCodes } } : {}),
    ...(span ? { span: typed(span, metres) } : {}),
    frequencies: frequency ? [typed(frequency, hertz)] : [],
    ...(temperature ? { temperature: typed(temperature, degreesCelsius) } : {}),
    keptDoubts,
  }
}

/** The frequency to be heard: from this specimen's own weighing when there is one, else from the target. */
export function expectedFrequency(
  view: BenchView,
  sheet: SpecimenSheet,
): { readonly value: Hertz; readonly from: 'weighing' | 'target' } | undefined {
  const { rig, specification, material } = view.context
  const facts = modelFacts(sheet, view.context)
  const { results, steps } = measurementModel(facts, {})
  if (!rig || steps.force === undefined) return undefined
  const weighed = results.massPerMetreWeighed
  const diameter = metres(results.diameter ?? specification.diameter.target)
  const modulus = material.youngsModulus.value
  const bearing = loadBearingSection(specification.core, diameter)
  const value = soundedFundamental(
    {
      force: steps.force,
      span: sheet.span?.si ?? metres(rig.span.value),
      endCondition: rig.endCondition,
      axialStiffness: axialStiffness(modulus, bearing.area),
      bendingStiffness: bendingStiffness(modulus, bearing.secondMoment),
      outerDiameter: diameter,
      air: { density: facts.airDensity, viscosity: facts.airViscosity },
    },
    kilogramsPerMetre(weighed ?? specification.massPerMetre.target),
  )
  return { value, from: weighed === undefined ? 'target' : 'weighing' }
}

/** A doubtful entry becomes a question; undefined when there is nothing to ask. */
export function doubtAbout(
  view: BenchView,
  values: Values,
  setUp: Values,
  cell: BenchCell,
  entry: BenchEntry,
): Question | undefined {
  const id = cell.field.id
  const rules = fieldRules(view, id)
  const sheet = sheetOf(view, values, setUp, cell.specimen)
  const show = (si: number): string =>
    formatQuantity(si, rules.unit, { decimals: rules.decimals, decimal: view.decimal, withUnit: true })
  const common = { ...rules, typed: entry.typed, si: entry.si, unit: asUnit(entry.unit) }
  let doubt: EntryDoubt | undefined
  if (id === 'frequency') {
    const expected = expectedFrequency(view, sheet)
    if (!expected) return undefined
    doubt = doubtFrequency({
      ...common,
      expected: expected.value,
      usual: expected.from === 'weighing' ? 0.003 : 0.015,
      because: `This load on this span should sound near ${show(expected.value)} for ${expected.from === 'weighing' ? 'the mass that was weighed' : 'this product'}.`,
    })
  } else if (id === 'cutMass') {
    const length = sheet.cutLength?.si ?? view.plan.cutLength
    const expected = view.context.specification.massPerMetre.target * length
    doubt = doubtMass({
      ...common,
      expected,
      usual: 0.03,
      because: `A piece of this length should weigh about ${show(expected)}.`,
    })
  } else {
    const { diameter } = view.context.specification
    doubt = doubtDigits({
      ...common,
      expected: diameter.target,
      usual: Math.max(0.02, (2 * (diameter.upper - diameter.lower)) / diameter.target / 2),
      because: `This product is ${show(diameter.target)} by its specification.`,
    })
  }
  if (!doubt) return undefined
  const verb = id === 'frequency' ? 'Sound' : id === 'cutMass' ? 'Weigh' : 'Measure'
  const label = (choice: DoubtChoice): QuestionChoice =>
    choice.kind === 'measure-again'
      ? { kind: 'measure-again', label: `${verb} it again` }
      : choice.kind === 'keep'
        ? { kind: 'keep', label: `Keep ${entry.typed}, say why` }
        : {
            kind: 'meant',
            label: `I meant ${show(choice.si)}`,
            entry: { typed: choice.typed, unit: entry.unit, si: choice.si },
          }
  return { question: doubt.question, detail: doubt.detail, choices: doubt.choices.map(label) }
}
