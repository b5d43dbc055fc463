import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { conformanceProbability } from '@/lib/domain/quality/conformance-probability'
import { guardBand, guardBandForProbability, measurementCapability } from '@/lib/domain/quality/guard-band'
import { judgeSpecimen } from '@/lib/domain/quality/judge-specimen'

describe('guardBand(limits, u, factor)', () => {
  it('takes r·2u off each side that has a limit', () => {
    expect(guardBand({ lower: -2, upper: 2 }, 0.25, 1)).toEqual({
      width: 0.5,
      factor: 1,
      accept: { lower: -1.5, upper: 1.5 },
    })
    expect(guardBand({ upper: 2 }, 0.25, 0).accept).toEqual({ upper: 2 })
  })

  it('accepts just what a specimen is judged inside by', () => {
    fc.assert(
      fc.property(
        fc.double({ min: -3, max: 3, noNaN: true }),
        fc.double({ min: 0.001, max: 0.9, noNaN: true }),
        (value, u) => {
          const limits = { lower: -2, upper: 2 }
          const { lower = 0, upper = 0 } = guardBand(limits, u, 1).accept
          // Rounding may decide on the boundary itself.
          fc.pre(Math.min(Math.abs(value - lower), Math.abs(value - upper)) > 1e-12)
          expect(judgeSpecimen({ value, u }, limits, 1) === 'inside').toBe(value >= lower && value <= upper)
        },
      ),
    )
  })
})

describe('guardBandForProbability(limits, u, p)', () => {
  it('leaves a value just accepted with that probability', () => {
    fc.assert(
      fc.property(fc.double({ min: 0.55, max: 0.999, noNaN: true }), (p) => {
        const { accept } = guardBandForProbability({ upper: 10 }, 0.3, p)
        expect(conformanceProbability(accept.upper ?? 0, 0.3, { upper: 10 })).toBeNear(p, { absolute: 1e-10 })
      }),
    )
  })

  it('throws outside 0 … 1', () => {
    expect(() => guardBandForProbability({ upper: 1 }, 0.1, 1)).toThrow(RangeError)
  })
})

describe('measurementCapability(limits, u)', () => {
  it('is the tolerance over 4u', () => {
    expect(measurementCapability({ lower: 9.9, upper: 10.1 }, 0.01)).toBeNear(5, { relative: 1e-12 })
  })
})
