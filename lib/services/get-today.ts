import type { Actor } from '@/lib/access/actor'
import { may, permit } from '@/lib/access/permit'
import { database } from '@/lib/data/database'
import { countDay } from '@/lib/data/today-lots'
import {
  type Urgency,
  urgencyOf,
  type WaitingKind,
  waitingHeadline,
  whatWaits,
} from '@/lib/domain/quality/what-waits'
import { startOfDay } from './calendar-day'
import { getWorks } from './get-works'
import { benchOfToday } from './today-bench'
import { equipmentOfToday } from './today-equipment'
import { failedImportsOfToday, importRowsOfToday } from './today-imports'
import { type AskedToday, type FoundToday, SHOWN, type WaitingItem, type WaitingTotal } from './today-item'
import { limitsOfToday } from './today-limits'
import { lotsOfToday } from './today-lots'
import { backupOfToday, peopleOfToday } from './today-people'
import { salesOfToday } from './today-sales'
import { signalsOfToday } from './today-signals'

export type { WaitingItem, WaitingTotal }

/** What was made, measured and decided since a moment. */
export type DayFigures = Awaited<ReturnType<typeof countDay>>

export interface Today {
  /** What waits, in a sentence. */
  readonly headline: string
  /** In order of consequence, by when they have to be done; bands without anything are left out. */
  readonly bands: readonly {
    readonly urgency: Urgency
    readonly items: readonly WaitingItem[]
    /** Kinds of which more wait than are shown. */
    readonly more: readonly WaitingTotal[]
  }[]
  /** Since the day began in the works’ time zone, and over the last seven days; undefined for those who see no lots at work. */
  readonly figures: { readonly day: DayFigures; readonly week: DayFigures } | undefined
}

/** The calendar day of an instant, `2026-11-27`. */
const dayOf = (at: number, timeZone: string): string =>
  new Intl.DateTimeFormat('en-CA', { timeZone }).format(at)

const WEEK = 7 * 86_400_000

/**
 * What waits for a person, from each of their desks, each thing once and in order of consequence. The number of
 * queries depends on the desks alone, and so does the number of rows that are read one by one.
 * @param at epoch milliseconds
 * @throws LedgerlineError not-signed-in; not-ready while the works is not set up
 */
export async function getToday(actor: Actor | undefined, at: number = Date.now()): Promise<Today> {
  permit(actor, 'settings.read')
  const works = await getWorks(actor)
  const { read } = database()
  const asked: AskedToday = { tx: read, at, works, personId: actor.personId, desks: actor.roles }
  const found: FoundToday[] = []
  for (const ask of questionsOf(actor)) found.push(await ask(asked))
  const items = whatWaits(
    actor.roles,
    found.flatMap((one) => one.items),
  )
  const totals = found.flatMap((one) => one.totals)
  const figures = may(actor, 'lots.read')
    ? {
        day: await countDay(read, startOfDay(dayOf(at, works.timeZone), works.timeZone), at),
        week: await countDay(read, at - WEEK, at),
      }
    : undefined
  return { headline: waitingHeadline(countsOf(items, totals)), bands: bandsOf(items, totals), figures }
}

type Question = (asked: AskedToday) => Promise<FoundToday>

/** What is asked for a person: the questions of each of their desks, each once. */
function questionsOf(actor: Actor): readonly Question[] {
  const at = (desk: Actor['roles'][number]): boolean => actor.roles.includes(desk)
  return [
    ...(at('quality') ? [lotsOfToday, signalsOfToday, limitsOfToday] : []),
    ...(at('bench') ? [benchOfToday] : []),
    ...(at('quality') || at('bench') ? [equipmentOfToday, openRowsOf(!at('quality'))] : []),
    ...(at('sales') ? [salesOfToday] : []),
    ...(at('administrator') ? [failedImportsOfToday, backupOfToday, peopleOfToday] : []),
  ]
}

const openRowsOf =
  (own: boolean): Question =>
  (asked) =>
    importRowsOfToday(asked, own)

/** How many wait of each kind: what was counted, else what is there. */
function countsOf(
  items: readonly WaitingItem[],
  totals: readonly WaitingTotal[],
): Readonly<Partial<Record<WaitingKind, number>>> {
  const counts: Partial<Record<WaitingKind, number>> = {}
  for (const { kind } of items) counts[kind] = (counts[kind] ?? 0) + 1
  for (const { count, kind } of totals) if (counts[kind] !== undefined) counts[kind] = count
  return counts
}

const urgencies = ['now', 'shift', 'week'] as const satisfies readonly Urgency[]

/** Kinds that stand for several in one line say so in the line. */
const together: readonly WaitingKind[] = ['lot-to-decide', 'signal', 'lot-held', 'own-lot-held']

const bandsOf = (items: readonly WaitingItem[], totals: readonly WaitingTotal[]): Today['bands'] =>
  urgencies.flatMap((urgency) => {
    const mine = items.filter(({ kind }) => urgencyOf(kind) === urgency)
    const more = totals.filter(({ count, kind }) => {
      const shown = mine.filter((item) => item.kind === kind).length
      return shown > 0 && count > shown && (!together.includes(kind) || shown >= SHOWN)
    })
    return mine.length === 0 ? [] : [{ urgency, items: mine, more }]
  })
