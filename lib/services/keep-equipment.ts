/**
 * What creating, changing and putting away have in common for every kind of equipment: right, free code,
 * version, ledger entry. Readings keep naming equipment that is no longer in use.
 */
import type { Actor } from '@/lib/access/actor'
import { permit } from '@/lib/access/permit'
import { database } from '@/lib/data/database'
import type { EquipmentBase, EquipmentStore } from '@/lib/data/equipment-store'
import { appendLedger } from '@/lib/data/ledger'
import { problem } from '@/lib/domain/errors'
import { changedMeanwhile } from './changed-meanwhile'

/** How the ledger and sentences call a kind of equipment. */
export type EquipmentWord = 'gauge' | 'weight' | 'rig' | 'machine' | 'die'

export interface Kind<Row extends EquipmentBase, Values> {
  readonly word: EquipmentWord
  readonly store: EquipmentStore<Row, Values>
}

type Plain = Readonly<Record<string, unknown>>

/** @throws LedgerlineError not-permitted; conflict when the code is taken */
export async function createEquipment<Row extends EquipmentBase, Values extends object>(
  { word, store }: Kind<Row, Values>,
  actor: Actor | undefined,
  code: string,
  values: Values,
  at: number,
): Promise<Row> {
  permit(actor, 'equipment.keep')
  return database().write(async (tx) => {
    if (await store.get(tx, code)) {
      throw problem('conflict', `The code ${code} is taken by another ${word}.`, {
        where: 'code',
        mend: 'Choose another one.',
      })
    }
    const row = await store.insert(tx, code, values, at)
    await appendLedger(tx, {
      at,
      personId: actor.personId,
      verb: 'create',
      subject: `${word} ${code}`,
      body: { ...(values as Plain) },
    })
    return row
  })
}

/** @throws LedgerlineError not-permitted, not-found, conflict when someone changed it in the meantime */
export async function updateEquipment<Row extends EquipmentBase, Values extends object>(
  { word, store }: Kind<Row, Values>,
  actor: Actor | undefined,
  code: string,
  version: number,
  values: Values,
  at: number,
): Promise<void> {
  permit(actor, 'equipment.keep')
  await database().write(async (tx) => {
    if (!(await store.get(tx, code))) throw missing(word, code)
    if (!(await store.update(tx, code, version, values))) throw changedMeanwhile(code)
    await appendLedger(tx, {
      at,
      personId: actor.personId,
      verb: 'change',
      subject: `${word} ${code}`,
      body: { ...(values as Plain) },
    })
  })
}

/** @throws LedgerlineError not-permitted, not-found, conflict when someone changed it in the meantime */
export async function setEquipmentActive<Row extends EquipmentBase, Values>(
  { word, store }: Kind<Row, Values>,
  actor: Actor | undefined,
  code: string,
  version: number,
  active: boolean,
  at: number,
): Promise<void> {
  permit(actor, 'equipment.keep')
  await database().write(async (tx) => {
    if (!(await store.get(tx, code))) throw missing(word, code)
    if (!(await store.setActive(tx, code, version, active))) throw changedMeanwhile(code)
    await appendLedger(tx, {
      at,
      personId: actor.personId,
      verb: active ? 'activate' : 'deactivate',
      subject: `${word} ${code}`,
      body: {},
    })
  })
}

export const missing = (word: EquipmentWord, code: string) =>
  problem('not-found', `There is no ${word} ${code}.`)
