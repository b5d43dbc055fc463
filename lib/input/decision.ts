import { z } from 'zod'
import { dispositionVerbs } from '@/lib/domain/quality/propose-disposition'
import { paragraphs, plainText } from './plain-text'

export const decideLotSchema = z.strictObject({
  verb: z.enum(dispositionVerbs, { error: 'Choose what to do with the lot.' }),
  reason: paragraphs('Why', { min: 3 }),
  /** Version of the lot that was on the screen: a decision is about what was seen. */
  lotVersion: z.int().min(1),
  /** Answers to what stops the proposal, by the stop's id. */
  answers: z
    .array(
      z.strictObject({ stopId: plainText('Stop', { max: 80 }), answer: paragraphs('Answer', { min: 3 }) }),
    )
    .max(200)
    .default([]),
})

export type DecideLotInput = z.output<typeof decideLotSchema>
