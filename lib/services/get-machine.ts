import type { Actor } from '@/lib/access/actor'
import { permit } from '@/lib/access/permit'
import { database } from '@/lib/data/database'
import { type MachineRow, machines } from '@/lib/data/machines'
import { listMadeLots } from '@/lib/data/made-lots'
import { missing } from './keep-equipment'
import { type MadeWith, madeWith } from './made-with'

export interface MachineView extends MadeWith {
  readonly row: MachineRow
}

/** A machine with its products and newest lots. @throws LedgerlineError not-permitted, not-found */
export async function getMachine(actor: Actor | undefined, code: string): Promise<MachineView> {
  permit(actor, 'equipment.read')
  const { read } = database()
  const row = await machines.get(read, code)
  if (!row) throw missing('machine', code)
  return { row, ...madeWith(await listMadeLots(read, { machineId: row.id })) }
}
