import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { conformanceProbability, judgeLot } from '@/lib/domain/quality/judge-lot'
import { judgeSpecimen } from '@/lib/domain/quality/judge-specimen'
import { sampleStandardDeviationOf, summariseLot } from '@/lib/domain/quality/lot-summary'
import { type ProposalInput, proposeDisposition } from '@/lib/domain/quality/propose-disposition'

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
})

describe('summariseLot(estimates)', () => {
  const estimate = (value: number) => ({ value, u: Math.sqrt(0.13 * 0.13 + 0.1 * 0.1), uCommon: 0.13 })

  it('keeps the common part and divides the random one: 0.13 and 0.10 over five give 0.137', () => {
    // Source: the worked example of the decision rule, common practice, no source.
    const summary = summariseLot([1.7, 1.9, 1.8, 1.75, 1.85].map(estimate))
    expect(summary?.mean).toBeCloseTo(1.8, 14)
    expect(summary?.uMean).toBeCloseTo(Math.sqrt(0.13 * 0.13 + 0.01 / 5), 14)
    expect(summary?.m2).toBeCloseTo(0.025, 14)
  })

  it('keeps its digits far from zero', () => {
    const summary = summariseLot([1, 2, 3].map((x) => ({ value: 1e12 + x, u: 1, uCommon: 0 })))
    expect(summary && sampleStandardDeviationOf(summary)).toBe(1)
  })

  it('is undefined for none, and has no spread for one', () => {
    expect(summariseLot([])).toBeUndefined()
    const one = summariseLot([estimate(1)])
    expect(one && sampleStandardDeviationOf(one)).toBeUndefined()
  })
})

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
})

describe('proposeDisposition(input)', () => {
  const good = judgeLot(
    'massPerMetreWeighed',
    { n: 5, mean: 0, m2: 0.04, min: -0.1, max: 0.1, uCommon: 0.1, uMean: 0.1 },
    { lower: -2, upper: 2 },
    1,
    1.5,
  )
  const clean: ProposalInput = {
    specimensPlanned: 5,
    specimensComplete: 5,
    judgements: [good],
    closure: { mean: 0.0002, u: 0.0005 },
    openClosures: [],
    outside: [],
    openSignals: [],
    overdueEquipment: [],
  }

  it('proposes release for a complete, closed lot inside tolerance, with every number', () => {
    const proposal = proposeDisposition(clean)
    expect(proposal.verb).toBe('release')
    expect(proposal.reasons.map((one) => one.text)).toEqual([
      'Mass per metre, weighed: inside; probability of conformity more than 0.999; n = 5, (limit − mean)/s = 20.00 against k = 1.50.',
      'Closure: closed; +0.02 %, normalised error +0.20.',
    ])
  })

  it('holds a lot that is outside or not proven', () => {
    const bad = judgeLot(
      'tension',
      { n: 5, mean: 3, m2: 0.04, min: 2.9, max: 3.1, uCommon: 0.1, uMean: 0.1 },
      { upper: 2 },
      1,
      1.5,
    )
    expect(proposeDisposition({ ...clean, judgements: [good, bad] }).verb).toBe('hold')
  })

  it.each([
    ['an incomplete plan', { specimensComplete: 4 }, 'plan-incomplete'],
    ['an open closure of the lot', { closure: { mean: 0.004, u: 0.001 } }, 'closure-open'],
    ['overdue equipment', { overdueEquipment: ['M-14'] }, 'overdue-M-14'],
    ['a specimen outside', { outside: [{ specimen: 2, id: 'diameter' as const }] }, 'outside-2-diameter'],
  ])('stops at %s', (_, change, id) => {
    const proposal = proposeDisposition({ ...clean, ...change })
    expect(proposal.verb).toBeUndefined()
    expect(proposal.stops.map((stop) => stop.id)).toEqual([id])
  })

  it('never rejects by a signal, but does not propose release before it is answered', () => {
    const proposal = proposeDisposition({
      ...clean,
      openSignals: [{ id: 7, sentence: 'nine lots on one side' }],
    })
    expect(proposal.verb).toBeUndefined()
    expect(proposal.stops).toEqual([{ id: 'signal-7', text: 'Unanswered signal: nine lots on one side' }])
    expect(proposal.reasons.every((one) => one.tone === 'good')).toBe(true)
  })
})
