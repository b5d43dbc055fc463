import type { Tx } from './database'

/** An entry of the ledger as it is shown. */
export interface LedgerRow {
  readonly sequence: number
  readonly at: number
  readonly personId: number | undefined
  readonly verb: string
  readonly subject: string
  /** Canonical JSON. */
  readonly body: string
}

/** What was done to one subject, oldest first. */
export const listLedgerOf = async (tx: Tx, subject: string): Promise<readonly LedgerRow[]> =>
  (
    await tx.ledgerEntry.findMany({
      where: { subject },
      orderBy: { sequence: 'asc' },
      select: { sequence: true, at: true, personId: true, verb: true, subject: true, body: true },
    })
  ).map(({ at, personId, ...row }) => ({ ...row, at: at.getTime(), personId: personId ?? undefined }))

/**
 * The batches of imports that were stored at any of these instants: what a batch writes carries the batch's own
 * instant, which is how a lot or a reading is found again in the ledger.
 */
export const listImportBatches = async (tx: Tx, instants: readonly number[]): Promise<readonly LedgerRow[]> =>
  (
    await tx.ledgerEntry.findMany({
      where: { at: { in: instants.map((at) => new Date(at)) }, verb: 'import-rows' },
      orderBy: { sequence: 'asc' },
      select: { sequence: true, at: true, personId: true, verb: true, subject: true, body: true },
    })
  ).map(({ at, personId, ...row }) => ({ ...row, at: at.getTime(), personId: personId ?? undefined }))
