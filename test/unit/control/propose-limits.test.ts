import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { individualsLimits } from '@/lib/domain/control/individuals-chart'
import { type BaselineLot, proposeLimits } from '@/lib/domain/control/propose-limits'
import { meanOfSpread } from '@/lib/domain/control/spread-constants'
import individuals from '@/test/reference/statistics-individuals.json'

const lots = (values: readonly number[], leftOut: readonly number[] = []): readonly BaselineLot[] =>
  values.map((value, index) => ({
    lotId: index + 1,
    code: `L-${index + 1}`,
    value,
    n: 5,
    leftOut: leftOut.includes(index),
  }))

describe('meanOfSpread(n)', () => {
  it.each([
    [2, 0.7978845608028654],
    [5, 0.9399856029866254],
    [25, 0.9896403755857028],
  ])('c4(%i) = %f', (n, c4) => {
    // Source: ASTM E2587 table to four digits; more digits from the definition, statistics-constants.json.
    expect(meanOfSpread(n)).toBeCloseTo(c4, 14)
  })

  it('throws below two', () => {
    expect(() => meanOfSpread(1)).toThrow(RangeError)
  })
})

describe('individualsLimits(values)', () => {
  it('agrees with the reference individuals charts', () => {
    let tried = 0
    for (const { expected, id, inputs } of individuals) {
      const limits = individualsLimits(inputs.x)
      // The printed example rounds d2 to 1.128; its limits differ in the fourth digit.
      const digits = id.endsWith('-pub') ? 2 : 10
      expect(limits?.centre, id).toBeCloseTo(expected.center, digits)
      expect(limits?.meanMovingRange, id).toBeCloseTo(expected.mrbar, id.endsWith('-pub') ? 4 : 10)
      expect(limits?.upper, id).toBeCloseTo(expected.ucl, digits)
      expect(limits?.lower, id).toBeCloseTo(expected.lcl, digits)
      tried += 1
    }
    expect(tried).toBe(3)
  })

  it('takes no range across a gap, and is undefined without neighbours', () => {
    expect(individualsLimits([1, undefined, 3])).toBeUndefined()
    expect(individualsLimits([1, 2, undefined, 9, 8])?.meanMovingRange).toBe(1)
    expect(individualsLimits([])).toBeUndefined()
  })
})

describe('proposeLimits(lots, statistic, oneSided)', () => {
  it('refuses fewer than twenty lots and lots that do not vary', () => {
    expect(proposeLimits(lots(Array.from({ length: 19 }, (_, i) => i % 3)), 'mean', false)).toMatchObject({
      ok: false,
      problems: [{ message: 'Control limits need at least 20 lots; 19 are in the baseline.' }],
    })
    expect(proposeLimits(lots(Array.from({ length: 30 }, () => 7)), 'mean', false).ok).toBe(false)
  })

  it('is provisional below sixty, and says so when neighbours are alike', () => {
    const drifting = proposeLimits(lots(Array.from({ length: 59 }, (_, i) => i)), 'mean', false)
    expect(drifting.ok && drifting.value.provisional).toBe(true)
    expect(drifting.ok && drifting.value.advice[0]).toMatch(/^Neighbouring lots are alike/)
    const settled = proposeLimits(
      lots(Array.from({ length: 60 }, (_, i) => ((i * 7) % 11) - 5)),
      'mean',
      false,
    )
    expect(settled.ok && settled.value.provisional).toBe(false)
  })

  it('does not let a lot that is left out move the limits, nor the distance across it', () => {
    const values = Array.from({ length: 40 }, (_, i) => (i % 2 === 0 ? 1 : -1))
    const wild = values.map((value, index) => (index === 17 ? 500 : value))
    const proposal = proposeLimits(lots(wild, [17]), 'mean', false)
    expect(proposal.ok && proposal.value.sigma).toBeCloseTo(2 / (2 / Math.sqrt(Math.PI)), 12)
    expect(proposal.ok && proposal.value.lotCount).toBe(39)
  })

  it('lists baseline lots beyond the limits without leaving them out', () => {
    const values = Array.from({ length: 40 }, (_, i) => (i === 20 ? 12 : i % 2))
    const proposal = proposeLimits(lots(values), 'mean', false)
    expect(proposal.ok && proposal.value.beyond.map((lot) => lot.code)).toEqual(['L-21'])
  })

  it('has no lower limit for one-sided characteristics and for the spread: B4(5) = 2.089', () => {
    const values = Array.from({ length: 30 }, (_, i) => 1 + (i % 5) / 10)
    const ovality = proposeLimits(lots(values), 'mean', true)
    expect(ovality.ok && ovality.value.lower).toBeUndefined()
    const spread = proposeLimits(lots(values), 'within-lot-sd', true)
    // Source: ASTM E2587, B4 for n = 5.
    expect(spread.ok && spread.value.upper / spread.value.centre).toBeCloseTo(2.089, 3)
  })

  it('moves with the values: shift and scale', () => {
    const value = fc.double({ min: -10, max: 10, noNaN: true })
    fc.assert(
      fc.property(fc.array(value, { minLength: 25, maxLength: 80 }), value, (values, shift) => {
        const one = proposeLimits(lots(values), 'mean', false)
        const two = proposeLimits(lots(values.map((x) => 2 * x + shift)), 'mean', false)
        if (!one.ok || !two.ok) return
        expect(two.value.centre).toBeCloseTo(2 * one.value.centre + shift, 9)
        expect(two.value.sigma).toBeCloseTo(2 * one.value.sigma, 9)
      }),
    )
  })
})

describe('proposeLimits(…) where neighbouring lots are alike', () => {
  /** Slow waves: each value close to the one before. */
  const slow = Array.from({ length: 48 }, (_, index) => 10 + Math.sin(index / 4))

  it('takes the spread from all lots and asks for no runs, by itself, and says so', () => {
    const proposal = proposeLimits(lots(slow), 'mean', false)
    if (!proposal.ok) throw new Error('refused')
    const { advice, alike, rules, sigma, sigmaEstimator } = proposal.value
    expect({ alike, rules, sigmaEstimator }).toEqual({
      alike: true,
      rules: ['beyond-the-limits'],
      sigmaEstimator: 'overall standard deviation',
    })
    const mean = slow.reduce((sum, value) => sum + value, 0) / slow.length
    const squares = slow.reduce((sum, value) => sum + (value - mean) ** 2, 0)
    expect(sigma).toBeCloseTo(Math.sqrt(squares / 47), 12)
    expect(advice[0]).toContain('would be too narrow and cry wolf')
    expect(advice[1]).toContain('runs on one side are not asked for')
  })

  it('leaves it to a person to say otherwise', () => {
    const proposal = proposeLimits(lots(slow), 'mean', false, false)
    expect(proposal).toMatchObject({
      ok: true,
      value: {
        alike: false,
        rules: ['beyond-the-limits', 'nine-on-one-side'],
        sigmaEstimator: 'moving-range mean',
      },
    })
  })
})
