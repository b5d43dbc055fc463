import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { judgeSpecimen } from '@/lib/domain/quality/judge-specimen'

const number = fc.double({ min: -100, max: 100, noNaN: true })
const positive = fc.double({ min: 1e-6, max: 10, noNaN: true })

describe('judgeSpecimen(value, limits, r)', () => {
  it('is inside beyond the guard band, outside beyond it on the other side, not proven between', () => {
    const limits = { lower: -2, upper: 2 }
    expect(judgeSpecimen({ value: 1.5, u: 0.25 }, limits, 1)).toBe('inside')
    expect(judgeSpecimen({ value: 1.51, u: 0.25 }, limits, 1)).toBe('not proven')
    expect(judgeSpecimen({ value: 2.5, u: 0.25 }, limits, 1)).toBe('not proven')
    expect(judgeSpecimen({ value: 2.51, u: 0.25 }, limits, 1)).toBe('outside')
  })

  it('lets the tolerance alone decide with r = 0', () => {
    fc.assert(
      fc.property(number, positive, (value, u) => {
        expect(judgeSpecimen({ value, u }, { upper: 2 }, 0)).toBe(value <= 2 ? 'inside' : 'outside')
      }),
    )
  })

  it('goes from inside through not proven to outside as the value leaves, and never back', () => {
    const ranks = ['inside', 'not proven', 'outside']
    fc.assert(
      fc.property(number, positive, positive, fc.constantFrom(0 as const, 1 as const), (y, u, step, r) => {
        const limits = { lower: -2, upper: 2 }
        const near = judgeSpecimen({ value: Math.abs(y), u }, limits, r)
        const far = judgeSpecimen({ value: Math.abs(y) + step, u }, limits, r)
        expect(ranks.indexOf(far)).toBeGreaterThanOrEqual(ranks.indexOf(near))
        // The tolerance is symmetric.
        expect(judgeSpecimen({ value: -Math.abs(y), u }, limits, r)).toBe(near)
      }),
    )
  })

  it('is inside without any limit', () => {
    expect(judgeSpecimen({ value: 1e9, u: 1 }, {}, 1)).toBe('inside')
  })
})
