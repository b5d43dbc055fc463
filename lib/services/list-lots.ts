import type { Actor } from '@/lib/access/actor'
import { may, permit } from '@/lib/access/permit'
import { database } from '@/lib/data/database'
import { countLotRows, listLotRows } from '@/lib/data/lots'
import { listOpenSignals } from '@/lib/data/signals'
import type { LotState } from '@/lib/domain/record/lot-state'
import { type ListLotsInput, LOTS_A_PAGE } from '@/lib/input/lot'

export interface LotListItem {
  readonly code: string
  readonly state: LotState
  readonly productCode: string
  readonly productName: string
  readonly machine: string | undefined
  readonly die: string | undefined
  readonly madeAt: number
  readonly lengthMetres: number | undefined
  readonly specimens: number
  readonly evidenceChanged: boolean
  /** Unanswered signals whose pattern the lot belongs to. */
  readonly openSignals: number
}

export interface LotList {
  readonly lots: readonly LotListItem[]
  readonly count: number
  readonly page: number
  readonly pages: number
}

/**
 * Lots, newest first, a page at a time. Who may only read released lots sees no others, whatever is asked for.
 * @throws LedgerlineError not-permitted
 */
export async function listLots(actor: Actor | undefined, input: ListLotsInput): Promise<LotList> {
  const all = may(actor, 'lots.read')
  if (!all) permit(actor, 'lots.read-released')
  const { read } = database()
  const asked = input.state === undefined ? undefined : [input.state]
  const filter = {
    search: input.search,
    productCode: input.productCode,
    states: all ? asked : (asked ?? ['released' as const]).filter((state) => state === 'released'),
  }
  const count = await countLotRows(read, filter)
  const pages = Math.max(1, Math.ceil(count / LOTS_A_PAGE))
  const page = Math.min(input.page, pages)
  const rows = await listLotRows(read, filter, { skip: (page - 1) * LOTS_A_PAGE, take: LOTS_A_PAGE })
  const open = all ? await listOpenSignals(read) : []
  return {
    lots: rows.map((row) => ({
      code: row.code,
      state: row.state,
      productCode: row.product.code,
      productName: row.product.name,
      machine: row.machine?.name,
      die: row.die?.name,
      madeAt: row.madeAt,
      lengthMetres: row.lengthMetres,
      specimens: row.specimenCount,
      evidenceChanged: row.evidenceChanged,
      openSignals: open.filter((signal) => signal.members.includes(row.id)).length,
    })),
    count,
    page,
    pages,
  }
}
