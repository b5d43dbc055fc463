'use server'

import { submitted, valuesOf } from '@/app/_submit'
import type { FormState } from '@/app/_ui/forms/form-state'
import { decideImportRowsSchema, keepImportOptionsSchema, startImportSchema } from '@/lib/input/import'
import { parseInput } from '@/lib/input/parse-input'
import { cancelImport } from '@/lib/services/cancel-import'
import { decideImportRows } from '@/lib/services/decide-import-rows'
import { keepImportOptions } from '@/lib/services/keep-import-options'
import { startImport } from '@/lib/services/start-import'

/** Columns of the form: `column:HEADER` holds what the header is read as. */
const COLUMN = 'column:'

const optionsOf = (fields: Readonly<Record<string, string>>) => ({
  delimiter: fields.delimiter === 'tab' ? '\t' : fields.delimiter,
  decimal: fields.decimal,
  columns: Object.fromEntries(
    Object.entries(fields).flatMap(([name, value]) =>
      name.startsWith(COLUMN) ? [[name.slice(COLUMN.length), value]] : [],
    ),
  ),
})

/** Two buttons: look at the preview again, or begin. */
export async function importOptionsAction(id: number, _: FormState, form: FormData): Promise<FormState> {
  if (form.get('then') === 'start')
    return submitted(form, {
      parse: (fields) =>
        parseInput(startImportSchema, {
          options: optionsOf(fields),
          version: Number(fields.version),
          keepAs: fields.keepAs ?? '',
        }),
      serve: (actor, input) => startImport(actor, id, input),
      goTo: () => `/lots/import/${id}`,
    })
  return submitted(form, {
    parse: (fields) =>
      parseInput(keepImportOptionsSchema, {
        options: optionsOf(fields),
        version: Number(fields.version),
        mapping: fields.mapping ?? '',
      }),
    serve: (actor, input) => keepImportOptions(actor, id, input),
    goTo: () => `/lots/import/${id}`,
  })
}

export async function cancelImportAction(id: number, _: FormState, form: FormData): Promise<FormState> {
  return submitted(form, {
    parse: () => ({ ok: true, value: undefined }),
    serve: (actor) => cancelImport(actor, id),
    done: () => 'It ends after the rows that are being stored now. What is in stays in.',
  })
}

export async function decideRowsAction(id: number, _: FormState, form: FormData): Promise<FormState> {
  return submitted(form, {
    parse: (fields) =>
      parseInput(decideImportRowsSchema, {
        rowIds: valuesOf(form, 'row').map(Number),
        choice: fields.choice,
        reason: fields.reason ?? '',
      }),
    serve: (actor, input) => decideImportRows(actor, id, input),
    done: ({ corrected, rows }) =>
      `${rows} ${rows === 1 ? 'row is' : 'rows are'} answered${corrected === 0 ? ', the stored values stay' : `, ${corrected} ${corrected === 1 ? 'reading was' : 'readings were'} corrected`}.`,
  })
}
