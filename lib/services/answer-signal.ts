import type { Actor } from '@/lib/access/actor'
import { permit } from '@/lib/access/permit'
import { database } from '@/lib/data/database'
import { appendLedger } from '@/lib/data/ledger'
import { lockRow } from '@/lib/data/locks'
import { listPersonNames } from '@/lib/data/people-names'
import { answerSignalRow, findSignal } from '@/lib/data/signals'
import { problem } from '@/lib/domain/errors'
import type { AnswerSignalInput } from '@/lib/input/signal-answer'
import { changedMeanwhile } from './changed-meanwhile'

export interface AnsweredSignal {
  readonly id: number
  readonly lotCode: string
  readonly productCode: string
  readonly answeredAt: number
}

/**
 * Answers a signal: what caused it and what was done. An answer is given once and stays.
 * @throws LedgerlineError not-permitted, not-found, already-decided (someone answered it meanwhile), conflict
 *   (its pattern changed since it was looked at)
 */
export async function answerSignal(
  actor: Actor | undefined,
  id: number,
  input: AnswerSignalInput,
  at: number = Date.now(),
): Promise<AnsweredSignal> {
  permit(actor, 'signals.answer')
  return database().write(async (tx) => {
    const found = await findSignal(tx, id)
    if (!found) throw problem('not-found', 'There is no such signal.')
    await lockRow(tx, 'Product', found.productId)
    const signal = await findSignal(tx, id)
    if (!signal) throw problem('not-found', 'There is no such signal.')
    if (signal.answeredAt !== undefined) {
      const name = (await listPersonNames(tx, [signal.answeredById ?? 0])).get(signal.answeredById ?? 0)
      throw problem(
        'already-decided',
        `This signal was answered${name ? ` by ${name}` : ''}: ${signal.cause}.`,
        {
          mend: 'Load the page again to read the answer.',
        },
      )
    }
    if (signal.state !== 'open')
      throw problem('conflict', 'This signal no longer holds, so it needs no answer.', {
        mend: 'Load the page again.',
      })
    if (
      !(await answerSignalRow(tx, { id, version: input.version }, { ...input, at, personId: actor.personId }))
    )
      throw changedMeanwhile('This signal')
    await appendLedger(tx, {
      at,
      personId: actor.personId,
      verb: 'answer-signal',
      subject: `lot ${signal.lotCode}`,
      body: {
        signal: id,
        characteristic: signal.characteristic,
        statistic: signal.statistic,
        rule: signal.rule,
        side: signal.side,
        cause: input.cause,
        answer: input.answer,
      },
    })
    return { id, lotCode: signal.lotCode, productCode: signal.productCode, answeredAt: at }
  })
}
