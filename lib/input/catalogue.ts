import type { SpecificationDraft } from '@/lib/domain/metrology/complete-specification'
import type { SpecificationBody, TensionBasis } from '@/lib/domain/metrology/specification'
import { ok, type Result, refused } from '@/lib/domain/result'
import type { MaterialBody, Ranged } from '@/lib/domain/strings/material'
import { parseNote } from '@/lib/domain/strings/pitch'
import {
  hertz,
  kilogramsPerCubicMetre,
  kilogramsPerMetre,
  metres,
  pascals,
  perKelvin,
} from '@/lib/domain/units/quantity'
import type { UnitId } from '@/lib/domain/units/unit'
import { collect } from './collect'
import {
  choiceField,
  dayField,
  type FormFields,
  numberField,
  optionalQuantityField,
  type QuantityField,
  quantityField,
  textField,
  versionField,
} from './form-fields'
import { codeText, paragraphs, plainText } from './plain-text'

export const materialKinds = ['metal', 'polymer', 'gut'] as const
export const constructions = ['plain', 'wound'] as const
export const coreShapes = ['round', 'hex'] as const
export const tensionBases = [
  'unloaded-mass',
  'loaded-mass',
  'plain-formula',
] as const satisfies readonly TensionBasis[]

export interface MaterialInput {
  readonly name: string
  readonly standing: string
  readonly source: string
  readonly body: MaterialBody
}

export interface ProductInput {
  readonly code: string
  readonly name: string
  readonly family: string
  readonly construction: (typeof constructions)[number]
}

export interface SpecificationInput {
  readonly materialCode: string
  /** First day of its force in the works' time zone, `2026-11-27`. */
  readonly effectiveDay: string
  readonly note: string
  readonly draft: SpecificationDraft
}

export const parseNewMaterialCode = (fields: FormFields): Result<string> =>
  textField(fields, 'code', codeText('Code', 40))

const rangedField = <Q extends number>(
  fields: FormFields,
  field: string,
  rules: QuantityField,
  door: (value: number) => Q,
): Result<Ranged<Q>> => {
  const read = collect({
    value: quantityField(fields, field, rules),
    low: quantityField(fields, `${field}Low`, { ...rules, name: `${rules.name}, low` }),
    high: quantityField(fields, `${field}High`, { ...rules, name: `${rules.name}, high` }),
  })
  if (!read.ok) return read
  const { value, low, high } = read.value
  return low <= value && value <= high
    ? ok({ value: door(value), low: door(low), high: door(high) })
    : refused({
        code: 'bad-input',
        message: `${rules.name}: the value does not lie between low and high.`,
        where: field,
        mend: 'Give the value you calculate with, and the range met in practice around it.',
      })
}

/** Nothing in all three fields means not known. */
const optionalRangedField = <Q extends number>(
  fields: FormFields,
  field: string,
  rules: QuantityField,
  door: (value: number) => Q,
): Result<Ranged<Q> | undefined> =>
  [field, `${field}Low`, `${field}High`].every((name) => (fields[name] ?? '').trim() === '')
    ? ok(undefined)
    : rangedField(fields, field, rules, door)

const density: QuantityField = { name: 'Density', dimension: 'density', unit: 'kg/m³', min: 500, max: 23_000 }
const modulus: QuantityField = {
  name: 'Young’s modulus',
  dimension: 'pressure',
  unit: 'GPa',
  min: 1e8,
  max: 1e12,
}
const expansion: QuantityField = {
  name: 'Thermal expansion',
  dimension: 'expansion',
  unit: 'µm/(m·K)',
  min: -1e-4,
  max: 1e-3,
}
const strength = (name: string): QuantityField => ({
  name,
  dimension: 'pressure',
  unit: 'MPa',
  min: 1e7,
  max: 1e10,
})

const strengthField = (fields: FormFields): Result<MaterialBody['tensileStrength'] | undefined> => {
  const read = collect({
    low: optionalQuantityField(fields, 'strengthLow', strength('Tensile strength, low')),
    high: optionalQuantityField(fields, 'strengthHigh', strength('Tensile strength, high')),
  })
  if (!read.ok) return read
  const { low, high } = read.value
  if (low === undefined && high === undefined) return ok(undefined)
  return low !== undefined && high !== undefined && low <= high
    ? ok({ low: pascals(low), high: pascals(high) })
    : refused({
        code: 'bad-input',
        message: 'Tensile strength needs a low and a high value, in this order.',
        where: 'strengthLow',
        mend: 'Leave both empty where it is not known.',
      })
}

/** A material's form; strength by diameter, where a standard gives it, is kept from `before`. */
export function parseMaterial(fields: FormFields, before?: MaterialBody): Result<MaterialInput> {
  const read = collect({
    name: textField(fields, 'name', plainText('Name', { max: 80 })),
    standing: textField(fields, 'standing', plainText('Standing', { max: 200 })),
    source: textField(fields, 'source', plainText('Source', { min: 0, max: 300 })),
    kind: choiceField(fields, 'kind', 'Kind', materialKinds),
    density: rangedField(fields, 'density', density, kilogramsPerCubicMetre),
    youngsModulus: rangedField(fields, 'modulus', modulus, pascals),
    poisson: numberField(fields, 'poisson', { name: 'Poisson’s ratio', min: 0, max: 0.5 }),
    thermalExpansion: optionalRangedField(fields, 'expansion', expansion, perKelvin),
    tensileStrength: strengthField(fields),
  })
  if (!read.ok) return read
  const { name, standing, source, thermalExpansion, tensileStrength, ...body } = read.value
  return ok({
    name,
    standing,
    source,
    body: {
      ...body,
      ...(thermalExpansion ? { thermalExpansion } : {}),
      ...(tensileStrength ? { tensileStrength } : {}),
      ...(before?.strengthByDiameter ? { strengthByDiameter: before.strengthByDiameter } : {}),
    },
  })
}

export const parseMaterialVersion = versionField

export const parseProduct = (fields: FormFields): Result<ProductInput> =>
  collect({
    code: textField(fields, 'code', codeText('Code', 40)),
    name: textField(fields, 'name', plainText('Name', { max: 80 })),
    family: textField(fields, 'family', plainText('Family', { max: 60 })),
    construction: choiceField(fields, 'construction', 'Construction', constructions),
  })

/** Half-widths of tolerances by typing: relative ones in per cent. */
const percent = (name: string, max: number): QuantityField => ({
  name,
  dimension: 'ratio',
  unit: '%',
  min: 1e-5,
  max,
})

const length = (name: string, unit: UnitId, min: number, max: number): QuantityField => ({
  name,
  dimension: 'length',
  unit,
  min,
  max,
})

const guardField = (fields: FormFields, field: string, name: string): Result<0 | 1> => {
  const read = choiceField(fields, field, name, ['0', '1'])
  return read.ok ? ok(read.value === '1' ? 1 : 0) : read
}

const count = (fields: FormFields, field: string, name: string, min: number, max: number) =>
  numberField(fields, field, { name, min, max, whole: true })

function planField(fields: FormFields): Result<SpecificationBody['plan']> {
  const read = collect({
    heads: count(fields, 'heads', 'Specimens from the head', 0, 50),
    tails: count(fields, 'tails', 'Specimens from the tail', 0, 50),
    positions: count(fields, 'positions', 'Places of the diameter', 1, 20),
    directions: choiceField(fields, 'directions', 'Directions', ['1', '2'] as const),
    weighedState: choiceField(fields, 'weighedState', 'Cut', ['slack', 'marked'] as const),
    cutLength: quantityField(fields, 'cutLength', length('Cut length', 'mm', 0.02, 5)),
    acceptanceConstant: numberField(fields, 'acceptanceConstant', {
      name: 'Acceptance constant',
      min: 0,
      max: 10,
    }),
    rigCode: textField(fields, 'rigCode', codeText('Rig', 20)),
  })
  if (!read.ok) return read
  const { heads, tails, directions, cutLength, ...rest } = read.value
  if (heads + tails < 1)
    return refused({
      code: 'bad-input',
      message: 'The plan takes no specimen.',
      where: 'heads',
      mend: 'Take at least one, from the head or from the tail.',
    })
  return ok({
    ...rest,
    specimens: heads + tails,
    directions: directions === '1' ? 1 : 2,
    takenAt: [...Array<'head'>(heads).fill('head'), ...Array<'tail'>(tails).fill('tail')],
    cutLength: metres(cutLength),
  })
}

/** Nothing chosen and nothing typed: a plain string. */
function coreField(fields: FormFields): Result<SpecificationBody['core']> {
  const [shape, size] = [fields.coreShape ?? '', fields.coreSize ?? ''].map((text) => text.trim())
  if (!shape && !size) return ok(undefined)
  const read = collect({
    shape: choiceField(fields, 'coreShape', 'Shape of the core', coreShapes),
    size: quantityField(fields, 'coreSize', length('Size of the core', 'mm', 2e-5, 0.01)),
  })
  if (!read.ok) return read
  return ok({ shape: read.value.shape, size: metres(read.value.size) })
}

/** What a core asks of the rest: it lies inside the string, and the wraps’ mass can’t be reckoned from a density. */
function coreProblem(core: SpecificationBody['core'], diameter: number, mass: number | undefined) {
  if (!core) return undefined
  if (core.size >= diameter)
    return {
      code: 'bad-input' as const,
      message: 'The core is as thick as the whole string.',
      where: 'coreSize',
      mend: 'Give the diameter of the core, or across flats of a hexagonal one; leave it empty for a plain string.',
    }
  if (mass === undefined)
    return {
      code: 'bad-input' as const,
      message: 'A wound string needs its mass per metre.',
      where: 'massPerMetre',
      mend: 'Type it: it follows from core, wrap and lay, not from diameter and density alone.',
    }
  return undefined
}

/** The form that issues a specification revision; typed diameters without a unit are in the works' unit. */
export function parseSpecification(fields: FormFields, diameterUnit: UnitId): Result<SpecificationInput> {
  const read = collect({
    materialCode: textField(fields, 'materialCode', codeText('Material', 40)),
    core: coreField(fields),
    effectiveDay: dayField(fields, 'effectiveDay', 'In force from'),
    note: textField(fields, 'note', paragraphs('What changed', { min: 0, max: 500 })),
    diameter: quantityField(fields, 'diameter', length('Diameter', diameterUnit, 2e-5, 0.01)),
    diameterTolerance: quantityField(
      fields,
      'diameterTolerance',
      length('Tolerance of the diameter', 'µm', 1e-8, 1e-3),
    ),
    mass: optionalQuantityField(fields, 'massPerMetre', {
      name: 'Mass per metre',
      dimension: 'massPerLength',
      unit: 'mg/m',
      min: 1e-7,
      max: 1,
    }),
    massTolerance: quantityField(fields, 'massTolerance', percent('Tolerance of the mass per metre', 0.5)),
    ovalityMax: quantityField(fields, 'ovalityMax', length('Ovality at most', 'µm', 1e-8, 1e-3)),
    densityTolerance: quantityField(fields, 'densityTolerance', percent('Tolerance of the density', 0.5)),
    midi: parseNote(fields.referenceNote ?? '', 'referenceNote'),
    a4: quantityField(fields, 'a4', {
      name: 'Concert A',
      dimension: 'frequency',
      unit: 'Hz',
      min: 380,
      max: 480,
    }),
    length: quantityField(fields, 'length', length('Reference length', 'mm', 0.05, 3)),
    basis: choiceField(fields, 'basis', 'Basis of the tension', tensionBases),
    guardDiameter: guardField(fields, 'guardDiameter', 'Guard band of the diameter'),
    guardMass: guardField(fields, 'guardMass', 'Guard band of mass and tension'),
    plan: planField(fields),
  })
  if (!read.ok) return read
  const { core, materialCode, effectiveDay, note, mass, guardDiameter, guardMass, plan, ...rest } = read.value
  const wrong = coreProblem(core, rest.diameter, mass)
  if (wrong) return refused(wrong)
  return ok({
    materialCode,
    effectiveDay,
    note,
    draft: {
      ...(core ? { core } : {}),
      diameter: { target: metres(rest.diameter), tolerance: metres(rest.diameterTolerance) },
      massPerMetre: {
        ...(mass === undefined ? {} : { target: kilogramsPerMetre(mass) }),
        tolerance: rest.massTolerance,
      },
      ovalityMax: metres(rest.ovalityMax),
      densityTolerance: rest.densityTolerance,
      reference: { midi: rest.midi, a4: hertz(rest.a4), length: metres(rest.length) },
      basis: rest.basis,
      guardFactors: {
        diameter: guardDiameter,
        massPerMetreWeighed: guardMass,
        massPerMetreSounded: guardMass,
        tension: guardMass,
      },
      plan,
    },
  })
}
