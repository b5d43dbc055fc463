import { z } from 'zod'
import type { SpecimenSheet } from '@/lib/domain/metrology/sheet'
import type { SheetPart } from '@/lib/domain/record/reading'
import { degreesCelsius, hertz, kilograms, metres, newtons, pascals } from '@/lib/domain/units/quantity'
import { codeText, paragraphs, plainText } from './plain-text'
import { sheetBounds } from './sheet-bounds'
import { typedValue } from './typed-value'

/** Most of each that one specimen can have. */
export const sheetCounts = { diameters: 200, plucks: 20, weights: 30, doubts: 60 } as const

const diameter = z.strictObject({
  position: z.int().min(1).max(100),
  direction: z.enum(['a', 'b']),
  value: typedValue(sheetBounds.diameter, metres),
})

const load = z.discriminatedUnion('kind', [
  z.strictObject({
    kind: z.literal('weights'),
    hanger: z.union([z.literal(''), codeText('Hanger')]),
    weights: z.array(codeText('Weight')).max(sheetCounts.weights),
  }),
  z.strictObject({ kind: z.literal('mass'), value: typedValue(sheetBounds.loadMass, kilograms) }),
  z.strictObject({ kind: z.literal('force'), value: typedValue(sheetBounds.loadForce, newtons) }),
])

const takenAt = z.union([
  z.strictObject({ end: z.enum(['head', 'tail']) }),
  z.strictObject({
    metres: z.number().min(sheetBounds.takenAt.min).max(sheetBounds.takenAt.max).transform(metres),
  }),
])

const keptDoubt = z.strictObject({
  field: plainText('Field', { max: 40 }),
  question: plainText('Question', { max: 400 }),
  reason: paragraphs('Reason', { max: 400 }),
})

const diameters = z
  .array(diameter)
  .max(sheetCounts.diameters)
  .superRefine((list, context) => {
    const places = list.map((one) => `${one.position} ${one.direction}`)
    const twice = places.find((place, index) => places.indexOf(place) !== index)
    if (twice !== undefined)
      context.addIssue({ code: 'custom', message: `Diameter at place ${twice} is given twice.` })
  })

/** Any part of a sheet: what one act, or one person, read. */
export const sheetPartSchema = z
  .strictObject({
    takenAt: takenAt.optional(),
    diameters: diameters.optional(),
    weighedState: z.enum(['slack', 'marked']).optional(),
    cutLength: typedValue(sheetBounds.cutLength, metres).optional(),
    cutMass: typedValue(sheetBounds.cutMass, kilograms).optional(),
    load: load.optional(),
    span: typedValue(sheetBounds.span, metres).optional(),
    frequencies: z.array(typedValue(sheetBounds.frequency, hertz)).max(sheetCounts.plucks).optional(),
    temperature: typedValue(sheetBounds.temperature, degreesCelsius).optional(),
    pressure: typedValue(sheetBounds.pressure, pascals).optional(),
    humidity: z.number().min(0, { error: 'Humidity lies between 0 and 1.' }).max(1).optional(),
    keptDoubts: z.array(keptDoubt).max(sheetCounts.doubts).optional(),
    note: paragraphs('Note', { min: 0, max: 2000 }).optional(),
  })
  .superRefine((part, context) => {
    if (part.load?.kind !== 'weights') return
    const { weights } = part.load
    const twice = weights.find((code, index) => weights.indexOf(code) !== index)
    if (twice !== undefined)
      context.addIssue({ code: 'custom', path: ['load'], message: `Weight ${twice} can hang only once.` })
  })
  .transform((part): SheetPart => part)

/** A whole sheet, as the bench hands it in. */
export const sheetSchema = sheetPartSchema.transform(
  (part): SpecimenSheet => ({
    ...part,
    diameters: part.diameters ?? [],
    weighedState: part.weighedState ?? 'slack',
    frequencies: part.frequencies ?? [],
    keptDoubts: part.keptDoubts ?? [],
  }),
)
