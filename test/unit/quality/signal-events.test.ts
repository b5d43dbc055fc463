import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { signalEvents } from '@/lib/domain/quality/signal-events'

const signal = (id: number, ...members: number[]) => ({ id, members })
const ids = (events: ReturnType<typeof signalEvents<ReturnType<typeof signal>>>) =>
  events.map((event) => event.map(({ id }) => id))

describe('signalEvents(signals)', () => {
  it('joins signals that share a lot, and leaves others apart', () => {
    expect(ids(signalEvents([signal(1, 5, 6), signal(2, 9), signal(3, 6, 7)]))).toEqual([[1, 3], [2]])
  })

  it('joins two events when a later signal belongs to both', () => {
    expect(ids(signalEvents([signal(1, 5), signal(2, 9), signal(3, 5, 9), signal(4, 9)]))).toEqual([
      [1, 2, 3, 4],
    ])
  })

  it('has no signals for none, and an event for a signal without lots', () => {
    expect(signalEvents([])).toEqual([])
    expect(ids(signalEvents([signal(1), signal(2)]))).toEqual([[1], [2]])
  })

  it('keeps every signal once, never shares a lot between events, and joins no more than sharing asks', () => {
    const some = fc.array(fc.array(fc.integer({ min: 0, max: 12 }), { maxLength: 3 }), { maxLength: 12 })
    fc.assert(
      fc.property(some, (lists) => {
        const signals = lists.map((members, id) => ({ id, members }))
        const events = signalEvents(signals)
        expect(
          events
            .flat()
            .map(({ id }) => id)
            .sort((a, b) => a - b),
        ).toEqual(signals.map(({ id }) => id))
        const lotsOf = events.map((event) => new Set(event.flatMap(({ members }) => members)))
        for (const [index, lots] of lotsOf.entries())
          for (const other of lotsOf.slice(index + 1))
            expect([...lots].filter((lot) => other.has(lot))).toEqual([])
        // From its first signal every other one is reached over shared lots.
        for (const event of events) {
          const reached = new Set(event[0]?.members)
          for (const _ of event)
            for (const { members } of event)
              if (members.some((lot) => reached.has(lot))) for (const lot of members) reached.add(lot)
          for (const { members } of event) for (const lot of members) expect(reached.has(lot)).toBe(true)
        }
      }),
    )
  })
})
