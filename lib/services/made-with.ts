import type { MadeLotRow } from '@/lib/data/made-lots'
import { type MetresMade, metresMade, metresMadeBy } from '@/lib/domain/record/metres-made'

/** What a machine or die has made. */
export interface MadeWith {
  readonly total: MetresMade
  /** The one made last first. */
  readonly products: readonly (MetresMade & { readonly code: string; readonly name: string })[]
  /** The newest lots, at most `NEWEST_LOTS`. */
  readonly newest: readonly MadeLotRow[]
}

export const NEWEST_LOTS = 12

/** @param lots newest first */
export const madeWith = (lots: readonly MadeLotRow[]): MadeWith => ({
  total: metresMade(lots),
  products: metresMadeBy(lots, ({ productCode }) => productCode).map(({ group, ...made }) => ({
    ...made,
    code: group,
    name: lots.find(({ productCode }) => productCode === group)?.productName ?? group,
  })),
  newest: lots.slice(0, NEWEST_LOTS),
})
