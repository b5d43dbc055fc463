import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { sampleStandardDeviationOf, summariseLot } from '@/lib/domain/quality/lot-summary'
import { deepFreeze } from '@/test/support/deep-freeze'

describe('summariseLot(estimates)', () => {
  const estimate = (value: number) => ({ value, u: Math.sqrt(0.13 * 0.13 + 0.1 * 0.1), uCommon: 0.13 })

  it('keeps the common part and divides the random one: 0.13 and 0.10 over five give 0.137', () => {
    // Source: the worked example of the decision rule, common practice, no source.
    const summary = summariseLot([1.7, 1.9, 1.8, 1.75, 1.85].map(estimate))
    expect(summary?.mean).toBeCloseTo(1.8, 14)
    expect(summary?.uMean).toBeCloseTo(Math.sqrt(0.13 * 0.13 + 0.01 / 5), 14)
    expect(summary?.m2).toBeCloseTo(0.025, 14)
  })

  it('keeps its digits far from zero', () => {
    const summary = summariseLot([1, 2, 3].map((x) => ({ value: 1e12 + x, u: 1, uCommon: 0 })))
    expect(summary && sampleStandardDeviationOf(summary)).toBe(1)
  })

  it('is undefined for none, and has no spread for one', () => {
    expect(summariseLot([])).toBeUndefined()
    const one = summariseLot([estimate(1)])
    expect(one && sampleStandardDeviationOf(one)).toBeUndefined()
  })

  it('says the same as two passes over the values, whatever their order', () => {
    const some = fc.array(fc.double({ min: -50, max: 50, noNaN: true }), { minLength: 2, maxLength: 8 })
    fc.assert(
      fc.property(some, (values) => {
        const summary = summariseLot(values.map(estimate))
        const mean = values.reduce((a, b) => a + b) / values.length
        const squares = values.reduce((sum, x) => sum + (x - mean) ** 2, 0)
        expect(summary?.mean).toBeNear(mean, { absolute: 1e-11 })
        expect(summary?.m2).toBeNear(squares, { absolute: 1e-9 })
        expect([summary?.min, summary?.max]).toEqual([Math.min(...values), Math.max(...values)])
        const turned = summariseLot([...values].reverse().map(estimate))
        expect(turned?.mean).toBeNear(mean, { absolute: 1e-11 })
        expect(turned?.uMean).toBeNear(summary?.uMean ?? 0, { relative: 1e-12 })
      }),
    )
  })

  it('does not touch what it is given', () => {
    const frozen = deepFreeze([estimate(1), estimate(2)])
    expect(summariseLot(frozen)?.n).toBe(2)
  })

  it('has no spread for equal specimens', () => {
    const equal = summariseLot([0.1, 0.1, 0.1].map(estimate))
    expect(equal?.m2).toBe(0)
    expect(equal && sampleStandardDeviationOf(equal)).toBe(0)
  })
})
