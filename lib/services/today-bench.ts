import { listBodies, listDecidedInState, listToMeasure } from '@/lib/data/today-lots'
import { heldItems, stakeOf } from './today-held'
import {
  type AskedToday,
  agoOf,
  counted,
  type FoundToday,
  SHOWN,
  totalOf,
  type WaitingItem,
} from './today-item'

/** Held lots that are looked at to find what they wait for; the rest is counted. */
const LOOKED_AT = 200

/** What the bench has before it: lots to finish, to begin and to measure anew, and what became of one’s own. */
export async function benchOfToday({ at, personId, tx }: AskedToday): Promise<FoundToday> {
  const begun = await listToMeasure(tx, true, SHOWN)
  const untouched = await listToMeasure(tx, false, SHOWN)
  const rework = await listDecidedInState(tx, 'rework', SHOWN)
  const held = await listDecidedInState(tx, 'held', LOOKED_AT, personId)
  const bodies = await listBodies(
    tx,
    [...begun.lots, ...untouched.lots].map((lot) => lot.specificationRevisionId),
  )
  const toMeasure = [...begun.lots, ...untouched.lots].map((lot): WaitingItem => {
    const planned = bodies.get(lot.specificationRevisionId)?.plan.specimens
    const half = lot.specimens > 0
    return {
      kind: half ? 'lot-half-measured' : 'lot-to-measure',
      key: `lot ${lot.code}`,
      since: lot.at,
      mark: 'waiting',
      title: half ? `Finish measuring ${lot.code}` : `Measure ${lot.code}`,
      text: half
        ? `${counted(lot.specimens, 'specimen', 'specimens')}${planned === undefined ? '' : ` of ${planned}`} begun or stored. Until all are complete nobody can judge it.`
        : `Nothing is measured yet${planned === undefined ? '' : `; its plan asks for ${planned} specimens`}.`,
      stake: stakeOf(lot),
      waiting: agoOf(lot.at, at),
      href: `/bench/${encodeURIComponent(lot.code)}`,
      deed: 'Measure',
    }
  })
  const anew = rework.lots.map(
    (lot): WaitingItem => ({
      kind: 'lot-rework',
      key: `lot ${lot.code}`,
      since: lot.decidedAt ?? lot.at,
      mark: 'near',
      title: `Measure ${lot.code} anew`,
      text: lot.reason === '' ? 'It was sent to rework.' : `Sent to rework because: ${lot.reason}`,
      stake: stakeOf(lot),
      waiting: agoOf(lot.decidedAt ?? lot.at, at),
      href: `/bench/${encodeURIComponent(lot.code)}`,
      deed: 'Measure',
    }),
  )
  return {
    items: [...toMeasure, ...anew, ...heldItems(held.lots, 'own-lot-held', at)],
    totals: [
      ...totalOf('lot-half-measured', begun.count, '/lots?state=measuring'),
      ...totalOf('lot-to-measure', untouched.count, '/lots?state=measuring'),
      ...totalOf('lot-rework', rework.count, '/lots?state=rework'),
      ...totalOf('own-lot-held', held.count, '/lots?state=held'),
    ],
  }
}
