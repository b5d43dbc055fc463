import type { Actor } from '@/lib/access/actor'
import { permit } from '@/lib/access/permit'
import { database } from '@/lib/data/database'
import { type DieRow, type DieValues, dies } from '@/lib/data/dies'
import type { DieInput } from '@/lib/input/equipment'
import { createEquipment, type Kind, missing, setEquipmentActive, updateEquipment } from './keep-equipment'

const kind: Kind<DieRow, DieValues> = { word: 'die', store: dies }

/** Adds a die. @throws LedgerlineError not-permitted; conflict when the code is taken */
export const createDie = (
  actor: Actor | undefined,
  code: string,
  input: DieInput,
  at: number = Date.now(),
): Promise<DieRow> => createEquipment(kind, actor, code, input, at)

/** Results already computed keep what they rest on. @throws LedgerlineError not-permitted, not-found, conflict */
export const updateDie = (
  actor: Actor | undefined,
  code: string,
  version: number,
  input: DieInput,
  at: number = Date.now(),
): Promise<void> => updateEquipment(kind, actor, code, version, input, at)

/** Puts it away, or back into use. @throws LedgerlineError not-permitted, not-found, conflict */
export const setDieActive = (
  actor: Actor | undefined,
  code: string,
  version: number,
  active: boolean,
  at: number = Date.now(),
): Promise<void> => setEquipmentActive(kind, actor, code, version, active, at)

/** @throws LedgerlineError not-permitted, not-found */
export async function requireDie(actor: Actor | undefined, code: string): Promise<DieRow> {
  permit(actor, 'equipment.read')
  const row = await dies.get(database().read, code)
  if (!row) throw missing('die', code)
  return row
}
