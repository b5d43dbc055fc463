import {
  type DecidedLot,
  listBodies,
  listChangedAfterRelease,
  listHeldBefore,
  listToDecide,
  type SummarisedLot,
} from '@/lib/data/today-lots'
import type { VerdictKind } from '@/lib/domain/charts/verdict-mark'
import { type LotStanding, lotStanding } from '@/lib/domain/quality/lot-standing'
import type { WaitingKind } from '@/lib/domain/quality/what-waits'
import { shortDate } from './short-date'
import { heldItems, lotHref, stakeOf } from './today-held'
import {
  type AskedToday,
  agoOf,
  counted,
  DAY,
  type FoundToday,
  namesOf,
  SHOWN,
  totalOf,
  type WaitingItem,
} from './today-item'

/** A hold that lasts longer than this has been forgotten, or needs somebody else. */
const LONG_HELD_DAYS = 7

/** Lots to decide that are looked at one by one; the rest is counted. */
const LOOKED_AT = 200

/** What quality has to look at among lots: changed evidence, decisions, holds. Six queries. */
export async function lotsOfToday(asked: AskedToday): Promise<FoundToday> {
  const { at, tx } = asked
  const changed = await listChangedAfterRelease(tx, SHOWN)
  const held = await listHeldBefore(tx, at - LONG_HELD_DAYS * DAY, LOOKED_AT)
  const toDecide = await decisionsOfToday(asked)
  return {
    items: [
      ...changed.lots.map((lot) => changedItem(lot, asked)),
      ...heldItems(held.lots, 'lot-held', at),
      ...toDecide.items,
    ],
    totals: [
      ...totalOf('released-changed', changed.count, '/lots?state=released'),
      ...totalOf('lot-held', held.count, '/lots?state=held'),
      ...toDecide.totals,
    ],
  }
}

const changedItem = (lot: DecidedLot, { works }: AskedToday): WaitingItem => ({
  kind: 'released-changed',
  key: `lot ${lot.code}`,
  since: lot.decidedAt,
  mark: 'beyond',
  title: `${lot.code} asks for another look`,
  text: 'It was released, and a reading or limit it was decided on has changed since. Confirm the decision or take it back.',
  stake: `released, ${stakeOf(lot)}`,
  waiting: lot.decidedAt === undefined ? '' : `released ${shortDate(lot.decidedAt, works.timeZone)}`,
  href: `${lotHref(lot.code)}/release`,
  deed: 'Look again',
})

const kindOf = {
  outside: 'lot-outside',
  'open closure': 'lot-open-closure',
  doubtful: 'lot-doubtful',
} as const satisfies Record<Exclude<LotStanding['standing'], 'calm'>, WaitingKind>

const markOf: Readonly<Record<keyof typeof kindOf, VerdictKind>> = {
  outside: 'beyond',
  'open closure': 'beyond',
  doubtful: 'near',
}

const titleOf: Readonly<Record<keyof typeof kindOf, string>> = {
  outside: 'is outside its tolerance',
  'open closure': 'does not close',
  doubtful: 'waits for a decision',
}

/** Lots that stand badly each in a line of their own, calm ones together. */
async function decisionsOfToday({ at, tx }: AskedToday): Promise<FoundToday> {
  const { count, lots } = await listToDecide(tx, LOOKED_AT)
  const bodies = await listBodies(
    tx,
    lots.map((lot) => lot.specificationRevisionId),
  )
  const calm: SummarisedLot[] = []
  const items: WaitingItem[] = []
  const counts = { 'lot-outside': 0, 'lot-open-closure': 0, 'lot-doubtful': 0 }
  for (const lot of lots) {
    const body = bodies.get(lot.specificationRevisionId)
    const { reason, standing } = body
      ? lotStanding(body, lot.summaries)
      : { reason: '', standing: 'calm' as const }
    if (standing === 'calm') {
      calm.push(lot)
      continue
    }
    const kind = kindOf[standing]
    counts[kind] += 1
    if (counts[kind] > SHOWN) continue
    items.push({
      kind,
      key: `lot ${lot.code}`,
      since: lot.at,
      mark: markOf[standing],
      title: `${lot.code} ${titleOf[standing]}`,
      text: `${reason}${lot.evidenceChanged ? ' A reading it was decided on has changed.' : ''}`,
      stake: stakeOf(lot),
      waiting: agoOf(lot.at, at),
      href: `${lotHref(lot.code)}/release`,
      deed: 'Decide',
    })
  }
  const left = count - counts['lot-outside'] - counts['lot-open-closure'] - counts['lot-doubtful']
  const href = '/lots?state=to-decide'
  return {
    items: [...items, ...calmItems(calm, left, at)],
    totals: [
      ...totalOf('lot-outside', counts['lot-outside'], href),
      ...totalOf('lot-open-closure', counts['lot-open-closure'], href),
      ...totalOf('lot-doubtful', counts['lot-doubtful'], href),
      ...totalOf('lot-to-decide', left, href),
    ],
  }
}

/**
 * Lots with nothing against them, in one line: the oldest says since when.
 * @param count of all of them, also those that were not looked at one by one
 */
function calmItems(lots: readonly SummarisedLot[], count: number, at: number): readonly WaitingItem[] {
  const [oldest] = lots
  if (!oldest) return []
  const one = count === 1
  const products = [...new Set(lots.map((lot) => lot.productName))]
  const names = lots.map((lot) => lot.code)
  return [
    {
      kind: 'lot-to-decide',
      key: 'lots to decide',
      since: oldest.at,
      mark: 'waiting',
      title: one ? `${oldest.code} waits for a decision` : `${namesOf(names, 3, count)} wait for a decision`,
      text: one
        ? 'Inside tolerance by its plan, and the two routes agree.'
        : 'Inside tolerance by their plans, and the two routes agree; each is asked for its signals before release.',
      stake: `${counted(count, 'lot', 'lots')} of ${namesOf(products, 2)}`,
      waiting: agoOf(oldest.at, at),
      href: one ? `${lotHref(oldest.code)}/release` : '/lots?state=to-decide',
      deed: one ? 'Decide' : `Decide ${count}`,
    },
  ]
}
