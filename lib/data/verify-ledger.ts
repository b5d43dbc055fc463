/** Walks the ledger from its beginning and compares it with its head and with every anchor. */
import { openDatabase, type Tx } from './database'
import type { Environment } from './env'
import { beginningOfLedger, hashOfEntry, type LedgerHead } from './ledger'

/** A state of the ledger that was written down elsewhere. */
export interface Anchor extends LedgerHead {
  /** Where it was written down: `datasheet DS-0001, revision 2`. */
  readonly where: string
}

export type LedgerVerdict =
  | { readonly sound: true; readonly count: number; readonly hash: string; readonly anchors: number }
  | {
      readonly sound: false
      /** Place of the first broken link; undefined when only the head is missing. */
      readonly sequence: number | undefined
      readonly message: string
    }

const pageSize = 1_000

const broken = (sequence: number | undefined, message: string): LedgerVerdict => ({
  sound: false,
  sequence,
  message,
})

/** Anchors that datasheets carry. */
export const anchorsInDatabase = async (read: Tx): Promise<readonly Anchor[]> => {
  const revisions = await read.datasheetRevision.findMany({
    select: { number: true, ledgerCount: true, ledgerHash: true, datasheet: { select: { code: true } } },
    orderBy: { id: 'asc' },
  })
  return revisions.map(({ number, ledgerCount, ledgerHash, datasheet }) => ({
    count: ledgerCount,
    hash: ledgerHash,
    where: `datasheet ${datasheet.code}, revision ${number}`,
  }))
}

/**
 * Checks that sequence, links and hashes of the chain hold, that its end is the head, and that it passes through
 * every anchor. Names the first broken link. May run while entries are being written.
 */
export const verifyLedger = async (read: Tx, anchors: readonly Anchor[]): Promise<LedgerVerdict> => {
  const waiting = [...anchors].sort((a, b) => a.count - b.count)
  let count = 0
  let hash = beginningOfLedger
  let next = 0

  /** The first anchor that the chain contradicts at its present place. */
  const contradiction = (): Anchor | undefined => {
    for (let anchor = waiting[next]; anchor !== undefined && anchor.count <= count; anchor = waiting[next]) {
      if (anchor.count < count || anchor.hash !== hash) return anchor
      next += 1
    }
    return undefined
  }
  const refusal = ({ where }: Anchor): LedgerVerdict =>
    broken(count, `Entry ${count} is not the one that stood there when ${where} was made.`)

  const atBeginning = contradiction()
  if (atBeginning) return refusal(atBeginning)
  for (;;) {
    const page = await read.ledgerEntry.findMany({
      where: { sequence: { gt: count } },
      orderBy: { sequence: 'asc' },
      take: pageSize,
    })
    for (const { hash: stored, ...row } of page) {
      const sequence = count + 1
      if (row.sequence !== sequence) return broken(sequence, `Entry ${sequence} is missing.`)
      if (row.previousHash !== hash)
        return broken(sequence, `Entry ${sequence} does not hang on the entry before it.`)
      if (hashOfEntry({ ...row, at: row.at.getTime() }) !== stored)
        return broken(sequence, `Entry ${sequence} was changed after it was written.`)
      count = sequence
      hash = stored
      const contradicted = contradiction()
      if (contradicted) return refusal(contradicted)
    }
    if (page.length === pageSize) continue

    const head = await read.ledgerHead.findUnique({ where: { id: 1 } })
    if (head === null) return broken(undefined, 'The head of the ledger is missing.')
    // Entries that were written since the last page: go on.
    const grown = head.count > count && (await read.ledgerEntry.count({ where: { sequence: count + 1 } })) > 0
    if (grown) continue
    if (head.count > count)
      return broken(
        count + 1,
        `The last entries are missing: ${count} are there, the head says ${head.count}.`,
      )
    if (head.count < count)
      return broken(head.count + 1, `Entry ${head.count + 1} stands beyond the head of the ledger.`)
    if (head.hash !== hash) return broken(count, `The head of the ledger is not entry ${count}.`)
    const beyond = waiting[next]
    if (beyond)
      return broken(
        count + 1,
        `The ledger is shorter than it was: ${count} entries are there, ${beyond.count} when ${beyond.where} was made.`,
      )
    return { sound: true, count, hash, anchors: anchors.length }
  }
}

/** The same for a database that this process has not open, with the anchors in it added. */
export const verifyLedgerOf = async (
  environment: Pick<Environment, 'engine' | 'databaseUrl'>,
  anchors: readonly Anchor[],
): Promise<LedgerVerdict> => {
  const opened = openDatabase(environment)
  try {
    return await verifyLedger(opened.read, [...(await anchorsInDatabase(opened.read)), ...anchors])
  } finally {
    await opened.close()
  }
}
