import { z } from 'zod'
import { readingKinds } from '@/lib/domain/record/reading'
import { instant } from './instant'
import { codeText, paragraphs } from './plain-text'
import { sheetPartSchema } from './sheet'

/** Most specimens that one request records; longer lists come by file. */
export const MOST_SPECIMENS = 200

/** A time-ordered UUID that the sender made, so that sending again never stores twice. */
export const clientId = (name: string) => z.uuid({ error: `${name} is not a UUID.` }).toLowerCase()

const equipmentCode = (name: string) => codeText(name).optional()

export const equipmentCodesSchema = z.strictObject({
  rig: equipmentCode('Rig'),
  micrometer: equipmentCode('Micrometer'),
  balance: equipmentCode('Balance'),
  rule: equipmentCode('Rule'),
  counter: equipmentCode('Counter'),
})

const readingSchema = z.strictObject({
  clientId: clientId('Reading id'),
  kind: z.enum(readingKinds).default('sheet'),
  sheet: sheetPartSchema,
  equipment: equipmentCodesSchema.default({}),
  /** When it was measured, if that was not just now. */
  measuredAt: instant('Measured at').optional(),
})

const specimenSchema = z.strictObject({
  clientId: clientId('Specimen id'),
  number: z
    .int({ error: 'Specimen number is a whole number.' })
    .min(1, { error: 'Specimens are numbered from 1.' })
    .max(9999, { error: 'Specimen numbers end at 9999.' }),
})

const entrySchema = z.strictObject({ specimen: specimenSchema, reading: readingSchema })

export const recordSpecimensSchema = z
  .strictObject({
    requestId: clientId('Request id'),
    lotCode: codeText('Lot'),
    entries: z.array(entrySchema).min(1).max(MOST_SPECIMENS),
  })
  .superRefine(({ entries }, context) => {
    const numbers = entries.map((entry) => entry.specimen.number)
    const twice = numbers.find((number, index) => numbers.indexOf(number) !== index)
    if (twice !== undefined)
      context.addIssue({ code: 'custom', message: `Specimen ${twice} is given twice in one request.` })
  })

/** One specimen, as the bench posts it. */
export const recordSpecimenSchema = z
  .strictObject({ requestId: clientId('Request id'), lotCode: codeText('Lot'), ...entrySchema.shape })
  .transform(({ requestId, lotCode, specimen, reading }) => ({
    requestId,
    lotCode,
    entries: [{ specimen, reading }],
  }))

/** A correction: one act of one specimen anew, with a reason; what it replaces stays readable. */
export const supersedeReadingSchema = z.strictObject({
  requestId: clientId('Request id'),
  /** Client id of the reading that is corrected: the newest one of its chain. */
  supersedes: clientId('Reading id'),
  reading: readingSchema,
  reason: paragraphs('Reason', { min: 3, max: 1000 }),
})

export type SpecimenEntryInput = z.output<typeof entrySchema>
export type RecordSpecimensInput = z.output<typeof recordSpecimensSchema>
export type SupersedeReadingInput = z.output<typeof supersedeReadingSchema>
