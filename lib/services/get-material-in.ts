import type { Actor } from '@/lib/access/actor'
import { permit } from '@/lib/access/permit'
import { database } from '@/lib/data/database'
import { countMadeOf, listMadeOf, type MadeOfRow } from '@/lib/data/lot-materials'
import { listWoundFrom, type MaterialInRow } from '@/lib/data/materials-in'
import { requireMaterialIn } from './keep-material-in'

/** Most lots that its page lists. */
export const MOST_LOTS_MADE_OF = 200

export interface MaterialInView {
  readonly row: MaterialInRow
  /** Spools wound from a coil. */
  readonly spools: readonly MaterialInRow[]
  /** Lots made of it or of a spool wound from it, newest first, at most `MOST_LOTS_MADE_OF` links. */
  readonly madeOf: readonly MadeOfRow[]
  /** Links there are in all. */
  readonly links: number
}

/** A coil, spool or batch with everything made of it. @throws LedgerlineError not-permitted, not-found */
export async function getMaterialIn(actor: Actor | undefined, code: string): Promise<MaterialInView> {
  permit(actor, 'materials-in.read')
  const row = await requireMaterialIn(actor, code)
  const { read } = database()
  const spools = await listWoundFrom(read, row.id)
  const ids = [row, ...spools].map(({ id }) => id)
  return {
    row,
    spools,
    madeOf: await listMadeOf(read, ids, MOST_LOTS_MADE_OF),
    links: await countMadeOf(read, ids),
  }
}
