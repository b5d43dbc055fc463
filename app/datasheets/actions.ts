'use server'

import { submitted } from '@/app/_submit'
import type { FormState } from '@/app/_ui/forms/form-state'
import { publishDatasheetSchema } from '@/lib/input/datasheet'
import { parseInput } from '@/lib/input/parse-input'
import { publishDatasheet } from '@/lib/services/publish-datasheet'

export async function publishDatasheetAction(_: FormState, form: FormData): Promise<FormState> {
  return submitted(form, {
    parse: (fields) => parseInput(publishDatasheetSchema, fields),
    serve: (actor, input) => publishDatasheet(actor, input),
    goTo: (reply) => `/datasheets/${reply.datasheetCode}/${reply.number}`,
  })
}
