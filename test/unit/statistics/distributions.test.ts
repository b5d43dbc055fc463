/** Tails add up, quantiles undo them, families meet where they should; numbers are checked by the reference cases. */
import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { betaQuantile, betaTails } from '@/lib/domain/statistics/beta-distribution'
import { chiSquareQuantile, chiSquareTails } from '@/lib/domain/statistics/chi-square'
import { binomialTails, poissonTails } from '@/lib/domain/statistics/counts'
import { erf } from '@/lib/domain/statistics/erf'
import { fQuantile, fTails } from '@/lib/domain/statistics/f-distribution'
import { lnGamma } from '@/lib/domain/statistics/ln-gamma'
import { lnOnePlus } from '@/lib/domain/statistics/ln-one-plus'
import { noncentralTTails } from '@/lib/domain/statistics/noncentral-t'
import { normalCdf, normalUpperTail } from '@/lib/domain/statistics/normal'
import { normalQuantile, normalUpperQuantile } from '@/lib/domain/statistics/normal-quantile'
import { tQuantile, tTails } from '@/lib/domain/statistics/student-t'
import { studentizedRangeTails } from '@/lib/domain/statistics/studentized-range'

const between = (min: number, max: number) => fc.double({ min, max, noNaN: true })
const probability = between(1e-6, 1 - 1e-6)
const freedom = between(0.5, 200)

describe('tails', () => {
  it('of every continuous distribution add up to one and move with their argument', () => {
    fc.assert(
      fc.property(between(0.01, 30), between(0.01, 3), freedom, freedom, (x, step, a, b) => {
        const families = [
          (y: number) => chiSquareTails(y, a),
          (y: number) => tTails(y - 10, a),
          (y: number) => fTails(y, a, b),
          (y: number) => betaTails(y / 40, a, b),
          (y: number) => ({ lower: normalCdf(y - 10), upper: normalUpperTail(y - 10) }),
        ]
        for (const tails of families) {
          const [here, further] = [tails(x), tails(x + step)]
          expect(Math.abs(here.lower + here.upper - 1)).toBeLessThan(1e-12)
          expect(further.lower).toBeGreaterThanOrEqual(here.lower)
          expect(further.upper).toBeLessThanOrEqual(here.upper)
        }
      }),
      { numRuns: 60 },
    )
  })

  it('keep their digits far out', () => {
    expect(normalUpperTail(10)).toBeGreaterThan(0)
    expect(normalUpperTail(10)).toBe(normalCdf(-10))
    expect(chiSquareTails(400, 4).upper).toBeGreaterThan(0)
  })

  it('of counts sum the probabilities of their values', () => {
    const choose = (n: number, k: number): number => (k === 0 ? 1 : (choose(n - 1, k - 1) * n) / k)
    const slow = [0, 1, 2, 3].reduce((sum, k) => sum + choose(12, k) * 0.2 ** k * 0.8 ** (12 - k), 0)
    expect(binomialTails(3, 12, 0.2).lower).toBeCloseTo(slow, 13)
    const poisson = [0, 1, 2].reduce((sum, k) => sum + (Math.exp(-1.5) * 1.5 ** k) / ([1, 1, 2][k] ?? 1), 0)
    expect(poissonTails(2, 1.5).lower).toBeCloseTo(poisson, 13)
  })
})

describe('quantiles', () => {
  it('undo the tails', () => {
    fc.assert(
      fc.property(probability, freedom, freedom, (p, a, b) => {
        expect(normalCdf(normalQuantile(p)) / p).toBeCloseTo(1, 9)
        expect(chiSquareTails(chiSquareQuantile(p, a), a).lower / p).toBeCloseTo(1, 7)
        expect(tTails(tQuantile(p, a), a).lower / p).toBeCloseTo(1, 7)
        expect(fTails(fQuantile(p, a, b), a, b).lower / p).toBeCloseTo(1, 6)
        expect(betaTails(betaQuantile(p, a, b), a, b).lower / p).toBeCloseTo(1, 6)
      }),
      { numRuns: 40 },
    )
  })

  it('are symmetric where the distribution is', () => {
    fc.assert(
      fc.property(between(1e-9, 0.49), freedom, (p, a) => {
        expect(normalUpperQuantile(p)).toBe(-normalQuantile(p))
        // 1 − p has lost digits of a small p, so only p away from zero is compared.
        if (p > 1e-4) expect(tQuantile(1 - p, a) / -tQuantile(p, a)).toBeCloseTo(1, 6)
      }),
      { numRuns: 40 },
    )
  })

  it.each([0, 1, -0.1, 1.1, Number.NaN])('refuse the probability %s', (p) => {
    expect(() => normalQuantile(p)).toThrow(RangeError)
    expect(() => chiSquareQuantile(p, 3)).toThrow(RangeError)
    expect(() => tQuantile(p, 3)).toThrow(RangeError)
  })
})

describe('families meet', () => {
  it('t of many degrees is normal, F of one is t squared, χ² of two is exponential', () => {
    expect(tTails(1.7, 1e9).upper).toBeCloseTo(normalUpperTail(1.7), 8)
    expect(fTails(2.3 ** 2, 1, 7).upper).toBeCloseTo(2 * tTails(2.3, 7).upper, 12)
    expect(chiSquareTails(3, 2).upper).toBeCloseTo(Math.exp(-1.5), 14)
  })

  it('noncentral t without a shift is t, the studentized range of two is t', () => {
    expect(noncentralTTails(1.3, 9, 0).upper).toBeCloseTo(tTails(1.3, 9).upper, 10)
    expect(studentizedRangeTails(2, 2, 9).upper).toBeCloseTo(2 * tTails(2 / Math.SQRT2, 9).upper, 8)
  })

  it('ln Γ(n + 1) is the logarithm of n!, erf is the normal distribution, ln(1 + e) keeps small e', () => {
    expect(lnGamma(11)).toBeCloseTo(Math.log(3_628_800), 12)
    expect(lnGamma(0.5)).toBeCloseTo(Math.log(Math.PI) / 2, 13)
    expect(erf(0.8)).toBeCloseTo(2 * normalCdf(0.8 * Math.SQRT2) - 1, 14)
    expect(lnOnePlus(1e-18)).toBe(1e-18)
  })
})
