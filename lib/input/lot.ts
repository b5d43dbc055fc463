import { z } from 'zod'
import { lotMaterialRoles } from '@/lib/domain/record/material-in'
import { instant } from './instant'
import { codeText, paragraphs, plainText } from './plain-text'
import { clientId } from './specimen'

/** Longest lot, and so the furthest place along one, metres. */
export const MOST_LOT_METRES = 10_000_000

const metreOf = (name: string) =>
  z
    .number({ error: `${name} is a number of metres.` })
    .min(0, { error: `${name} is at least 0 m.` })
    .max(MOST_LOT_METRES, { error: `${name} is at most 10 000 km.` })
    .optional()

/** A coil, spool or resin batch that went into the lot, and where along it when there was a splice. */
export const lotMaterialSchema = z
  .strictObject({
    role: z.enum(lotMaterialRoles, { error: 'Role is core, wrap-1, wrap-2 or resin.' }),
    code: codeText('Coil, spool or batch'),
    fromMetre: metreOf('From'),
    toMetre: metreOf('To'),
  })
  .refine(
    ({ fromMetre, toMetre }) => fromMetre === undefined || toMetre === undefined || fromMetre < toMetre,
    { error: 'The place where it begins has to lie before the place where it ends.', path: ['toMetre'] },
  )

/** In the order in which they follow each other along the lot. */
export const lotMaterialsSchema = z
  .array(lotMaterialSchema)
  .max(20, { error: 'A lot is made of at most 20 coils, spools and batches.' })

export const openLotSchema = z.strictObject({
  /** Makes opening safe to repeat. */
  requestId: clientId('Request id').optional(),
  code: codeText('Lot code'),
  productCode: codeText('Product'),
  madeAt: instant('Made at'),
  machineCode: codeText('Machine').optional(),
  dieCode: codeText('Die').optional(),
  lengthMetres: z
    .number({ error: 'Length of the lot is a number of metres.' })
    .gt(0, { error: 'Length of the lot is more than 0 m.' })
    .max(MOST_LOT_METRES, { error: 'Length of the lot is at most 10 000 km.' })
    .optional(),
  setting: plainText('Setting', { min: 0, max: 200 }).default(''),
  /** Number of the specification revision on the traveller; without it the one in force when it was made. */
  revision: z.int().min(1).optional(),
  materials: lotMaterialsSchema.default([]),
})

export const changeLotMaterialsSchema = z.strictObject({
  /** The version of the lot that was on the screen. */
  lotVersion: z.int().min(1),
  /** All of them: they take the place of those that are named now. */
  materials: lotMaterialsSchema,
  reason: paragraphs('Reason', { min: 3, max: 500 }),
})

export type LotMaterialInput = z.output<typeof lotMaterialSchema>
type ParsedOpenLot = z.output<typeof openLotSchema>
/** A program that opens lots may leave out what they are made of. */
export type OpenLotInput = Omit<ParsedOpenLot, 'materials'> & Partial<Pick<ParsedOpenLot, 'materials'>>
export type ChangeLotMaterialsInput = z.output<typeof changeLotMaterialsSchema>
