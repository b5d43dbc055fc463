import type { Tx } from '@/lib/data/database'
import type { VerdictKind } from '@/lib/domain/charts/verdict-mark'
import type { Desk, Waiting, WaitingKind } from '@/lib/domain/quality/what-waits'
import type { WorksFacts } from './get-works'

/** What every question of Today is asked with. */
export interface AskedToday {
  readonly tx: Tx
  /** Epoch milliseconds. */
  readonly at: number
  readonly works: WorksFacts
  readonly personId: number
  readonly desks: readonly Desk[]
}

/** One line of Today. */
export interface WaitingItem extends Waiting {
  readonly mark: VerdictKind
  /** What it is. */
  readonly title: string
  /** Why it matters. */
  readonly text: string
  /** What is at stake, in a few words. */
  readonly stake: string
  /** Since when, or until when, in a few words. */
  readonly waiting: string
  /** Where it is done, and what is done there. */
  readonly href: string
  readonly deed: string
}

/** How many wait of a kind in all, and where all of them are. */
export interface WaitingTotal {
  readonly kind: WaitingKind
  readonly count: number
  readonly href: string
}

export interface FoundToday {
  readonly items: readonly WaitingItem[]
  /** Of kinds that have more than their items show, or items that stand for several. */
  readonly totals: readonly WaitingTotal[]
}

export const nothingFound: FoundToday = { items: [], totals: [] }

/** Lines shown of one kind; the rest is counted. */
export const SHOWN = 12

export const DAY = 86_400_000

/** `4 lots`, `1 lot`. */
export const counted = (count: number, one: string, several: string): string =>
  `${count} ${count === 1 ? one : several}`

/** How long something has waited: `3 h`, `1 day`, `18 days`. */
export function agoOf(since: number, at: number): string {
  const hours = Math.floor((at - since) / 3_600_000)
  if (hours < 1) return 'just now'
  return hours < 24 ? `${hours} h` : counted(Math.floor(hours / 24), 'day', 'days')
}

/**
 * Names in a line, the first few written out: `LA-1, LA-2, LA-3 and 5 more`.
 * @param count of all, when not all names are known
 */
export function namesOf(names: readonly string[], most = 3, count = names.length): string {
  const shown = names.slice(0, most)
  if (count > shown.length) return `${shown.join(', ')} and ${count - shown.length} more`
  const last = shown.at(-1) ?? ''
  return shown.length < 2 ? last : `${shown.slice(0, -1).join(', ')} and ${last}`
}

/** Total of a kind, when there is more of it than is shown. */
export const totalOf = (kind: WaitingKind, count: number, href: string): readonly WaitingTotal[] =>
  count > 0 ? [{ kind, count, href }] : []
