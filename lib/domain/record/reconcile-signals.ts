import type { Departure, StoredSignal } from './chart-history'

/** A signal that is raised anew. */
export type RaisedSignal = Departure & {
  readonly raisedAt: number
  /** Of the lot that completed it, where lots of several products make it. */
  readonly productId?: number
}

/** What a signal that is already kept comes to. */
export type SignalChange = Pick<
  StoredSignal,
  'id' | 'state' | 'evidenceChanged' | 'members' | 'departure' | 'raisedAt'
>

export interface SignalChanges {
  readonly raised: readonly RaisedSignal[]
  readonly changed: readonly SignalChange[]
}

/** One departure has one signal: same limit set, rule and side, completed by the same lot. */
const keyOf = (one: Departure): string => [one.limitSetId, one.rule, one.side, one.lotId].join(' ')

/**
 * Compares what the rules find on a chart with the signals that are kept for it. What is new is raised; what is
 * still found follows its pattern as that grows; what is no longer found stays and is marked so, answered or
 * not, because someone may have acted on it, and comes back as it was when it is found again. An answered
 * signal keeps the time it was raised; it is marked *evidence changed* when what it was answered for changes:
 * a lot of its pattern has other results (`touched`), or the pattern is no longer the beginning of the new one.
 */
export function reconcileSignals(
  found: readonly RaisedSignal[],
  stored: readonly StoredSignal[],
  touched?: number,
): SignalChanges {
  const kept = new Set(stored.map(keyOf))
  const now = new Map(found.map((one) => [keyOf(one), one]))
  return {
    raised: found.filter((one) => !kept.has(keyOf(one))),
    changed: stored.flatMap((signal) => {
      const next = nextOf(signal, now.get(keyOf(signal)), touched)
      return isSame(signal, next) ? [] : [next]
    }),
  }
}

function nextOf(
  signal: StoredSignal,
  found: RaisedSignal | undefined,
  touched: number | undefined,
): SignalChange {
  const { id, answered, members, departure, raisedAt, evidenceChanged } = signal
  if (!found)
    return {
      id,
      state: 'no-longer-holds',
      evidenceChanged: evidenceChanged || answered,
      members,
      departure,
      raisedAt,
    }
  const changed = !startsWith(found.members, members) || (touched !== undefined && members.includes(touched))
  return {
    id,
    state: answered ? 'answered' : 'open',
    evidenceChanged: evidenceChanged || (answered && changed),
    members: found.members,
    departure: found.departure,
    raisedAt: answered ? raisedAt : found.raisedAt,
  }
}

const startsWith = (whole: readonly number[], start: readonly number[]): boolean =>
  start.every((lotId, index) => whole[index] === lotId)

const isSame = (signal: StoredSignal, next: SignalChange): boolean =>
  signal.state === next.state &&
  signal.evidenceChanged === next.evidenceChanged &&
  signal.departure === next.departure &&
  signal.raisedAt === next.raisedAt &&
  signal.members.length === next.members.length &&
  startsWith(next.members, signal.members)
