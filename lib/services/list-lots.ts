import type { Actor } from '@/lib/access/actor'
import { may, permit } from '@/lib/access/permit'
import { database } from '@/lib/data/database'
import { listLotChoiceRows, listLotItems } from '@/lib/data/lot-list'
import { listSelectedIds, type StateTotal, totalSelection } from '@/lib/data/lot-selection'
import type { LotListItem } from '@/lib/domain/record/lot-columns'
import { type ListLotsInput, LOTS_A_PAGE } from '@/lib/input/lot-list'
import { getWorks } from './get-works'
import { type LotRights, lotOrder, lotsAsked } from './lots-asked'

export type { LotListItem }

export interface LotList {
  readonly lots: readonly LotListItem[]
  readonly count: number
  readonly page: number
  readonly pages: number
  /** Of the whole selection, not of the page: metres, lots whose length is known, and lots by state. */
  readonly metres: number
  readonly lotsWithLength: number
  readonly states: readonly StateTotal[]
}

/** What somebody may see in a list of lots. @throws LedgerlineError not-permitted */
export function lotRights(actor: Actor | undefined): LotRights {
  permit(actor, 'lots.read-released')
  return { all: may(actor, 'lots.read'), materials: may(actor, 'materials-in.read') }
}

/** A lot without what its reader has no right to. */
export const seenWith =
  ({ all, materials }: LotRights) =>
  (lot: LotListItem): LotListItem => ({
    ...lot,
    openSignals: all ? lot.openSignals : 0,
    materials: materials ? lot.materials : [],
  })

/**
 * Lots as asked for, a page at a time, with what the whole selection comes to. Who may only read released lots sees
 * no others, whatever is asked for.
 * @throws LedgerlineError not-permitted; not-ready while the works is not set up
 */
export async function listLots(actor: Actor | undefined, input: ListLotsInput): Promise<LotList> {
  const rights = lotRights(actor)
  const { timeZone } = await getWorks(actor)
  const { read } = database()
  const selection = lotsAsked(input, rights, timeZone)
  const states = await totalSelection(read, selection)
  const sum = (of: (total: StateTotal) => number) => states.reduce((all, one) => all + of(one), 0)
  const count = sum(({ lots }) => lots)
  const pages = Math.max(1, Math.ceil(count / LOTS_A_PAGE))
  const page = Math.min(input.page, pages)
  const ids = await listSelectedIds(read, selection, lotOrder(input), {
    skip: (page - 1) * LOTS_A_PAGE,
    take: LOTS_A_PAGE,
  })
  return {
    lots: (await listLotItems(read, ids)).map(seenWith(rights)),
    count,
    page,
    pages,
    metres: sum(({ metres }) => metres),
    lotsWithLength: sum(({ lotsWithLength }) => lotsWithLength),
    states,
  }
}

interface Choice {
  readonly code: string
  readonly name: string
}

export interface LotChoices {
  readonly products: readonly Choice[]
  readonly families: readonly string[]
  readonly machines: readonly Choice[]
  readonly dies: readonly Choice[]
}

/** What lots can be chosen by. Who may not read the equipment list gets no machines and dies. */
export async function listLotChoices(actor: Actor | undefined): Promise<LotChoices> {
  permit(actor, 'lots.read-released')
  const { products, machines, dies } = await listLotChoiceRows(database().read)
  const equipment = may(actor, 'equipment.read')
  return {
    products: products.map(({ code, name }) => ({ code, name })),
    families: [...new Set(products.map(({ family }) => family))].filter(Boolean).sort(),
    machines: equipment ? machines : [],
    dies: equipment ? dies : [],
  }
}
