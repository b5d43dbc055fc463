import { database } from '@/lib/data/database'
import { dropGuards, onRawConnection } from './raw-connection'

/** All derived rows, without the ids that the engine hands out, in an order of their own. */
export async function derivedRows() {
  const { read } = database()
  const results = await read.specimenResult.findMany({ orderBy: { evaluationId: 'asc' } })
  const summaries = await read.lotSummary.findMany({
    orderBy: [{ lotId: 'asc' }, { characteristic: 'asc' }],
    omit: { id: true },
  })
  const signals = await read.signal.findMany({
    orderBy: [{ limitSetId: 'asc' }, { lotId: 'asc' }, { rule: 'asc' }, { side: 'asc' }],
    omit: { id: true, version: true },
  })
  return { results, summaries, signals }
}

/**
 * Takes every derived row away. Results and signals are guarded: only someone with the file itself can do that. An
 * answer, and that a signal no longer holds, are records of what happened, not derived.
 */
export async function deleteDerivedRows(): Promise<void> {
  await dropGuards('SpecimenResult')
  await dropGuards('Signal')
  await onRawConnection(async (run) => {
    await run('delete from "SpecimenResult"')
    await run('delete from "LotSummary"')
    await run(`delete from "Signal" where "state" = 'open'`)
  })
}
