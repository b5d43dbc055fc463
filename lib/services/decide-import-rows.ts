import { randomBytes } from 'node:crypto'
import type { Actor } from '@/lib/access/actor'
import { permit } from '@/lib/access/permit'
import { database, type Tx } from '@/lib/data/database'
import { sha256 } from '@/lib/data/hash'
import { decideSetAside, findImport, findSetAside, type ImportRowFacts } from '@/lib/data/imports'
import { appendLedger } from '@/lib/data/ledger'
import { lockLot } from '@/lib/data/locks'
import { findLotId, getLotRow } from '@/lib/data/lots'
import { storePlan } from '@/lib/data/store-plan'
import { problem } from '@/lib/domain/errors'
import { correctionsFor } from '@/lib/domain/record/corrections-for'
import { planSpecimenWrite } from '@/lib/domain/record/plan-specimen-write'
import type { LedgerDraft } from '@/lib/domain/record/write-plan'
import type { SpecimenEntry } from '@/lib/domain/record/write-state'
import { clientIdFrom } from '@/lib/input/client-id'
import type { DecideImportRowsInput } from '@/lib/input/import'
import { refusal } from './refusal'
import { loadWriteState } from './write-state'

export interface DecidedImportRows {
  readonly rows: number
  /** Readings that took the place of stored ones. */
  readonly corrected: number
}

/**
 * Answers rows that differ from what is stored, with a reason: the stored value stays, or the file's takes its place
 * as a correction, which stays traceable like any other.
 * @throws LedgerlineError not-permitted, not-found; conflict when a row was answered meanwhile
 */
export async function decideImportRows(
  actor: Actor | undefined,
  importId: number,
  { choice, reason, rowIds }: DecideImportRowsInput,
  at: number = Date.now(),
): Promise<DecidedImportRows> {
  permit(actor, 'readings.supersede-any')
  const { read } = database()
  if (!(await findImport(read, importId))) throw problem('not-found', `There is no import ${importId}.`)
  const rows = (await findSetAside(read, importId, rowIds)).filter((row) => row.kind === 'differs')
  if (rows.length < new Set(rowIds).size)
    throw problem('not-found', 'Not all of these rows differ in this import.', {
      mend: 'Load the page again and choose the rows anew.',
    })
  let corrected = 0
  // A row a transaction: what is decided stays decided if a later one fails.
  for (const row of rows)
    corrected += await database().write(async (tx) => {
      const decided = await decideSetAside(tx, [row.id], {
        state: choice,
        reason,
        at,
        personId: actor.personId,
      })
      if (decided === 0)
        throw problem('conflict', `Row ${row.row} was answered in the meantime.`, {
          mend: 'Load the page again.',
        })
      const drafts = choice === 'took-file' ? await takeFile(tx, row, actor, reason, at) : []
      for (const draft of drafts) await appendLedger(tx, draft)
      await appendLedger(tx, {
        at,
        personId: actor.personId,
        verb: `import-row-${choice}`,
        subject: `import ${importId}`,
        body: { row: row.row, lot: row.lotCode, specimen: row.specimen ?? null, reason },
      })
      return drafts.length
    })
  return { rows: rows.length, corrected }
}

async function takeFile(
  tx: Tx,
  row: ImportRowFacts,
  actor: Actor,
  reason: string,
  at: number,
): Promise<readonly LedgerDraft[]> {
  const lotId = await findLotId(tx, row.lotCode)
  if (lotId === undefined) throw problem('not-found', `There is no lot ${row.lotCode}.`)
  await lockLot(tx, lotId)
  const entry = JSON.parse(row.entry) as SpecimenEntry
  const before = await loadWriteState(tx, await getLotRow(tx, lotId))
  const stored = before.state.specimens.find((one) => one.number === entry.specimen.number)
  if (!stored) throw problem('not-found', `Specimen ${entry.specimen.number} of ${row.lotCode} is gone.`)
  const drafts: LedgerDraft[] = []
  // One after the other: each rests on what the one before left.
  for (const correction of correctionsFor(stored, entry, reason, () => clientIdFrom(at, randomBytes(16)))) {
    const { equipment, state } = await loadWriteState(tx, await getLotRow(tx, lotId))
    const planned = planSpecimenWrite(state, [correction], actor, at, sha256)
    if (!planned.ok) throw refusal(planned.problems)
    await storePlan(tx, planned.value, equipment)
    if (planned.value.ledger) drafts.push(planned.value.ledger)
  }
  return drafts
}
