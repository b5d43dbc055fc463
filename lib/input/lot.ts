import { z } from 'zod'
import { lotStates } from '@/lib/domain/record/lot-state'
import { instant } from './instant'
import { codeText, plainText } from './plain-text'
import { clientId } from './specimen'

/** Lots on one page of the list. */
export const LOTS_A_PAGE = 50

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
    .max(10_000_000, { error: 'Length of the lot is at most 10 000 km.' })
    .optional(),
  setting: plainText('Setting', { min: 0, max: 200 }).default(''),
  /** Number of the specification revision on the traveller; without it the one in force when it was made. */
  revision: z.int().min(1).optional(),
})

export const listLotsSchema = z.strictObject({
  search: plainText('Search', { min: 0, max: 80 }).default(''),
  state: z.enum(lotStates).optional(),
  productCode: codeText('Product').optional(),
  page: z.coerce.number().int().min(1).max(100_000).default(1),
})

export type OpenLotInput = z.output<typeof openLotSchema>
export type ListLotsInput = z.output<typeof listLotsSchema>
