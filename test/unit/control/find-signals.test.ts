import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { beyondTheLimits } from '@/lib/domain/control/beyond-the-limits'
import { findSignals } from '@/lib/domain/control/find-signals'
import { nineOnOneSide } from '@/lib/domain/control/nine-on-one-side'
import type { RuleLimits, RulePoint } from '@/lib/domain/control/rule-point'
import runRules from '@/test/reference/statistics-run-rules.json'

const limits: RuleLimits = { id: 1, centre: 0, sigma: 1, lower: -3, upper: 3 }
const chart = (values: readonly (number | undefined)[], own: RuleLimits = limits): readonly RulePoint[] =>
  values.map((value) => ({ value, leftOut: false, limits: own }))
const repeat = (value: number, n: number): number[] => Array.from({ length: n }, () => value)

describe('nineOnOneSide(points)', () => {
  it('is completed by the ninth and goes on as one event', () => {
    expect(nineOnOneSide(chart(repeat(0.5, 8)))).toEqual([])
    expect(nineOnOneSide(chart(repeat(0.5, 9)))).toEqual([
      { side: 'above', members: [0, 1, 2, 3, 4, 5, 6, 7, 8], completedAt: 8 },
    ])
    const longer = nineOnOneSide(chart([...repeat(-0.5, 12), 0.1]))
    expect(longer).toHaveLength(1)
    expect(longer[0]).toMatchObject({ side: 'below', completedAt: 8 })
    expect(longer[0]?.members).toHaveLength(12)
  })

  it('is ended by a lot on the centre line, not by a missing one', () => {
    expect(nineOnOneSide(chart([...repeat(1, 5), 0, ...repeat(1, 4)]))).toEqual([])
    expect(nineOnOneSide(chart([...repeat(1, 5), 1e-12, ...repeat(1, 4)]))).toEqual([])
    const gap = nineOnOneSide(chart([...repeat(1, 5), undefined, ...repeat(1, 4)]))
    expect(gap[0]?.members).toEqual([0, 1, 2, 3, 4, 6, 7, 8, 9])
  })

  it('is ended by a lot left out and by a change of limit set', () => {
    const leftOut = chart(repeat(1, 10)).map((point, index) => ({ ...point, leftOut: index === 4 }))
    expect(nineOnOneSide(leftOut)).toEqual([])
    const changed = [...chart(repeat(1, 5)), ...chart(repeat(1, 5), { ...limits, id: 2 })]
    expect(nineOnOneSide(changed)).toEqual([])
  })
})

describe('beyondTheLimits(points)', () => {
  it('is strict, with a guard for the last binary digit', () => {
    // Source: the guard case of the statistics page: (10.4 − 10.1)/0.1 exceeds 3 in binary.
    const grid: RuleLimits = { id: 1, centre: 10.1, sigma: 0.1, lower: 10.1 - 3 * 0.1, upper: 10.1 + 3 * 0.1 }
    expect(beyondTheLimits(chart([10.4], grid))).toEqual([])
    expect(beyondTheLimits(chart([10.4001], grid))).toEqual([{ side: 'above', members: [0], completedAt: 0 }])
  })

  it('joins neighbours beyond the same limit into one event', () => {
    const events = beyondTheLimits(chart([4, 5, undefined, 4, 0, -4, 4]))
    expect(events.map(({ side, members }) => [side, ...members])).toEqual([
      ['above', 0, 1, 3],
      ['below', 5],
      ['above', 6],
    ])
  })

  it('has no lower side without a lower limit', () => {
    const { lower: _, ...oneSided } = limits
    expect(beyondTheLimits(chart([-9, 9], oneSided)).map(({ side }) => side)).toEqual(['above'])
  })
})

describe('findSignals(points)', () => {
  it('lists events in the order of completion, with the mean departure', () => {
    const found = findSignals(chart([...repeat(1, 8), 4, 1]))
    expect(found.map(({ completedAt, departure, rule }) => [rule, completedAt, departure])).toEqual([
      ['beyond-the-limits', 8, 4],
      ['nine-on-one-side', 8, (9 + 4) / 10],
    ])
  })

  it('says nothing without limits, without lots, or when all are equal to the centre', () => {
    expect(findSignals([])).toEqual([])
    expect(findSignals(chart(repeat(0, 30)))).toEqual([])
    expect(findSignals(chart(repeat(9, 30)).map((point) => ({ ...point, limits: undefined })))).toEqual([])
  })

  it('agrees with a slow twin that looks at every window of nine', () => {
    const value = fc.oneof(
      fc.constant(0),
      fc.double({ min: -2, max: 2, noNaN: true }),
      fc.constant(undefined),
    )
    fc.assert(
      fc.property(fc.array(value, { maxLength: 60 }), (values) => {
        const inNine = new Set<number>()
        const kept = values.flatMap((one, index) => (one === undefined ? [] : [{ one, index }]))
        for (let start = 0; start + 9 <= kept.length; start += 1) {
          const nine = kept.slice(start, start + 9)
          if (nine.every(({ one }) => one > 1e-9) || nine.every(({ one }) => one < -1e-9))
            for (const { index } of nine) inNine.add(index)
        }
        const found = new Set(nineOnOneSide(chart(values)).flatMap(({ members }) => members))
        expect([...found].sort((a, b) => a - b)).toEqual([...inNine].sort((a, b) => a - b))
      }),
    )
  })

  it('agrees with the reference cases of the two rules, a gap ending or not ending a run', () => {
    const own: RuleLimits = { id: 1, centre: 0, sigma: 1 }
    let tried = 0
    for (const one of runRules) {
      const { center, rule, sigma, x } = one.inputs as {
        rule?: number
        center: number
        sigma: number
        x: (number | null)[]
      }
      const find = rule === 1 ? beyondTheLimits : rule === 2 ? nineOnOneSide : undefined
      if (one.quantity !== 'run-rule' || !find) continue
      const of: RuleLimits = {
        ...own,
        centre: center,
        sigma,
        lower: center - 3 * sigma,
        upper: center + 3 * sigma,
      }
      const points = (gapEnds: boolean): readonly RulePoint[] =>
        x.map((value) => ({ value: value ?? undefined, leftOut: gapEnds && value === null, limits: of }))
      // A signal at the point that completes the pattern and at each later one that still satisfies it.
      const signals = (gapEnds: boolean) =>
        find(points(gapEnds)).flatMap(({ completedAt, members }) =>
          members.filter((index) => index >= completedAt).map((index) => index + 1),
        )
      const expected = one.expected as { signals: number[]; signals_gap_skipped?: number[] }
      expect(signals(true), one.id).toEqual(expected.signals)
      expect(signals(false), one.id).toEqual(expected.signals_gap_skipped ?? expected.signals)
      tried += 1
    }
    expect(tried).toBe(6)
  })
})
