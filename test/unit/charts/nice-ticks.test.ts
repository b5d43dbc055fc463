import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { niceTicks } from '@/lib/domain/charts/nice-ticks'

describe('niceTicks', () => {
  it('gives round values with the decimals they need', () => {
    expect(niceTicks(0, 100, 4)).toEqual({ values: [0, 20, 40, 60, 80, 100], step: 20, decimals: 0 })
    expect(niceTicks(0.07, 0.43, 4)).toEqual({ values: [0.1, 0.2, 0.3, 0.4], step: 0.1, decimals: 1 })
    expect(niceTicks(-0.3, 0.3, 3).values).toEqual([-0.2, 0, 0.2])
  })

  it('gives the one value of a range without extent, and none of what is no range', () => {
    expect(niceTicks(5, 5, 4).values).toEqual([5])
    expect(niceTicks(7, 3, 4).values).toEqual([7])
    expect(niceTicks(0, 1, 0).values).toEqual([0])
    expect(niceTicks(Number.NaN, 1, 4).values).toEqual([])
    expect(niceTicks(0, Number.POSITIVE_INFINITY, 4).values).toEqual([0])
    expect(niceTicks(Number.NEGATIVE_INFINITY, 0, 4).values).toEqual([])
  })

  it('gives the one value of a range that is too narrow to divide', () => {
    expect(niceTicks(0, 5e-324, 3).values).toEqual([0])
    expect(niceTicks(1, 1 + Number.EPSILON, 3).values).toEqual([1])
  })

  it('stays within the range, evenly, with 1, 2 or 5 times a power of ten between, about as many as asked for', () => {
    fc.assert(
      fc.property(
        fc.double({ min: -1e6, max: 1e6, noNaN: true }),
        fc.integer({ min: -9, max: 9 }),
        fc.double({ min: 1, max: 10, noNaN: true }),
        fc.integer({ min: 2, max: 12 }),
        (near, power, mantissa, count) => {
          const extent = mantissa * 10 ** power
          // A range far narrower than the spacing of numbers near it has no round values to find.
          const from = Math.abs(near) > extent * 1e8 ? 0 : near
          const { values, step, decimals } = niceTicks(from, from + extent, count)
          expect(step.toExponential(6)).toMatch(/^[125]\.000000e/)
          expect(values.length).toBeGreaterThanOrEqual(1)
          expect(values.length).toBeLessThanOrEqual(2 * count + 1)
          for (const value of values) {
            expect(value).toBeGreaterThanOrEqual(from - 1e-6 * step)
            expect(value).toBeLessThanOrEqual(from + extent + 1e-6 * step)
            expect(Number(value.toFixed(decimals))).toBe(value)
          }
          values.slice(1).forEach((value, index) => {
            expect((value - (values[index] ?? 0)) / step).toBeNear(1, { absolute: 1e-6 })
          })
        },
      ),
      { numRuns: 300, seed: 1 },
    )
  })
})
