import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import {
  compareWaiting,
  type Desk,
  desksOf,
  inWords,
  urgencyOf,
  type Waiting,
  type WaitingKind,
  waitingHeadline,
  waitingKinds,
  whatWaits,
} from '@/lib/domain/quality/what-waits'
import { deepFreeze } from '@/test/support/deep-freeze'

const desks = ['bench', 'quality', 'sales', 'administrator'] as const satisfies readonly Desk[]

const waiting: fc.Arbitrary<Waiting> = fc.record({
  kind: fc.constantFrom(...waitingKinds),
  key: fc.constantFrom('lot LA-1', 'lot LA-2', 'lot LA-10', 'gauge M-1', 'import 3', 'Ö'),
  since: fc.option(fc.integer({ min: 0, max: 4 }), { nil: undefined }),
})

const place = (kind: WaitingKind): number => waitingKinds.indexOf(kind)

describe('the order of consequence', () => {
  it('is a total order: antisymmetric, transitive, and equal for the same thing alone', () => {
    fc.assert(
      fc.property(waiting, waiting, waiting, (a, b, c) => {
        // Not Math.sign(…) === -Math.sign(…): that would tell 0 from −0.
        expect(Math.sign(compareWaiting(a, b)) + Math.sign(compareWaiting(b, a))).toBe(0)
        if (compareWaiting(a, b) <= 0 && compareWaiting(b, c) <= 0)
          expect(compareWaiting(a, c)).toBeLessThanOrEqual(0)
        expect(compareWaiting(a, b) === 0).toBe(a.kind === b.kind && a.key === b.key && a.since === b.since)
      }),
    )
  })

  it('does not depend on the order in which things were found', () => {
    const twice = fc
      .array(waiting)
      .chain((found) =>
        fc.tuple(
          fc.constant(found),
          fc.shuffledSubarray(found, { minLength: found.length, maxLength: found.length }),
        ),
      )
    fc.assert(
      fc.property(twice, ([found, shuffled]) => {
        expect(whatWaits(desks, shuffled)).toEqual(whatWaits(desks, found))
      }),
    )
  })

  it('changes nothing when it is applied again, and leaves what it is given as it was', () => {
    fc.assert(
      fc.property(fc.array(waiting), (found) => {
        const once = whatWaits(desks, deepFreeze(found))
        expect(whatWaits(desks, once)).toEqual(once)
      }),
    )
  })

  // The issue: what others rely on already, then what goes wrong next, then what stands still.
  it.each([
    ['released-changed', 'signal'],
    ['lot-open-closure', 'signal'],
    ['lot-outside', 'lot-open-closure'],
    ['released-changed', 'lot-outside'],
    ['datasheet-changed', 'lots-released'],
    ['signal', 'lot-to-decide'],
    ['gauge-overdue', 'gauge-due'],
    ['lot-half-measured', 'lot-to-measure'],
    ['lot-to-decide', 'lot-held'],
    ['lot-held', 'import-rows'],
    ['import-rows', 'limits-provisional'],
    ['limits-provisional', 'product-without-limits'],
  ] as const)('has %s before %s, however long the other has waited', (first, second) => {
    fc.assert(
      fc.property(waiting, waiting, (a, b) => {
        expect(compareWaiting({ ...a, kind: first }, { ...b, kind: second })).toBeLessThan(0)
      }),
    )
  })

  it('has what waits longest first within a kind, and what has no date last', () => {
    const of = (key: string, since: number | undefined): Waiting => ({ kind: 'signal', key, since })
    const found = [of('none', undefined), of('new', 9), of('b', 3), of('a', 3), of('old', 1)]
    expect(whatWaits(['quality'], found).map(({ key }) => key)).toEqual(['old', 'a', 'b', 'new', 'none'])
  })

  it('never puts off what is urgent behind what is not', () => {
    const rank = { now: 0, shift: 1, week: 2 }
    const ranks = waitingKinds.map((kind) => rank[urgencyOf(kind)])
    expect(ranks).toEqual([...ranks].sort((a, b) => a - b))
  })
})

describe('whatWaits(desks, found)', () => {
  it('shows each desk its own, and somebody with several desks the union', () => {
    fc.assert(
      fc.property(fc.array(waiting), fc.subarray([...desks]), (found, mine) => {
        const shown = whatWaits(mine, found)
        for (const { kind } of shown) expect(desksOf(kind).some((desk) => mine.includes(desk))).toBe(true)
        const keys = (list: readonly Waiting[]) => new Set(list.map(({ key }) => key))
        expect(keys(shown)).toEqual(new Set(mine.flatMap((desk) => [...keys(whatWaits([desk], found))])))
      }),
    )
  })

  it('shows the same thing once, as its gravest kind', () => {
    fc.assert(
      fc.property(fc.array(waiting), (found) => {
        const shown = whatWaits(desks, found)
        expect(new Set(shown.map(({ key }) => key)).size).toBe(shown.length)
        for (const one of shown) {
          const same = found.filter(({ key }) => key === one.key).map(({ kind }) => place(kind))
          expect(place(one.kind)).toBe(Math.min(...same))
        }
      }),
    )
  })

  it('has a desk for every kind, and shows nothing to somebody without one', () => {
    for (const kind of waitingKinds) expect(desksOf(kind).length, kind).toBeGreaterThan(0)
    expect(whatWaits([], [{ kind: 'signal', key: 'a', since: 1 }])).toEqual([])
  })
})

describe('waitingHeadline(totals)', () => {
  it('says what waits in plain words, the gravest first', () => {
    expect(waitingHeadline({ signal: 1 })).toBe('One signal waits for an answer.')
    expect(waitingHeadline({ 'gauge-due': 2, 'lot-outside': 1 })).toBe(
      'One lot is outside its tolerance and two calibrations fall due.',
    )
    expect(waitingHeadline({ 'lot-to-decide': 31, signal: 3, 'gauge-due': 2, 'lot-held': 1 })).toBe(
      'Three signals wait for an answer, 31 lots wait for a decision, and three more things wait.',
    )
    expect(waitingHeadline({ signal: 1, 'lot-to-decide': 1, 'gauge-due': 1 })).toMatch(
      /and one more thing waits\.$/,
    )
  })

  it('says so when nothing waits, also when it was counted', () => {
    expect(waitingHeadline({})).toBe('Nothing waits for you.')
    expect(waitingHeadline({ signal: 0 })).toBe('Nothing waits for you.')
  })

  it('leaves nothing out of the count', () => {
    const counts = fc.dictionary(fc.constantFrom(...waitingKinds), fc.integer({ min: 13, max: 99 }))
    fc.assert(
      fc.property(counts, (totals) => {
        const said = [...waitingHeadline(totals).matchAll(/\d+/g)].reduce((sum, [n]) => sum + Number(n), 0)
        expect(said).toBe(Object.values(totals).reduce((sum, n) => sum + n, 0))
      }),
    )
  })

  it('writes numbers up to twelve in words', () => {
    expect([0, 1, 11, 12, 13].map(inWords)).toEqual(['no', 'one', 'eleven', 'twelve', '13'])
  })
})
