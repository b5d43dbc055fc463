import { changing, parsedOrThrow } from '@/app/api/_route'
import { answerSignalSchema, signalIdSchema } from '@/lib/input/signal-answer'
import { answerSignal } from '@/lib/services/answer-signal'

export const POST = changing(answerSignalSchema, (actor, input, { id }) =>
  answerSignal(actor, parsedOrThrow(signalIdSchema, id), input),
)
