import { describe, expect, it } from 'vitest'
import { signalSentence } from '@/lib/domain/record/signal-sentence'

const units = { diameter: 'mm', force: 'N', mass: 'mg' } as const

describe('signalSentence', () => {
  it('says which lot is beyond which limit, and how far', () => {
    expect(
      signalSentence(
        {
          rule: 'beyond-the-limits',
          side: 'above',
          departure: 4.2e-6,
          characteristic: 'massPerMetreWeighed',
          statistic: 'mean',
          memberCodes: ['LA-354'],
        },
        units,
      ),
    ).toBe('Mass per metre, weighed: LA-354 is beyond the upper limit, +4.2\u00a0mg/m from the centre line.')
  })

  it('says how many lots make a run, in the works’ unit and number format', () => {
    expect(
      signalSentence(
        {
          rule: 'nine-on-one-side',
          side: 'below',
          departure: -1.18e-6,
          characteristic: 'diameter',
          statistic: 'mean',
          memberCodes: Array.from({ length: 9 }, (_, index) => `LA-${348 + index}`),
        },
        { ...units, diameter: 'thou' },
        'comma',
      ),
    ).toBe(
      'Diameter: 9 lots on one side, below the centre line, LA-348 to LA-356, \u22120,046\u00a0thou on average.',
    )
  })

  it('names the spread for what it is', () => {
    expect(
      signalSentence(
        {
          rule: 'beyond-the-limits',
          side: 'above',
          departure: 1.25e-6,
          characteristic: 'massPerMetreWeighed',
          statistic: 'within-lot-sd',
          memberCodes: ['LA-1', 'LA-2'],
        },
        units,
      ),
    ).toBe(
      'Spread within the lot, mass per metre, weighed: LA-1 to LA-2 are beyond the upper limit, +1.25\u00a0mg/m from the centre line on average.',
    )
  })
})
