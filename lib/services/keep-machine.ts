import type { Actor } from '@/lib/access/actor'
import { permit } from '@/lib/access/permit'
import { database } from '@/lib/data/database'
import { type MachineRow, type MachineValues, machines } from '@/lib/data/machines'
import type { MachineInput } from '@/lib/input/equipment'
import { createEquipment, type Kind, missing, setEquipmentActive, updateEquipment } from './keep-equipment'

const kind: Kind<MachineRow, MachineValues> = { word: 'machine', store: machines }

/** Adds a machine. @throws LedgerlineError not-permitted; conflict when the code is taken */
export const createMachine = (
  actor: Actor | undefined,
  code: string,
  input: MachineInput,
  at: number = Date.now(),
): Promise<MachineRow> => createEquipment(kind, actor, code, input, at)

/** Results already computed keep what they rest on. @throws LedgerlineError not-permitted, not-found, conflict */
export const updateMachine = (
  actor: Actor | undefined,
  code: string,
  version: number,
  input: MachineInput,
  at: number = Date.now(),
): Promise<void> => updateEquipment(kind, actor, code, version, input, at)

/** Puts it away, or back into use. @throws LedgerlineError not-permitted, not-found, conflict */
export const setMachineActive = (
  actor: Actor | undefined,
  code: string,
  version: number,
  active: boolean,
  at: number = Date.now(),
): Promise<void> => setEquipmentActive(kind, actor, code, version, active, at)

/** @throws LedgerlineError not-permitted, not-found */
export async function requireMachine(actor: Actor | undefined, code: string): Promise<MachineRow> {
  permit(actor, 'equipment.read')
  const row = await machines.get(database().read, code)
  if (!row) throw missing('machine', code)
  return row
}
