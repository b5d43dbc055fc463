import type { Actor } from '@/lib/access/actor'
import { permit } from '@/lib/access/permit'
import { listDriftMachines as listRows } from '@/lib/data/charted-lots'
import { database } from '@/lib/data/database'

export interface DriftMachine {
  readonly code: string
  readonly name: string
  readonly active: boolean
  /** Lots on its chart. */
  readonly lots: number
  readonly lastMadeAt: number | undefined
  /** Unanswered: its own over products, and those of its lots on their products' charts. */
  readonly openSignals: number
}

/** Machines whose lots can be charted, with what waits on each chart. @throws LedgerlineError not-permitted */
export async function listDriftMachines(actor: Actor | undefined): Promise<readonly DriftMachine[]> {
  permit(actor, 'drift.read')
  return (await listRows(database().read)).map(({ id: _, ...machine }) => machine)
}
