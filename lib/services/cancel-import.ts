import type { Actor } from '@/lib/access/actor'
import { permit } from '@/lib/access/permit'
import { database } from '@/lib/data/database'
import { changeImport, findImport } from '@/lib/data/imports'
import { appendLedger } from '@/lib/data/ledger'
import { problem } from '@/lib/domain/errors'
import { nudgeImportWorker } from './import/worker-link'

/**
 * Ends an import: one under way after its running batch, one that waits at once. What is in stays in.
 * @throws LedgerlineError not-permitted, not-found; conflict when it has ended already
 */
export async function cancelImport(
  actor: Actor | undefined,
  id: number,
  at: number = Date.now(),
): Promise<void> {
  permit(actor, 'imports.run')
  await database().write(async (tx) => {
    if (!(await findImport(tx, id))) throw problem('not-found', `There is no import ${id}.`)
    const waiting = await changeImport(
      tx,
      { id, states: ['draft', 'queued'] },
      { state: 'cancelled', endedAt: new Date(at) },
    )
    if (!waiting && !(await changeImport(tx, { id, states: ['running'] }, { cancelAsked: true })))
      throw problem('conflict', 'This import has ended already.', { mend: 'Load the page again.' })
    await appendLedger(tx, {
      at,
      personId: actor.personId,
      verb: 'cancel-import',
      subject: `import ${id}`,
      body: {},
    })
  })
  nudgeImportWorker()
}
