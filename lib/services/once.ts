import type { Tx } from '@/lib/data/database'
import { sha256 } from '@/lib/data/hash'
import { findRequest, insertRequest } from '@/lib/data/requests'
import { problem } from '@/lib/domain/errors'
import { canonicalJson } from '@/lib/domain/record/canonical-json'

interface Asked {
  readonly requestId: string
  readonly personId: number
  /** Everything that was asked for: the same id with other content is another request. */
  readonly input: unknown
  readonly at: number
}

/**
 * Does a deed once: the same request sent again gets the reply that is stored, and nothing happens a second
 * time. Call it after the lot's row is locked, and append the ledger entry after it: the stored reply is part
 * of the same transaction. The request is looked up first; a broken unique constraint would end the
 * transaction.
 * @throws LedgerlineError conflict when the id was used for something else or by someone else
 */
export async function once<Reply extends object>(
  tx: Tx,
  { requestId, personId, input, at }: Asked,
  deed: () => Promise<Reply>,
): Promise<{ readonly reply: Reply; readonly repeated: boolean }> {
  const bodyHash = sha256(canonicalJson(input))
  const before = await findRequest(tx, requestId)
  if (before) {
    if (before.personId !== personId || before.bodyHash !== bodyHash)
      throw problem('conflict', 'This request id was used before, for other content or by someone else.', {
        where: 'requestId',
        mend: 'Nothing was changed. Load the page again to see what is stored, then enter what is missing.',
      })
    return { reply: JSON.parse(before.response) as Reply, repeated: true }
  }
  const reply = await deed()
  await insertRequest(tx, {
    clientId: requestId,
    personId,
    bodyHash,
    status: 200,
    response: JSON.stringify(reply),
    at,
  })
  return { reply, repeated: false }
}
