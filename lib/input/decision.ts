import { z } from 'zod'
import { dispositionVerbs } from '@/lib/domain/record/lot-state'
import { paragraphs } from './plain-text'

export const decideLotSchema = z.strictObject({
  verb: z.enum(dispositionVerbs, { error: 'Choose what to do with the lot.' }),
  reason: paragraphs('Why', { min: 3 }),
  /** Version of the lot that was on the screen: a decision is about what was seen. */
  lotVersion: z.int().min(1),
})

export type DecideLotInput = z.output<typeof decideLotSchema>
