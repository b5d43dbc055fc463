import type { Actor } from '@/lib/access/actor'
import { permit } from '@/lib/access/permit'
import { database } from '@/lib/data/database'
import { appendLedger } from '@/lib/data/ledger'
import { lockLot } from '@/lib/data/locks'
import {
  deleteLotMaterials,
  insertLotMaterials,
  type LotMaterialRow,
  listLotMaterials,
} from '@/lib/data/lot-materials'
import { findLotId, getLotRow, updateLotState } from '@/lib/data/lots'
import { problem } from '@/lib/domain/errors'
import { isFinal } from '@/lib/domain/record/lot-state'
import type { ChangeLotMaterialsInput } from '@/lib/input/lot'
import { changedMeanwhile } from './changed-meanwhile'
import { lotMaterialLinks } from './lot-material-links'

/**
 * Says anew what a lot is made of, with a reason; the ledger keeps what was said before.
 * @throws LedgerlineError not-permitted (a decided lot needs the right to correct what others entered), not-found,
 *   conflict when someone changed the lot in the meantime, bad-input as for opening a lot
 */
export async function changeLotMaterials(
  actor: Actor | undefined,
  lotCode: string,
  input: ChangeLotMaterialsInput,
  at: number = Date.now(),
): Promise<void> {
  permit(actor, 'lots.open')
  await database().write(async (tx) => {
    const id = await findLotId(tx, lotCode)
    if (id === undefined) throw problem('not-found', `There is no lot ${lotCode}.`)
    await lockLot(tx, id)
    const lot = await getLotRow(tx, id)
    if (isFinal(lot.state)) permit(actor, 'readings.supersede-any')
    const before = (await listLotMaterials(tx, [id])).get(id) ?? []
    const links = await lotMaterialLinks(tx, input.materials, {
      lengthMetres: lot.lengthMetres,
      named: new Set(before.map(({ code }) => code)),
    })
    const kept = { state: lot.state, evidenceChanged: lot.evidenceChanged }
    if (!(await updateLotState(tx, { id, version: input.lotVersion }, kept))) throw changedMeanwhile(lotCode)
    await deleteLotMaterials(tx, id)
    await insertLotMaterials(tx, id, links)
    await appendLedger(tx, {
      at,
      personId: actor.personId,
      verb: 'change-materials',
      subject: `lot ${lotCode}`,
      body: { reason: input.reason, before: before.map(saidOf), after: input.materials },
    })
  })
}

const saidOf = ({ role, code, fromMetre, toMetre }: LotMaterialRow) => ({ role, code, fromMetre, toMetre })
