import type { Actor } from '@/lib/access/actor'
import { permit } from '@/lib/access/permit'
import { database } from '@/lib/data/database'
import { type WeightRow, type WeightValues, weights } from '@/lib/data/weights'
import type { WeightInput } from '@/lib/input/equipment'
import { createEquipment, type Kind, missing, setEquipmentActive, updateEquipment } from './keep-equipment'

const kind: Kind<WeightRow, WeightValues> = { word: 'weight', store: weights }

/** Adds what hangs: a weight, a hanger, a hook. @throws LedgerlineError not-permitted; conflict when the code is taken */
export const createWeight = (
  actor: Actor | undefined,
  code: string,
  input: WeightInput,
  at: number = Date.now(),
): Promise<WeightRow> => createEquipment(kind, actor, code, input, at)

/** Results already computed keep what they rest on. @throws LedgerlineError not-permitted, not-found, conflict */
export const updateWeight = (
  actor: Actor | undefined,
  code: string,
  version: number,
  input: WeightInput,
  at: number = Date.now(),
): Promise<void> => updateEquipment(kind, actor, code, version, input, at)

/** Puts it away, or back into use. @throws LedgerlineError not-permitted, not-found, conflict */
export const setWeightActive = (
  actor: Actor | undefined,
  code: string,
  version: number,
  active: boolean,
  at: number = Date.now(),
): Promise<void> => setEquipmentActive(kind, actor, code, version, active, at)

/** @throws LedgerlineError not-permitted, not-found */
export async function requireWeight(actor: Actor | undefined, code: string): Promise<WeightRow> {
  permit(actor, 'equipment.read')
  const row = await weights.get(database().read, code)
  if (!row) throw missing('weight', code)
  return row
}
