import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { cos, cosh, exp, ln, sin, sinh } from '@/lib/domain/units/elementary'

// Expected values were computed with 40 digits by an independent program.
describe('ln(x)', () => {
  it.each([
    [2, Math.LN2],
    [10, Math.LN10],
    [1, 0],
    [0.5, -Math.LN2],
    [1.0000000001, 1.000000082690371e-10],
    [4, 1.3862943611198906],
    [5e-324, -744.4400719213812],
    [1.7976931348623157e308, 709.782712893384],
  ])('ln %d is %d', (x, value) => {
    expect(ln(x)).toBeNear(value, { relative: 4e-16, absolute: 0 })
  })

  it('follows IEEE 754 at the edges', () => {
    expect(ln(0)).toBe(Number.NEGATIVE_INFINITY)
    expect(ln(-1)).toBeNaN()
    expect(ln(Number.NaN)).toBeNaN()
    expect(ln(Number.POSITIVE_INFINITY)).toBe(Number.POSITIVE_INFINITY)
  })

  it('agrees with the engine’s own within two units in the last place', () => {
    fc.assert(
      fc.property(fc.double({ min: 1e-300, max: 1e300, noNaN: true }), (x) => {
        expect(ln(x)).toBeNear(Math.log(x), { relative: 4.5e-16, absolute: 1e-300 })
      }),
      { numRuns: 2000 },
    )
  })

  it('keeps its digits close to 1, where closures live', () => {
    fc.assert(
      fc.property(fc.double({ min: -0.3, max: 0.4, noNaN: true }), (d) => {
        expect(ln(1 + d)).toBeNear(Math.log(1 + d), { relative: 4.5e-16, absolute: 1e-300 })
      }),
      { numRuns: 2000 },
    )
  })
})

describe('exp(x)', () => {
  it.each([
    [0, 1],
    [1, Math.E],
    [-1, 0.36787944117144233],
    [0.5, 1.6487212707001282],
    [10, 22026.465794806718],
    [709.7, 1.6549840276802644e308],
    [-745.1, 5e-324],
  ])('e^%d is %d', (x, value) => {
    expect(exp(x)).toBeNear(value, { relative: 4.5e-16 })
  })

  it('follows IEEE 754 at the edges', () => {
    expect(exp(711)).toBe(Number.POSITIVE_INFINITY)
    expect(exp(Number.NEGATIVE_INFINITY)).toBe(0)
    expect(exp(Number.NaN)).toBeNaN()
  })

  it('undoes ln', () => {
    fc.assert(
      fc.property(fc.double({ min: 1e-6, max: 1e6, noNaN: true }), (x) => {
        expect(exp(ln(x))).toBeNear(x, { relative: 4e-15 })
      }),
    )
  })

  it('agrees with the engine’s own within two units in the last place', () => {
    fc.assert(
      fc.property(fc.double({ min: -700, max: 700, noNaN: true }), (x) => {
        expect(exp(x)).toBeNear(Math.exp(x), { relative: 4.5e-16 })
      }),
      { numRuns: 2000 },
    )
  })
})

describe('sin(x), cos(x)', () => {
  it('agree with the engine’s own, near the zeros too', () => {
    fc.assert(
      fc.property(fc.double({ min: -1000, max: 1000, noNaN: true }), (x) => {
        expect(sin(x)).toBeNear(Math.sin(x), { relative: 4.5e-16, absolute: 2.3e-16 })
        expect(cos(x)).toBeNear(Math.cos(x), { relative: 4.5e-16, absolute: 2.3e-16 })
      }),
      { numRuns: 2000 },
    )
    for (let k = 1; k <= 300; k += 1)
      expect(sin(k * Math.PI)).toBeNear(Math.sin(k * Math.PI), { relative: 1e-9 })
  })

  it('throw beyond 1e6 radians', () => {
    expect(() => sin(1.1e6)).toThrow(RangeError)
    expect(() => cos(Number.NaN)).toThrow(RangeError)
  })
})

describe('sinh(x), cosh(x)', () => {
  it('agree with the engine’s own', () => {
    fc.assert(
      fc.property(fc.double({ min: -50, max: 50, noNaN: true }), (x) => {
        expect(sinh(x)).toBeNear(Math.sinh(x), { relative: 2e-15, absolute: 1e-300 })
        expect(cosh(x)).toBeNear(Math.cosh(x), { relative: 2e-15 })
      }),
      { numRuns: 2000 },
    )
  })
})
