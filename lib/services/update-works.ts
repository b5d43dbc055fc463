import type { Actor } from '@/lib/access/actor'
import { permit } from '@/lib/access/permit'
import { database } from '@/lib/data/database'
import { appendLedger } from '@/lib/data/ledger'
import { updateWorksRow } from '@/lib/data/works'
import type { WorksInput } from '@/lib/input/works'
import { changedMeanwhile } from './changed-meanwhile'

/**
 * Changes the works: place, gravity, units, number format. Results already computed keep what they rest on.
 * @throws LedgerlineError not-permitted; conflict when someone changed it in the meantime
 */
export async function updateWorks(
  actor: Actor | undefined,
  { version, ...values }: WorksInput,
  at: number = Date.now(),
): Promise<void> {
  permit(actor, 'settings.keep')
  await database().write(async (tx) => {
    if (!(await updateWorksRow(tx, version, values))) throw changedMeanwhile('The works')
    await appendLedger(tx, {
      at,
      personId: actor.personId,
      verb: 'change',
      subject: 'works',
      body: { ...values },
    })
  })
}
