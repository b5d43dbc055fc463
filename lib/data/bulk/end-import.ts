import type { BulkConnection } from './bulk-connection'
import { appendBulkLedger, bulkLedgerHead } from './bulk-ledger'

export interface EndOfImport {
  readonly state: 'done' | 'cancelled' | 'failed'
  /** Why it failed; empty otherwise. */
  readonly message?: string
  /** Epoch milliseconds. */
  readonly at: number
  readonly personId: number
}

/** Marks an import as ended, with its ledger entry, in a transaction of its own. */
export async function endImport(
  to: BulkConnection,
  id: number,
  { at, message, personId, state }: EndOfImport,
): Promise<void> {
  await to.begin()
  try {
    const head = await bulkLedgerHead(to, true)
    await to.run(
      'UPDATE "Import" SET "state" = ?, "message" = ?, "endedAt" = ?, "version" = "version" + 1 WHERE "id" = ?',
      state,
      message ?? '',
      to.instant(at),
      id,
    )
    await appendBulkLedger(to, head, {
      at,
      personId,
      verb: `import-${state}`,
      subject: `import ${id}`,
      body: message === undefined ? {} : { message },
    })
    await to.commit()
  } catch (error) {
    await to.rollback()
    throw error
  }
}
