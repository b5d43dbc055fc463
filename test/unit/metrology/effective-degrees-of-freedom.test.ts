import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import {
  coverageFactor,
  effectiveDegreesOfFreedom,
} from '@/lib/domain/metrology/effective-degrees-of-freedom'

const infinite = Number.POSITIVE_INFINITY

describe('effectiveDegreesOfFreedom(parts)', () => {
  it('is 6.7334 for 0.9 with 4, 0.4 with 9 and 0.3 with infinitely many', () => {
    const { degrees, u } = effectiveDegreesOfFreedom([
      { u: 0.9, degrees: 4 },
      { u: 0.4, degrees: 9 },
      { u: 0.3, degrees: infinite },
    ])
    // Source: JCGM 100:2008, G.4.1, computed with 40 digits.
    expect(u).toBeNear(1.0295630140987, { relative: 1e-12 })
    expect(degrees).toBeNear(6.733407687313768, { relative: 1e-12 })
  })

  it('lies between the smallest of the parts and their sum', () => {
    const parts = fc.array(
      fc.record({
        u: fc.double({ min: 0.01, max: 10, noNaN: true }),
        degrees: fc.integer({ min: 1, max: 40 }),
      }),
      { minLength: 1, maxLength: 6 },
    )
    fc.assert(
      fc.property(parts, (list) => {
        const { degrees } = effectiveDegreesOfFreedom(list)
        expect(degrees).toBeGreaterThanOrEqual(Math.min(...list.map((one) => one.degrees)) * (1 - 1e-12))
        expect(degrees).toBeLessThanOrEqual(list.reduce((sum, one) => sum + one.degrees, 0) * (1 + 1e-12))
      }),
    )
  })

  it('is infinite for type B alone, and throws without uncertainty or degrees', () => {
    expect(effectiveDegreesOfFreedom([{ u: 1, degrees: infinite }]).degrees).toBe(infinite)
    expect(() => effectiveDegreesOfFreedom([])).toThrow(RangeError)
    expect(() => effectiveDegreesOfFreedom([{ u: 1, degrees: 0 }])).toThrow(RangeError)
  })
})

describe('coverageFactor(degrees, coverage, truncated)', () => {
  it('is 1.96 for infinitely many, larger for few, and cuts to whole numbers by default', () => {
    expect(coverageFactor(infinite)).toBeNear(1.959963984540054, { relative: 1e-12 })
    // Source: table G.2 of JCGM 100:2008 prints 2.10 for 18 and 2.09 for 19.
    expect(coverageFactor(18.9987)).toBeNear(2.10092204024096, { relative: 1e-10 })
    expect(coverageFactor(18.9987, 0.95, false)).toBeLessThan(coverageFactor(18.9987))
  })
})
