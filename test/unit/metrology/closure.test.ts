import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { closureVerdict, normalisedError } from '@/lib/domain/metrology/closure'

describe('closureVerdict(closure, u)', () => {
  it('is closed to a normalised error of 1, doubtful to 1.5, open above', () => {
    expect(closureVerdict(0.002, 0.001)).toBe('closed')
    expect(closureVerdict(-0.003, 0.001)).toBe('doubtful')
    expect(closureVerdict(0.00301, 0.001)).toBe('open')
  })

  it('does not depend on the sign, and never gets better as the closure grows', () => {
    const ranks = ['closed', 'doubtful', 'open']
    const size = fc.double({ min: 0, max: 0.1, noNaN: true })
    fc.assert(
      fc.property(size, size, fc.double({ min: 1e-5, max: 0.01, noNaN: true }), (a, b, u) => {
        expect(closureVerdict(-a, u)).toBe(closureVerdict(a, u))
        const [lesser, greater] = [closureVerdict(Math.min(a, b), u), closureVerdict(Math.max(a, b), u)]
        expect(ranks.indexOf(greater)).toBeGreaterThanOrEqual(ranks.indexOf(lesser))
      }),
    )
  })
})

describe('normalisedError(closure, u)', () => {
  it('is the closure over U = 2u', () => {
    expect(normalisedError(0.003, 0.001)).toBeNear(1.5, { relative: 1e-15 })
  })

  it('throws without an uncertainty', () => {
    expect(() => normalisedError(0.1, 0)).toThrow(/standard uncertainty 0/)
  })
})
