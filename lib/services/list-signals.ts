import type { Actor } from '@/lib/access/actor'
import { permit } from '@/lib/access/permit'
import { database } from '@/lib/data/database'
import { listOpenSignals } from '@/lib/data/signals'
import { getWorks } from './get-works'
import { type SignalView, signalViews } from './signal-views'

/**
 * Unanswered signals of all products, oldest first.
 * @throws LedgerlineError not-permitted; not-ready while the works is not set up
 */
export async function listSignals(actor: Actor | undefined): Promise<readonly SignalView[]> {
  permit(actor, 'drift.read')
  const { read } = database()
  return signalViews(read, await listOpenSignals(read), await getWorks(actor))
}
