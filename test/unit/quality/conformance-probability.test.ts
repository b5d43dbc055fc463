import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { conformanceProbability } from '@/lib/domain/quality/conformance-probability'

const number = fc.double({ min: -100, max: 100, noNaN: true })
const positive = fc.double({ min: 1e-6, max: 10, noNaN: true })

describe('conformanceProbability(y, u, limits)', () => {
  it('has a probability between 0 and 1 that falls as the mean leaves', () => {
    fc.assert(
      fc.property(number, positive, positive, (y, u, step) => {
        const near = conformanceProbability(y, u, { upper: 2 })
        const far = conformanceProbability(y + step, u, { upper: 2 })
        expect(near).toBeGreaterThanOrEqual(far)
        expect(near).toBeLessThanOrEqual(1)
        expect(far).toBeGreaterThanOrEqual(0)
      }),
    )
  })

  it('is 0.9192 for −5.47 ± 0.05 below −5.4, and 0.6626 between two limits', () => {
    // Source: examples of JCGM 106:2012 as remembered, computed with 40 digits.
    expect(conformanceProbability(-5.47, 0.05, { upper: -5.4 })).toBeNear(0.9192433407662272, {
      relative: 1e-10,
    })
    expect(conformanceProbability(13.6, 1.8, { lower: 12.5, upper: 16.3 })).toBeNear(0.6626297864953078, {
      relative: 1e-10,
    })
  })

  it('is certain without uncertainty and without limits', () => {
    expect(conformanceProbability(2, 0, { upper: 2 })).toBe(1)
    expect(conformanceProbability(2.1, 0, { upper: 2 })).toBe(0)
    expect(conformanceProbability(2.1, 3, {})).toBe(1)
  })
})
