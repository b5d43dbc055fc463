import { canonicalJson } from '@/lib/domain/record/canonical-json'
import type { LedgerDraft } from '@/lib/domain/record/write-plan'
import { hashOfEntry, type LedgerHead } from '../ledger'
import type { BulkConnection } from './bulk-connection'
import { bulkTables } from './bulk-tables'

/** Count and hash of the last entry; `forUpdate` inside a transaction holds it until its end. */
export async function bulkLedgerHead(from: BulkConnection, forUpdate = false): Promise<LedgerHead> {
  const lock = forUpdate && from.engine === 'postgresql' ? ' FOR UPDATE' : ''
  const [head] = await from.rows<{ readonly count: number; readonly hash: string }>(
    `SELECT "count", "hash" FROM "LedgerHead" WHERE "id" = 1${lock}`,
  )
  if (!head) throw new Error('The ledger has lost its head; nothing was stored.')
  return head
}

/** Hangs an entry on the head that this transaction holds. The last write of the transaction. */
export async function appendBulkLedger(
  to: BulkConnection,
  head: LedgerHead,
  draft: LedgerDraft,
): Promise<LedgerHead> {
  const { at, personId, subject, verb } = draft
  const entry = {
    sequence: head.count + 1,
    at,
    personId,
    verb,
    subject,
    body: canonicalJson(draft.body),
    previousHash: head.hash,
  }
  const hash = hashOfEntry(entry)
  await to.insert(bulkTables.ledgerEntry, [{ ...entry, hash }])
  await to.run('UPDATE "LedgerHead" SET "count" = ?, "hash" = ? WHERE "id" = 1', entry.sequence, hash)
  return { count: entry.sequence, hash }
}
