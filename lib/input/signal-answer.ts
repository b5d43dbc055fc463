import { z } from 'zod'
import { paragraphs, plainText } from './plain-text'

export const answerSignalSchema = z.strictObject({
  /** What was found: "die 7 worn". */
  cause: plainText('Cause', { min: 3, max: 200 }),
  /** What was done about it. */
  answer: paragraphs('Answer', { min: 3 }),
  version: z.int().min(1),
})

export type AnswerSignalInput = z.output<typeof answerSignalSchema>

/** A signal as it stands in an address. */
export const signalIdSchema = z.coerce
  .number({ error: 'A signal is named by its number.' })
  .int({ error: 'A signal is named by its number.' })
  .min(1, { error: 'A signal is named by its number.' })
  .max(2_147_483_647, { error: 'There is no such signal.' })
