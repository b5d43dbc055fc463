import type { Actor } from '@/lib/access/actor'
import { database } from '@/lib/data/database'
import { listLotItems } from '@/lib/data/lot-list'
import { listSelectedIds } from '@/lib/data/lot-selection'
import type { LotColumnId } from '@/lib/domain/record/lot-columns'
import { type ListLotsInput, usualColumns } from '@/lib/input/lot-list'
import { lotsCsv } from '@/lib/output/lots-csv'
import { lotsXlsx } from '@/lib/output/lots-xlsx'
import { getWorks } from './get-works'
import { lotRights, seenWith } from './list-lots'
import { lotOrder, lotsAsked } from './lots-asked'

export type LotsFormat = 'csv' | 'xlsx'

export interface LotsFile {
  readonly name: string
  readonly type: string
  readonly content: string | Uint8Array
}

/**
 * The list of lots as a file: the whole selection with the columns and in the order that the page shows, not only
 * one page of it.
 * @throws LedgerlineError not-permitted; not-ready while the works is not set up
 */
export async function saveLots(
  actor: Actor | undefined,
  format: LotsFormat,
  input: ListLotsInput,
): Promise<LotsFile> {
  const rights = lotRights(actor)
  const works = await getWorks(actor)
  const { read } = database()
  const ids = await listSelectedIds(read, lotsAsked(input, rights, works.timeZone), lotOrder(input))
  const lots = (await listLotItems(read, ids)).map(seenWith(rights))
  const seen = (id: LotColumnId) => rights.materials || id !== 'materials'
  const columns = (input.columns ?? usualColumns).filter(seen)
  return format === 'csv'
    ? {
        name: 'lots.csv',
        type: 'text/csv; charset=utf-8; header=present',
        content: lotsCsv(lots, columns, works),
      }
    : {
        name: 'lots.xlsx',
        type: 'application/vnd.openxmlformats-officedocument.spreadsheetml.sheet',
        content: await lotsXlsx(lots, columns, works),
      }
}
