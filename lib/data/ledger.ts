/**
 * The ledger: an append-only chain of who did what. Each entry carries the hash of the one before; the head
 * (count and hash of the last) is kept apart, and goes as an *anchor* into whatever leaves the database, so that
 * a chain cut short or written anew is found. Someone who holds the database and every anchor can still forge.
 */
import { problem } from '@/lib/domain/errors'
import { canonicalJson } from '@/lib/domain/record/canonical-json'
import type { Tx } from './database'
import { engineOf } from './guarded-client'
import { sha256 } from './hash'
import { sharedState } from './shared-state'

export interface LedgerDraft {
  /** Epoch milliseconds. */
  readonly at: number
  readonly personId: number | null
  readonly verb: string
  /** What it was done to: `lot LA-0012`. */
  readonly subject: string
  /** Plain data, or canonical JSON of it. */
  readonly body: string | Readonly<Record<string, unknown>>
}

/** A state of the ledger: how many entries, and the hash of the last. */
export interface LedgerHead {
  readonly count: number
  readonly hash: string
}

/** The hash that the first entry names as the one before it. */
export const beginningOfLedger = '0'.repeat(64)

export interface ChainedEntry {
  readonly sequence: number
  /** Epoch milliseconds. */
  readonly at: number
  readonly personId: number | null
  readonly verb: string
  readonly subject: string
  /** Canonical JSON. */
  readonly body: string
  readonly previousHash: string
}

/** SHA-256 over the canonical JSON of everything an entry says. */
export const hashOfEntry = ({
  sequence,
  at,
  personId,
  verb,
  subject,
  body,
  previousHash,
}: ChainedEntry): string =>
  sha256(canonicalJson({ sequence, at, personId, verb, subject, body, previousHash }))

const textOf = (body: LedgerDraft['body']): string => {
  if (typeof body !== 'string') return canonicalJson(body)
  if (canonicalJson(JSON.parse(body)) === body) return body
  throw new TypeError(`The body of a ledger entry is not canonical JSON: ${body.slice(0, 80)}`)
}

/** Count and hash of the last entry, as this transaction or reader sees it. */
export const ledgerHead = async (tx: Tx): Promise<LedgerHead> => {
  const head = await tx.ledgerHead.findUnique({ where: { id: 1 }, select: { count: true, hash: true } })
  if (head === null) throw problem('storage', 'The ledger has lost its head; nothing was stored.')
  return head
}

/** The head, locked until the transaction ends: two transactions can't both hang an entry on it. */
const lockLedgerHead = async (tx: Tx): Promise<LedgerHead> => {
  if (engineOf(tx) === 'postgresql')
    await tx.$queryRawUnsafe('select id from "LedgerHead" where id = 1 for update')
  return ledgerHead(tx)
}

/**
 * Writes an entry and moves the head to it. The last write of a transaction: others wait for the head until the
 * commit, and `database().write` refuses any later write but another entry.
 * @returns the new head
 * @throws TypeError when the body has no canonical JSON
 */
export const appendLedger = async (tx: Tx, draft: LedgerDraft): Promise<LedgerHead> => {
  const body = textOf(draft.body)
  const state = sharedState().inside.getStore()
  if (state) state.sealed = false
  const { count, hash: previousHash } = await lockLedgerHead(tx)
  const { at, personId, verb, subject } = draft
  const entry = { sequence: count + 1, at, personId, verb, subject, body, previousHash }
  const hash = hashOfEntry(entry)
  await tx.ledgerEntry.create({ data: { ...entry, at: new Date(at), hash } })
  await tx.ledgerHead.update({ where: { id: 1 }, data: { count: entry.sequence, hash } })
  if (state) state.sealed = true
  return { count: entry.sequence, hash }
}
