import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { closureVerdict, normalisedError } from '@/lib/domain/metrology/closure'
import { meanUncertainty } from '@/lib/domain/metrology/mean-uncertainty'
import { type ModelInput, propagate } from '@/lib/domain/metrology/propagate'
import { resolutionUncertainty, standardUncertaintyFromBounds } from '@/lib/domain/metrology/type-b'

const input = (id: string, value: number, u: number, common = false): ModelInput => ({
  id,
  name: id,
  value,
  u,
  unit: '',
  type: 'B',
  distribution: 'normal',
  common,
})

describe('propagate(inputs, model)', () => {
  it('adds independent contributions in quadrature and keeps the common part apart', () => {
    const { y } = propagate([input('a', 3, 0.3, true), input('b', 5, 0.4)], ({ a = 0, b = 0 }) => ({
      y: a + b,
    }))
    expect(y?.estimate.value).toBe(8)
    expect(y?.estimate.u).toBeCloseTo(0.5, 14)
    expect(y?.estimate.uCommon).toBeCloseTo(0.3, 14)
  })

  it('treats results that share an input as a whole: their difference is free of it', () => {
    const { d } = propagate([input('a', 3, 0.3), input('b', 5, 0.4)], ({ a = 0, b = 0 }) => ({
      d: a + b - a,
    }))
    expect(d?.estimate.u).toBeCloseTo(0.4, 12)
  })

  it('agrees with the analytic law for products of powers', () => {
    const positive = fc.double({ min: 0.5, max: 50, noNaN: true })
    fc.assert(
      fc.property(positive, positive, (a, b) => {
        const ua = a * 1e-4
        const ub = b * 2e-4
        const { y } = propagate([input('a', a, ua), input('b', b, ub)], ({ a: x = 0, b: z = 0 }) => ({
          y: (x * x) / z,
        }))
        const expected = ((a * a) / b) * Math.sqrt(4 * 1e-8 + 4e-8)
        expect(Math.abs((y?.estimate.u ?? 0) / expected - 1)).toBeLessThan(1e-6)
      }),
    )
  })

  it('leaves out a result that the model cannot give', () => {
    const model = ({ a = 0 }): { y?: number } => (a > 10 ? { y: a } : {})
    expect(propagate([input('a', 3, 0.3)], model)).toEqual({})
  })
})

describe('meanUncertainty(n, uCommon, uRandom)', () => {
  it('does not divide the common part: n 10, 3.5e-4, 4e-4 gives 3.7216e-4', () => {
    // Source: computed for physics.json, mean-with-common-uncertainty.
    expect(meanUncertainty(10, 3.5e-4, 4e-4)).toBeCloseTo(3.721558813e-4, 12)
  })

  it('throws for no specimens', () => {
    expect(() => meanUncertainty(0, 1, 1)).toThrow(RangeError)
  })
})

describe('closure', () => {
  it('is closed to a normalised error of 1, doubtful to 1.5, open above', () => {
    expect(closureVerdict(0.002, 0.001)).toBe('closed')
    expect(closureVerdict(-0.003, 0.001)).toBe('doubtful')
    expect(closureVerdict(0.00301, 0.001)).toBe('open')
  })

  it('throws without an uncertainty', () => {
    expect(() => normalisedError(0.1, 0)).toThrow(/standard uncertainty 0/)
  })
})

describe('type B', () => {
  it('takes a half-width over √3 or √6, a step over √12', () => {
    // Source: JCGM 100:2008, 4.3.7, 4.3.9, F.2.2.1.
    expect(standardUncertaintyFromBounds(0.0005)).toBeCloseTo(0.0002886751345948129, 18)
    expect(standardUncertaintyFromBounds(6, 'triangular')).toBeCloseTo(2.449489742783178, 14)
    expect(resolutionUncertainty(1)).toBeCloseTo(1 / Math.sqrt(12), 15)
    expect(() => standardUncertaintyFromBounds(-1)).toThrow(RangeError)
  })
})
