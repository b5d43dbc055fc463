import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import {
  coverageOfRectangularSum,
  halfWidthOfRectangularSum,
} from '@/lib/domain/metrology/sum-of-rectangulars'
import { seededUniform } from '@/test/support/seeded-random'

describe('coverageOfRectangularSum(halfWidths, x)', () => {
  it('is the share of what is drawn', () => {
    const uniform = seededUniform(17)
    const widths = [1, 0.4, 2.5]
    const n = 100_000
    let inside = 0
    for (let count = 0; count < n; count += 1) {
      const sum = widths.reduce((total, a) => total + a * (2 * uniform() - 1), 0)
      if (Math.abs(sum) <= 1.7) inside += 1
    }
    expect(inside / n).toBeNear(coverageOfRectangularSum(widths, 1.7), { absolute: 0.005 })
  })

  it('grows from 0 to 1', () => {
    const widths = fc.array(fc.double({ min: 0.1, max: 3, noNaN: true }), { minLength: 1, maxLength: 6 })
    fc.assert(
      fc.property(widths, fc.double({ min: 0, max: 1, noNaN: true }), (list, share) => {
        const reach = list.reduce((sum, a) => sum + a, 0)
        const there = coverageOfRectangularSum(list, share * reach)
        expect(there).toBeGreaterThanOrEqual(-1e-9)
        expect(coverageOfRectangularSum(list, reach)).toBeNear(1, { absolute: 1e-9 })
        expect(coverageOfRectangularSum(list, reach * (0.5 + share / 2))).toBeGreaterThanOrEqual(there - 1e-9)
      }),
    )
  })
})

describe('halfWidthOfRectangularSum(halfWidths, coverage)', () => {
  it('is 3.88 for four of standard deviation 1, where a normal one would need 3.92', () => {
    // Source: JCGM 101:2008, 9.2.3.
    const four = [1, 1, 1, 1].map(() => Math.sqrt(3))
    expect(halfWidthOfRectangularSum(four, 0.95)).toBeNear(3.879406741347821, { relative: 1e-9 })
  })

  it('is p times the half-width of a single one', () => {
    expect(halfWidthOfRectangularSum([2], 0.95)).toBeNear(1.9, { relative: 1e-12 })
  })

  it('throws outside 0 … 1 and without rectangles', () => {
    expect(() => halfWidthOfRectangularSum([1], 1)).toThrow(RangeError)
    expect(() => halfWidthOfRectangularSum([], 0.5)).toThrow(RangeError)
    expect(() => coverageOfRectangularSum([1, 0], 0.5)).toThrow(RangeError)
  })
})
