import { z } from 'zod'
import { importOptionsSchema } from './bench-file/layout'
import { paragraphs, plainText } from './plain-text'

export const startImportSchema = z.strictObject({
  options: importOptionsSchema,
  /** Version of the import that stood on the screen. */
  version: z.int().min(1),
  /** Keeps the columns under this name, for files of the same kind. */
  keepAs: plainText('Name of the mapping', { min: 0, max: 80 }).default(''),
})

export const keepImportOptionsSchema = z.strictObject({
  options: importOptionsSchema,
  version: z.int().min(1),
  /** A mapping to read the columns by; empty for none. */
  mapping: plainText('Mapping', { min: 0, max: 80 }).default(''),
})

export const decideImportRowsSchema = z.strictObject({
  rowIds: z.array(z.int().min(1)).min(1, { error: 'Choose at least one row.' }).max(500),
  choice: z.enum(['kept-stored', 'took-file']),
  reason: paragraphs('Reason', { min: 3, max: 1000 }),
})

export type StartImportInput = z.output<typeof startImportSchema>
export type KeepImportOptionsInput = z.output<typeof keepImportOptionsSchema>
export type DecideImportRowsInput = z.output<typeof decideImportRowsSchema>

/** The number in an address; 0, which no import has, for anything else. */
export const importIdOf = (text: string | undefined): number =>
  text !== undefined && /^[1-9]\d{0,8}$/.test(text) ? Number(text) : 0
