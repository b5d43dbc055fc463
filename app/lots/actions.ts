'use server'

import { submitted } from '@/app/_submit'
import type { FormState } from '@/app/_ui/forms/form-state'
import { decideLotSchema } from '@/lib/input/decision'
import { parseInput } from '@/lib/input/parse-input'
import { decideLot } from '@/lib/services/decide-lot'

const ANSWER = 'answer:'

export async function decideLotAction(lotCode: string, _: FormState, form: FormData): Promise<FormState> {
  return submitted(form, {
    parse: (fields) =>
      parseInput(decideLotSchema, {
        verb: fields.verb,
        reason: fields.reason ?? '',
        lotVersion: Number(fields.lotVersion),
        answers: Object.entries(fields).flatMap(([name, answer]) =>
          name.startsWith(ANSWER) && answer.trim() !== ''
            ? [{ stopId: name.slice(ANSWER.length), answer }]
            : [],
        ),
      }),
    serve: (actor, input) => decideLot(actor, lotCode, input),
    goTo: () => `/lots/${encodeURIComponent(lotCode)}/release`,
  })
}
