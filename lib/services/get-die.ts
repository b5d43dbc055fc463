import type { Actor } from '@/lib/access/actor'
import { permit } from '@/lib/access/permit'
import { database } from '@/lib/data/database'
import { type DieRow, dies } from '@/lib/data/dies'
import { listMadeLots } from '@/lib/data/made-lots'
import { getWorks } from '@/lib/data/works'
import { type MetresMade, metresMadeBy } from '@/lib/domain/record/metres-made'
import { monthOf } from './calendar-month'
import { missing } from './keep-equipment'
import { type MadeWith, madeWith } from './made-with'

export interface DieView extends MadeWith {
  readonly row: DieRow
  /** By calendar month of the works' clock, `2026-11`, newest first; months without a lot are left out. */
  readonly months: readonly (MetresMade & {
    readonly month: string
    /** Metres from the first lot to the end of the month: what the die has behind it. */
    readonly metresSoFar: number
  })[]
}

/** A die with the metres drawn through it. @throws LedgerlineError not-permitted, not-found */
export async function getDie(actor: Actor | undefined, code: string): Promise<DieView> {
  permit(actor, 'equipment.read')
  const { read } = database()
  const row = await dies.get(read, code)
  if (!row) throw missing('die', code)
  const timeZone = (await getWorks(read))?.timeZone ?? 'UTC'
  const lots = await listMadeLots(read, { dieId: row.id })
  const made = madeWith(lots)
  let left = made.total.metres
  const months = metresMadeBy(lots, ({ madeAt }) => monthOf(madeAt, timeZone)).map(({ group, ...month }) => {
    const metresSoFar = left
    left -= month.metres
    return { ...month, month: group, metresSoFar }
  })
  return { row, ...made, months }
}
