import { z } from 'zod'
import { materialInKinds } from '@/lib/domain/record/material-in'
import { ok, type Result } from '@/lib/domain/result'
import { collect } from './collect'
import {
  choiceField,
  type FormFields,
  optionalDayField,
  optionalQuantityField,
  textField,
} from './form-fields'
import { instant } from './instant'
import { codeText, paragraphs, plainText } from './plain-text'

/** Coils, spools and batches on one page of the list. */
export const MATERIALS_A_PAGE = 50

/** SI, both allowed. */
export const materialInBounds = {
  size: { min: 1e-5, max: 0.02 },
  length: { min: 0.01, max: 10_000_000 },
  mass: { min: 1e-4, max: 100_000 },
} as const

const within = (name: string, unit: string, { min, max }: { readonly min: number; readonly max: number }) =>
  z
    .number({ error: `${name} is a number in ${unit}.` })
    .min(min, { error: `${name} is at least ${min} ${unit}.` })
    .max(max, { error: `${name} is at most ${max} ${unit}.` })
    .optional()

export const materialInSchema = z.strictObject({
  name: plainText('Name', { max: 80 }),
  kind: z.enum(materialInKinds, { error: 'Kind is coil, spool or resin-batch.' }),
  /** What it is said to be, in the catalogue. */
  materialCode: codeText('Material').optional(),
  /** The melt that the mill's certificate names. */
  heat: plainText('Heat', { min: 0, max: 80 }).default(''),
  supplier: plainText('Supplier', { min: 0, max: 120 }).default(''),
  /** The coil that a spool was wound from. */
  parentCode: codeText('Wound from').optional(),
  sizeMetres: within('Size', 'm', materialInBounds.size),
  lengthMetres: within('Length', 'm', materialInBounds.length),
  massKilograms: within('Mass', 'kg', materialInBounds.mass),
  receivedAt: instant('Received').optional(),
  note: paragraphs('Note', { min: 0, max: 500 }).default(''),
})

export const createMaterialInSchema = materialInSchema.extend({ code: codeText('Code') })

export const listMaterialsInSchema = z.strictObject({
  search: plainText('Search', { min: 0, max: 80 }).default(''),
  kind: z.enum(materialInKinds, { error: 'Kind is coil, spool or resin-batch.' }).optional(),
  /** `yes`: what is in use; `no`: what was put away. */
  inUse: z.enum(['yes', 'no'], { error: 'In use is yes or no.' }).optional(),
  page: z.coerce.number().int().min(1).max(100_000).default(1),
})

export type MaterialInInput = z.output<typeof materialInSchema>
export type ListMaterialsInInput = z.output<typeof listMaterialsInSchema>

/** The code that a new coil, spool or batch gets. */
export const parseMaterialInCode = (fields: FormFields): Result<string> =>
  textField(fields, 'code', codeText('Code'))

const optionalCode = (fields: FormFields, field: string, label: string): Result<string | undefined> =>
  (fields[field] ?? '').trim() === '' ? ok(undefined) : textField(fields, field, codeText(label))

/**
 * The fields of its form: sizes in mm, lengths in m, masses in kg unless a unit follows.
 * @param startOf the first instant of a day `2026-11-27` by the works' clock, epoch milliseconds
 */
export function parseMaterialIn(
  fields: FormFields,
  startOf: (day: string) => number,
): Result<MaterialInInput> {
  const read = collect({
    name: textField(fields, 'name', materialInSchema.shape.name),
    kind: choiceField(fields, 'kind', 'Kind', materialInKinds),
    materialCode: optionalCode(fields, 'materialCode', 'Material'),
    heat: textField(fields, 'heat', materialInSchema.shape.heat),
    supplier: textField(fields, 'supplier', materialInSchema.shape.supplier),
    parentCode: optionalCode(fields, 'parentCode', 'Wound from'),
    sizeMetres: optionalQuantityField(fields, 'size', {
      name: 'Size',
      dimension: 'length',
      unit: 'mm',
      ...materialInBounds.size,
    }),
    lengthMetres: optionalQuantityField(fields, 'length', {
      name: 'Length',
      dimension: 'length',
      unit: 'm',
      ...materialInBounds.length,
    }),
    massKilograms: optionalQuantityField(fields, 'mass', {
      name: 'Mass',
      dimension: 'mass',
      unit: 'kg',
      ...materialInBounds.mass,
    }),
    received: optionalDayField(fields, 'received', 'Received'),
    note: textField(fields, 'note', materialInSchema.shape.note),
  })
  if (!read.ok) return read
  const { received, ...values } = read.value
  return ok({ ...values, ...(received === undefined ? {} : { receivedAt: startOf(received) }) })
}
