interface Patterned {
  /** Ids of the lots of the pattern. */
  readonly members: readonly number[]
}

/**
 * Signals that share a lot tell of one event: a thick lot is thick, heavy and high in tension at once. Signals are
 * joined when their patterns share a lot, directly or over others. Events keep the order of their first signals,
 * signals their order within the event; a signal without lots is an event of its own.
 */
export function signalEvents<S extends Patterned>(signals: readonly S[]): readonly (readonly S[])[] {
  /** The event each lot belongs to so far; an event that was joined to another one is left empty. */
  const eventOfLot = new Map<number, number>()
  const events: number[][] = []
  for (const [index, { members }] of signals.entries()) {
    const touched = [...new Set(members.flatMap((lot) => eventOfLot.get(lot) ?? []))].sort((a, b) => a - b)
    const home = touched[0] ?? events.length
    const joined = touched.flatMap((event) => events[event] ?? [])
    for (const event of touched) events[event] = []
    events[home] = [...joined, index].sort((a, b) => a - b)
    for (const one of events[home]) for (const lot of signals[one]?.members ?? []) eventOfLot.set(lot, home)
  }
  return events
    .filter((event) => event.length > 0)
    .map((event) => event.flatMap((index) => signals[index] ?? []))
}
