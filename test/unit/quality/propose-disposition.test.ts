import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { judgeLot } from '@/lib/domain/quality/judge-lot'
import { type ProposalInput, proposeDisposition } from '@/lib/domain/quality/propose-disposition'

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
    // Specimens of such a lot are outside, too: that has to be answered, and is no reason to propose nothing.
    const outside = [{ specimen: 1, id: 'tension' as const }]
    const both = proposeDisposition({ ...clean, judgements: [good, bad], outside })
    expect(both.verb).toBe('hold')
    expect(both.stops).toHaveLength(1)
  })

  it('asks once for each specimen that is outside, naming everything it is outside of', () => {
    const outside = [
      { specimen: 2, id: 'diameter' as const },
      { specimen: 2, id: 'tension' as const },
      { specimen: 4, id: 'diameter' as const },
    ]
    expect(proposeDisposition({ ...clean, outside }).stops).toEqual([
      {
        id: 'outside-2',
        text: 'Specimen 2 is outside its tolerance: diameter; tension at the reference note.',
      },
      { id: 'outside-4', text: 'Specimen 4 is outside its tolerance: diameter.' },
    ])
  })

  it.each([
    ['an incomplete plan', { specimensComplete: 4 }, 'plan-incomplete'],
    ['an open closure of the lot', { closure: { mean: 0.004, u: 0.001 } }, 'closure-open'],
    ['overdue equipment', { overdueEquipment: ['M-14'] }, 'overdue-M-14'],
    ['a specimen outside', { outside: [{ specimen: 2, id: 'diameter' as const }] }, 'outside-2'],
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

  it('lets the weighed mass decide, and shows the sounded one for information only', () => {
    const sounded = { ...good, id: 'massPerMetreSounded' as const, verdict: 'not proven' as const }
    const both = proposeDisposition({
      ...clean,
      judgements: [good, sounded],
      outside: [{ specimen: 1, id: 'massPerMetreSounded' }],
    })
    expect(both.verb).toBe('release')
    expect(both.stops).toEqual([])
    expect(both.reasons[1]?.text).toMatch(/^Mass per metre, sounded \(for information\): not proven/)
    expect(proposeDisposition({ ...clean, judgements: [sounded] }).verb).toBe('hold')
  })

  it('names what is outside or not proven in its headline, and never proposes without a judgement', () => {
    expect(proposeDisposition({ ...clean, judgements: [] })).toMatchObject({
      verb: undefined,
      headline: 'Not yet measured.',
    })
    const held = proposeDisposition({ ...clean, judgements: [{ ...good, verdict: 'outside' }] })
    expect(held.headline).toBe('Outside tolerance: mass per metre, weighed.')
    expect(proposeDisposition({ ...clean, specimensComplete: 3 }).headline).toBe('Inside tolerance so far.')
  })

  it('proposes release only without stops, doubts and open closures, whatever else is said', () => {
    const verdict = fc.constantFrom('inside' as const, 'not proven' as const, 'outside' as const)
    const input = fc.record({
      verdicts: fc.array(verdict, { maxLength: 4 }),
      complete: fc.integer({ min: 0, max: 5 }),
      mean: fc.double({ min: -0.004, max: 0.004, noNaN: true }),
      signals: fc.integer({ min: 0, max: 2 }),
      overdue: fc.integer({ min: 0, max: 2 }),
    })
    fc.assert(
      fc.property(input, ({ complete, mean, overdue, signals, verdicts }) => {
        const proposal = proposeDisposition({
          ...clean,
          specimensComplete: complete,
          judgements: verdicts.map((one) => ({ ...good, verdict: one })),
          closure: { mean, u: 0.001 },
          openSignals: Array.from({ length: signals }, (_, id) => ({
            id,
            sentence: 'nine lots on one side',
          })),
          overdueEquipment: Array.from({ length: overdue }, (_, index) => `G-${index}`),
        })
        const mayRelease =
          verdicts.length > 0 &&
          verdicts.every((one) => one === 'inside') &&
          complete === 5 &&
          signals === 0 &&
          overdue === 0 &&
          proposal.closure !== 'open'
        expect(proposal.verb === 'release').toBe(mayRelease)
        // A signal alone rejects nothing.
        if (proposal.verb === 'hold') expect(verdicts.some((one) => one !== 'inside')).toBe(true)
      }),
    )
  })
})
