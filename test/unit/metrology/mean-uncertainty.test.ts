import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { correlationOfSpecimens, meanUncertainty } from '@/lib/domain/metrology/mean-uncertainty'
import { seededNormal } from '@/test/support/seeded-random'

// Squares of anything smaller vanish; no uncertainty of a string is as small.
const part = fc.oneof(fc.constant(0), fc.double({ min: 1e-12, max: 10, noNaN: true }))

describe('meanUncertainty(n, uCommon, uRandom)', () => {
  it('does not divide the common part: n 10, 3.5e-4, 4e-4 gives 3.7216e-4', () => {
    // Source: computed with 40 digits for the check case of the mean with common uncertainty.
    expect(meanUncertainty(10, 3.5e-4, 4e-4)).toBeNear(3.721558813185679e-4, { relative: 1e-12 })
  })

  it('lies between the common part and the whole, and falls with n', () => {
    fc.assert(
      fc.property(part, part, fc.integer({ min: 1, max: 50 }), (common, random, n) => {
        const u = meanUncertainty(n, common, random)
        expect(u).toBeGreaterThanOrEqual(common * (1 - 1e-15))
        expect(u).toBeLessThanOrEqual(Math.sqrt(common * common + random * random) * (1 + 1e-15))
        expect(meanUncertainty(n + 1, common, random)).toBeLessThanOrEqual(u)
      }),
    )
  })

  it('is what a simulation of means with a common error scatters by', () => {
    const normal = seededNormal(7)
    const trials = 20_000
    let squares = 0
    for (let trial = 0; trial < trials; trial += 1) {
      const common = 0.13 * normal()
      let sum = 0
      for (let piece = 0; piece < 5; piece += 1) sum += common + 0.1 * normal()
      squares += (sum / 5) ** 2
    }
    expect(Math.sqrt(squares / trials)).toBeNear(meanUncertainty(5, 0.13, 0.1), { relative: 0.02 })
  })

  it('throws for no specimens', () => {
    expect(() => meanUncertainty(0, 1, 1)).toThrow(RangeError)
  })
})

describe('correlationOfSpecimens(uCommon, uRandom)', () => {
  it('is the share of the common variance, from 0 to 1', () => {
    expect(correlationOfSpecimens(3.5e-4, 4e-4)).toBeNear(0.4336283185840708, { relative: 1e-12 })
    expect(correlationOfSpecimens(0, 1)).toBe(0)
    expect(correlationOfSpecimens(1, 0)).toBe(1)
    expect(correlationOfSpecimens(0, 0)).toBeUndefined()
  })
})
