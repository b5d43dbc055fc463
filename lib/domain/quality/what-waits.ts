/** Whose work something is. What a desk may do stands in the table of rights; this only says what it is shown. */
export type Desk = 'bench' | 'quality' | 'sales' | 'administrator'

/** By when: before anything more is made or sent, before the shift ends, within the week. */
export type Urgency = 'now' | 'shift' | 'week'

interface Kind {
  readonly kind: string
  readonly urgency: Urgency
  readonly desks: readonly Desk[]
  /** What one of them does, after a number in words: "one" + "signal waits for an answer". */
  readonly one: string
  readonly several: string
}

/**
 * Everything that can wait, in order of consequence. What others already rely on comes first (released lots,
 * published sheets), then what would go wrong with the next metre, then what only stands still, last what makes
 * the works better. Reorder lines here and nowhere else.
 */
const order = [
  {
    kind: 'released-changed',
    urgency: 'now',
    desks: ['quality'],
    one: 'released lot asks for another look',
    several: 'released lots ask for another look',
  },
  {
    kind: 'datasheet-changed',
    urgency: 'now',
    desks: ['sales'],
    one: 'published datasheet rests on changed readings',
    several: 'published datasheets rest on changed readings',
  },
  {
    kind: 'lot-outside',
    urgency: 'now',
    desks: ['quality'],
    one: 'lot is outside its tolerance',
    several: 'lots are outside their tolerance',
  },
  {
    kind: 'lot-open-closure',
    urgency: 'now',
    desks: ['quality'],
    one: 'lot does not close',
    several: 'lots do not close',
  },
  {
    kind: 'signal',
    urgency: 'now',
    desks: ['quality'],
    one: 'signal waits for an answer',
    several: 'signals wait for an answer',
  },
  {
    kind: 'gauge-overdue',
    urgency: 'now',
    desks: ['quality', 'bench'],
    one: 'calibration is overdue',
    several: 'calibrations are overdue',
  },
  {
    kind: 'lot-half-measured',
    urgency: 'shift',
    desks: ['bench'],
    one: 'lot is half measured',
    several: 'lots are half measured',
  },
  {
    kind: 'lot-rework',
    urgency: 'shift',
    desks: ['bench'],
    one: 'lot is to be measured anew',
    several: 'lots are to be measured anew',
  },
  {
    kind: 'lot-to-measure',
    urgency: 'shift',
    desks: ['bench'],
    one: 'lot waits to be measured',
    several: 'lots wait to be measured',
  },
  {
    kind: 'lot-doubtful',
    urgency: 'shift',
    desks: ['quality'],
    one: 'lot is not proven inside tolerance',
    several: 'lots are not proven inside tolerance',
  },
  {
    kind: 'lot-to-decide',
    urgency: 'shift',
    desks: ['quality'],
    one: 'lot waits for a decision',
    several: 'lots wait for a decision',
  },
  {
    kind: 'lot-held',
    urgency: 'shift',
    desks: ['quality'],
    one: 'lot has long been on hold',
    several: 'lots have long been on hold',
  },
  {
    kind: 'own-lot-held',
    urgency: 'shift',
    desks: ['bench'],
    one: 'lot of yours is on hold',
    several: 'lots of yours are on hold',
  },
  {
    kind: 'import-failed',
    urgency: 'shift',
    desks: ['administrator'],
    one: 'import failed',
    several: 'imports failed',
  },
  {
    kind: 'import-rows',
    urgency: 'shift',
    desks: ['quality'],
    one: 'import left rows open',
    several: 'imports left rows open',
  },
  {
    kind: 'own-import-rows',
    urgency: 'shift',
    desks: ['bench'],
    one: 'import of yours left rows open',
    several: 'imports of yours left rows open',
  },
  {
    kind: 'backup-old',
    urgency: 'shift',
    desks: ['administrator'],
    one: 'back-up is missing',
    several: 'back-ups are missing',
  },
  {
    kind: 'lots-released',
    urgency: 'shift',
    desks: ['sales'],
    one: 'product has newly released lots',
    several: 'products have newly released lots',
  },
  {
    kind: 'gauge-due',
    urgency: 'week',
    desks: ['quality', 'bench'],
    one: 'calibration falls due',
    several: 'calibrations fall due',
  },
  {
    kind: 'revision-superseded',
    urgency: 'week',
    desks: ['sales'],
    one: 'datasheet has a new revision',
    several: 'datasheets have a new revision',
  },
  {
    kind: 'product-without-datasheet',
    urgency: 'week',
    desks: ['sales'],
    one: 'product has no datasheet yet',
    several: 'products have no datasheet yet',
  },
  {
    kind: 'person-without-role',
    urgency: 'week',
    desks: ['administrator'],
    one: 'person has no role',
    several: 'people have no role',
  },
  {
    kind: 'limits-provisional',
    urgency: 'week',
    desks: ['quality'],
    one: 'product has outgrown its provisional limits',
    several: 'products have outgrown their provisional limits',
  },
  {
    kind: 'product-without-limits',
    urgency: 'week',
    desks: ['quality'],
    one: 'product is ready for control limits',
    several: 'products are ready for control limits',
  },
] as const satisfies readonly Kind[]

export type WaitingKind = (typeof order)[number]['kind']

/** In order of consequence. */
export const waitingKinds: readonly WaitingKind[] = order.map(({ kind }) => kind)

const placeOf = new Map<WaitingKind, number>(order.map(({ kind }, place) => [kind, place]))
const factsOf = (kind: WaitingKind): Kind => order[placeOf.get(kind) ?? 0] ?? order[0]

export const urgencyOf = (kind: WaitingKind): Urgency => factsOf(kind).urgency

export const desksOf = (kind: WaitingKind): readonly Desk[] => factsOf(kind).desks

/** One thing that waits. */
export interface Waiting {
  readonly kind: WaitingKind
  /** What it is about: the same thing seen by two desks has the same key. */
  readonly key: string
  /** Epoch milliseconds: since when it waits, or when it falls due. */
  readonly since: number | undefined
}

/**
 * Order of consequence: by kind, then what waits longest (or falls due first), then by key, so that no two
 * different things are equal and the page never changes order by itself. What has no date comes last of its kind.
 * @returns negative when a comes first, 0 for the same kind, date and key alone
 */
export function compareWaiting(a: Waiting, b: Waiting): number {
  const byKind = (placeOf.get(a.kind) ?? 0) - (placeOf.get(b.kind) ?? 0)
  if (byKind !== 0) return byKind
  const [sinceA, sinceB] = [a.since ?? Number.POSITIVE_INFINITY, b.since ?? Number.POSITIVE_INFINITY]
  if (sinceA !== sinceB) return sinceA < sinceB ? -1 : 1
  // Code units, not the language of the machine: the order is the same everywhere.
  return a.key === b.key ? 0 : a.key < b.key ? -1 : 1
}

/** What waits for somebody at these desks, in order of consequence, each thing once: as its gravest kind. */
export function whatWaits<T extends Waiting>(desks: readonly Desk[], found: readonly T[]): readonly T[] {
  const ordered = found
    .filter(({ kind }) => desksOf(kind).some((desk) => desks.includes(desk)))
    .sort(compareWaiting)
  const seen = new Set<string>()
  return ordered.filter(({ key }) => {
    if (seen.has(key)) return false
    seen.add(key)
    return true
  })
}

const words = ['no', 'one', 'two', 'three', 'four', 'five', 'six', 'seven', 'eight', 'nine', 'ten', 'eleven']

/** Whole numbers up to twelve in words, as a sentence wants them. */
export const inWords = (count: number): string => (count === 12 ? 'twelve' : (words[count] ?? String(count)))

/** Kinds that a heading names; the rest is counted. */
const NAMED = 2

/**
 * What waits in a sentence: the gravest two kinds by name, the rest as a number.
 * @param totals how many wait of each kind; kinds that are missing count as none
 */
export function waitingHeadline(totals: Readonly<Partial<Record<WaitingKind, number>>>): string {
  const there = order.flatMap(({ kind, one, several }) => {
    const count = totals[kind] ?? 0
    return count > 0 ? [{ count, clause: `${inWords(count)} ${count === 1 ? one : several}` }] : []
  })
  if (there.length === 0) return 'Nothing waits for you.'
  const clauses = there.slice(0, NAMED).map(({ clause }) => clause)
  const rest = there.slice(NAMED).reduce((sum, { count }) => sum + count, 0)
  if (rest > 0) clauses.push(`${inWords(rest)} more ${rest === 1 ? 'thing waits' : 'things wait'}`)
  const last = clauses.pop() ?? ''
  const sentence =
    clauses.length === 0 ? last : `${clauses.join(', ')}${clauses.length > 1 ? ',' : ''} and ${last}`
  return `${sentence.charAt(0).toUpperCase()}${sentence.slice(1)}.`
}
