'use server'

import { submitted } from '@/app/_submit'
import type { FormState } from '@/app/_ui/forms/form-state'
import { parseBaselineForm } from '@/lib/input/baseline-form'
import { parseInput } from '@/lib/input/parse-input'
import { answerSignalSchema } from '@/lib/input/signal-answer'
import { answerSignal } from '@/lib/services/answer-signal'
import { freezeLimits } from '@/lib/services/freeze-limits'

export async function answerSignalAction(id: number, _: FormState, form: FormData): Promise<FormState> {
  return submitted(form, {
    parse: (fields) =>
      parseInput(answerSignalSchema, {
        cause: fields.cause ?? '',
        answer: fields.answer ?? '',
        version: Number(fields.version),
      }),
    serve: (actor, input) => answerSignal(actor, id, input),
    done: (reply) => `Answered for ${reply.lotCode}. The slur turns slate.`,
  })
}

export async function freezeLimitsAction(_: FormState, form: FormData): Promise<FormState> {
  return submitted(form, {
    parse: parseBaselineForm,
    serve: (actor, input) => freezeLimits(actor, input),
    goTo: (reply) => `/drift?product=${encodeURIComponent(reply.productCode)}`,
  })
}
