import type { LotOrder, LotSelection } from '@/lib/data/lot-selection'
import { lotSortKeys } from '@/lib/domain/record/lot-columns'
import { type ListLotsInput, usualSort } from '@/lib/input/lot-list'
import { endOfDay, startOfDay } from './calendar-day'

/** What somebody who lists lots may see. */
export interface LotRights {
  /** Lots that are not released, and the signals of all. */
  readonly all: boolean
  readonly materials: boolean
}

/** From what was asked for, and what may be seen, to the lots meant. Who sees released lots only is given no others. */
export function lotsAsked(input: ListLotsInput, { all }: LotRights, timeZone: string): LotSelection {
  const asked = input.state === undefined ? undefined : [input.state]
  return {
    words: input.search.toLowerCase().split(/\s+/).filter(Boolean),
    // Which lots have open signals is not told to those who may not read them.
    states: all
      ? asked
      : input.signals
        ? []
        : (asked ?? ['released' as const]).filter((state) => state === 'released'),
    productCode: input.productCode,
    family: input.family,
    machineCode: input.machineCode,
    dieCode: input.dieCode,
    madeFrom: input.from === undefined ? undefined : startOfDay(input.from, timeZone),
    madeTo: input.to === undefined ? undefined : endOfDay(input.to, timeZone),
    withOpenSignal: input.signals === 'open',
    evidenceChanged: input.evidence === 'changed',
  }
}

/** The order asked for; without one, newest first. */
export function lotOrder({ sort = usualSort }: Pick<ListLotsInput, 'sort'>): LotOrder {
  const key = lotSortKeys.find((one) => sort.startsWith(`${one}-`)) ?? 'made'
  return { key, descending: sort.endsWith('-down') }
}
