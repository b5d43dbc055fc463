import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { judgeLot } from '@/lib/domain/quality/judge-lot'

describe('judgeLot(…)', () => {
  const summary = { n: 5, mean: 1.8, m2: 0.025, min: 1.7, max: 1.9, uCommon: 0.13, uMean: Math.sqrt(0.0189) }

  it('finds the worked example not proven, with probability 0.927', () => {
    const judgement = judgeLot('massPerMetreWeighed', summary, { lower: -2, upper: 2 }, 1, 1.5)
    expect(judgement.u).toBeCloseTo(0.137, 3)
    expect(judgement.probability).toBeCloseTo(0.927, 3)
    expect(judgement.verdict).toBe('not proven')
  })

  it('is not proven when the spread fails the acceptance constant though the mean is inside', () => {
    const wide = { ...summary, mean: 0, m2: 4 * 1.44, uMean: 0.01 }
    const judgement = judgeLot('diameter', wide, { lower: -2, upper: 2 }, 0, 2)
    expect(judgement.quality).toBeCloseTo(2 / 1.2, 12)
    expect(judgement.accepted).toBe(false)
    expect(judgement.verdict).toBe('not proven')
    expect(judgement.largestSpread).toBe(1)
  })

  it('accepts a lot of equal specimens inside, and says nothing of the spread of one', () => {
    const equal = { ...summary, mean: 1, m2: 0 }
    expect(judgeLot('diameter', equal, { upper: 2 }, 0, 2).verdict).toBe('inside')
    expect(judgeLot('diameter', { ...equal, n: 1 }, { upper: 2 }, 0, 2).accepted).toBeUndefined()
    expect(judgeLot('diameter', { ...equal, n: 1 }, { upper: 2 }, 0, 2).verdict).toBe('not proven')
  })

  it('asks for room to both limits: the nearer one decides', () => {
    const off = { ...summary, mean: 1.2, m2: 4 * 0.25, uMean: 0.01 }
    const judgement = judgeLot('diameter', off, { lower: -2, upper: 2 }, 0, 1.5)
    expect(judgement.quality).toBeCloseTo(1.6, 12)
    expect(judgement.verdict).toBe('inside')
    expect(judgeLot('diameter', { ...off, mean: -1.2 }, { lower: -2, upper: 2 }, 0, 1.5).quality).toBeCloseTo(
      1.6,
      12,
    )
  })

  it('never calls a lot inside whose mean is nearer to a limit than its guard band', () => {
    const size = fc.double({ min: 0.001, max: 2, noNaN: true })
    fc.assert(
      fc.property(fc.double({ min: -3, max: 3, noNaN: true }), size, size, (mean, uMean, s) => {
        const lot = { n: 5, mean, m2: 4 * s * s, min: mean, max: mean, uCommon: uMean, uMean }
        const judged = judgeLot('tension', lot, { lower: -2, upper: 2 }, 1, 1.5)
        if (judged.verdict === 'inside') {
          expect(2 - Math.abs(mean)).toBeGreaterThanOrEqual(2 * uMean)
          expect(judged.accepted).toBe(true)
          expect(s).toBeLessThanOrEqual((judged.largestSpread ?? 0) * (1 + 1e-12))
          expect(judged.probability).toBeGreaterThan(0.95)
        }
      }),
    )
  })
})
