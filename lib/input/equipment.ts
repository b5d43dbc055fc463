import { ok, type Result } from '@/lib/domain/result'
import type { UnitId } from '@/lib/domain/units/unit'
import { collect } from './collect'
import {
  choiceField,
  codesField,
  type FormFields,
  optionalDayField,
  optionalQuantityField,
  type QuantityField,
  quantityField,
  textField,
} from './form-fields'
import { codeText, paragraphs, plainText } from './plain-text'

export const gaugeKinds = ['micrometer', 'balance', 'rule', 'counter', 'thermometer'] as const
export const gaugeModes = ['direct', 'against-pin'] as const
export const weightKinds = ['weight', 'slot', 'hanger', 'hook'] as const
export const arrangements = ['vertical', 'horizontal'] as const
export const endConditions = ['knife', 'pinned', 'clamped'] as const
export const machineKinds = ['drawing machine', 'winder', 'extruder', 'grinder'] as const

export type GaugeKind = (typeof gaugeKinds)[number]

/** What each kind of gauge measures: dimension, the unit its entries are shown in, and the largest resolution. */
export const gaugeDimensions: Readonly<
  Record<
    GaugeKind,
    { readonly dimension: QuantityField['dimension']; readonly unit: UnitId; readonly most: number }
  >
> = {
  micrometer: { dimension: 'length', unit: 'µm', most: 1e-4 },
  balance: { dimension: 'mass', unit: 'mg', most: 1e-2 },
  rule: { dimension: 'length', unit: 'mm', most: 1e-2 },
  counter: { dimension: 'frequency', unit: 'Hz', most: 10 },
  thermometer: { dimension: 'temperature', unit: '°C', most: 5 },
}

export interface GaugeInput {
  readonly name: string
  readonly kind: GaugeKind
  /** SI by kind: metres, kilograms, hertz, degrees Celsius. */
  readonly resolution: number
  readonly uAbsolute: number
  readonly uRelative: number
  /** Shown − true. */
  readonly error: number
  readonly mode: (typeof gaugeModes)[number]
  /** Last day of its calibration, `2026-11-27`. */
  readonly calibrationDue: string | undefined
  readonly note: string
}

export interface WeightInput {
  readonly kind: (typeof weightKinds)[number]
  readonly conventionalMass: number
  readonly uMass: number
  readonly note: string
}

export interface RigInput {
  readonly name: string
  readonly arrangement: (typeof arrangements)[number]
  readonly spanMetres: number
  readonly uSpanMetres: number
  readonly endCondition: (typeof endConditions)[number]
  readonly uEndRelative: number | undefined
  readonly frictionHalfWidth: number
  readonly hangingLengthMetres: number
  readonly hangerCode: string
  readonly weightCodes: readonly string[]
  readonly micrometerCode: string
  readonly balanceCode: string
  readonly ruleCode: string
  readonly counterCode: string
  readonly note: string
}

export interface MachineInput {
  readonly name: string
  readonly kind: (typeof machineKinds)[number]
}

export interface DieInput {
  readonly name: string
  readonly sizeMetres: number
}

/** The code that a new piece of equipment gets. */
export const parseEquipmentCode = (fields: FormFields): Result<string> =>
  textField(fields, 'code', codeText('Code', 20))

const name = (fields: FormFields) => textField(fields, 'name', plainText('Name', { max: 80 }))
const note = (fields: FormFields) => textField(fields, 'note', paragraphs('Note', { min: 0, max: 500 }))

const noMoreThanError = 1000

/** Differences of temperature have the size of a kelvin: the form shows them in °C and they have no zero. */
const gaugeQuantity = (label: string, kind: GaugeKind, min: number, max: number): QuantityField => {
  const { dimension, unit } = gaugeDimensions[kind]
  return { name: label, dimension, unit, min, max }
}

export function parseGauge(fields: FormFields): Result<GaugeInput> {
  const kind = choiceField(fields, 'kind', 'Kind', gaugeKinds)
  // Without a kind the numbers have no unit yet; the one problem is enough.
  if (!kind.ok) return kind
  const most = gaugeDimensions[kind.value].most
  return collect({
    kind,
    name: name(fields),
    resolution: quantityField(fields, 'resolution', gaugeQuantity('Resolution', kind.value, 0, most)),
    uAbsolute: quantityField(fields, 'uAbsolute', gaugeQuantity('Standard uncertainty', kind.value, 0, most)),
    uRelative: optionalZero(
      optionalQuantityField(fields, 'uRelative', {
        name: 'Part in proportion',
        dimension: 'ratio',
        unit: '%',
        min: 0,
        max: 0.1,
      }),
    ),
    error: optionalZero(
      optionalQuantityField(
        fields,
        'error',
        gaugeQuantity('Known error', kind.value, -most * noMoreThanError, most * noMoreThanError),
      ),
    ),
    mode: choiceField(fields, 'mode', 'Way of reading', gaugeModes),
    calibrationDue: optionalDayField(fields, 'calibrationDue', 'Calibration due'),
    note: note(fields),
  })
}

const optionalZero = (result: Result<number | undefined>): Result<number> =>
  result.ok ? ok(result.value ?? 0) : result

export const parseWeight = (fields: FormFields): Result<WeightInput> =>
  collect({
    kind: choiceField(fields, 'kind', 'Kind', weightKinds),
    conventionalMass: quantityField(fields, 'conventionalMass', {
      name: 'Conventional mass',
      dimension: 'mass',
      unit: 'kg',
      min: 1e-4,
      max: 200,
    }),
    uMass: quantityField(fields, 'uMass', {
      name: 'Standard uncertainty',
      dimension: 'mass',
      unit: 'mg',
      min: 0,
      max: 0.1,
    }),
    note: note(fields),
  })

const optionalCode = (fields: FormFields, field: string, label: string) =>
  (fields[field] ?? '').trim() === '' ? ok('') : textField(fields, field, codeText(label, 20))

export const parseRig = (fields: FormFields): Result<RigInput> =>
  collect({
    name: name(fields),
    arrangement: choiceField(fields, 'arrangement', 'Arrangement', arrangements),
    spanMetres: quantityField(fields, 'span', {
      name: 'Span',
      dimension: 'length',
      unit: 'mm',
      min: 0.05,
      max: 5,
    }),
    uSpanMetres: quantityField(fields, 'uSpan', {
      name: 'Standard uncertainty of the span',
      dimension: 'length',
      unit: 'mm',
      min: 0,
      max: 0.01,
    }),
    endCondition: choiceField(fields, 'endCondition', 'Ends', endConditions),
    uEndRelative: optionalQuantityField(fields, 'uEndRelative', {
      name: 'Uncertainty of the end correction',
      dimension: 'ratio',
      unit: '%',
      min: 0,
      max: 0.05,
    }),
    frictionHalfWidth: quantityField(fields, 'frictionHalfWidth', {
      name: 'Friction at the edges',
      dimension: 'ratio',
      unit: '%',
      min: 0,
      max: 0.05,
    }),
    hangingLengthMetres: quantityField(fields, 'hangingLength', {
      name: 'Hanging length',
      dimension: 'length',
      unit: 'mm',
      min: 0,
      max: 5,
    }),
    hangerCode: optionalCode(fields, 'hangerCode', 'Hanger'),
    weightCodes: codesField(fields, 'weightCodes', codeText('Weight', 20)),
    micrometerCode: optionalCode(fields, 'micrometerCode', 'Micrometer'),
    balanceCode: optionalCode(fields, 'balanceCode', 'Balance'),
    ruleCode: optionalCode(fields, 'ruleCode', 'Rule'),
    counterCode: optionalCode(fields, 'counterCode', 'Counter'),
    note: note(fields),
  })

export const parseMachine = (fields: FormFields): Result<MachineInput> =>
  collect({ name: name(fields), kind: choiceField(fields, 'kind', 'Kind', machineKinds) })

export const parseDie = (fields: FormFields): Result<DieInput> =>
  collect({
    name: name(fields),
    sizeMetres: quantityField(fields, 'size', {
      name: 'Bore',
      dimension: 'length',
      unit: 'mm',
      min: 1e-5,
      max: 0.02,
    }),
  })
