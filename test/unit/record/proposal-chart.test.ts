import { describe, expect, it } from 'vitest'
import { buildStaffChart } from '@/lib/domain/charts/build-staff-chart'
import type { LimitProposal } from '@/lib/domain/control/propose-limits'
import { type ProposalFacts, proposalChart } from '@/lib/domain/record/proposal-chart'
import { deepFreeze } from '@/test/support/deep-freeze'

const lots = Array.from({ length: 24 }, (_, index) => ({
  lotId: 500 + index,
  code: `LA-${301 + index}`,
  value: 397.5e-6 + (index % 5) * 0.4e-6,
  n: 5,
  leftOut: index === 2,
  madeAt: Date.UTC(2026, 6, 1 + index),
  label: `${1 + index} Jul`,
}))

const proposal: LimitProposal = {
  centre: 398.3e-6,
  sigma: 1.2e-6,
  lower: 394.7e-6,
  upper: 401.9e-6,
  sigmaEstimator: 'moving-range mean',
  rules: ['beyond-the-limits', 'nine-on-one-side'],
  alike: false,
  lotCount: 23,
  provisional: true,
  beyond: [],
  advice: [],
}

const facts = (more: Partial<ProposalFacts> = {}): ProposalFacts => ({
  characteristic: 'massPerMetreWeighed',
  statistic: 'mean',
  lots,
  proposal,
  number: 6,
  units: { diameter: 'mm', force: 'N', mass: 'mg' },
  decimal: 'comma',
  ...more,
})

describe('proposalChart', () => {
  it('shows every baseline lot on one stave with the limits it would get, in display units', () => {
    const input = proposalChart(deepFreeze(facts()))
    expect(input).toMatchObject({
      title: 'Mass per metre, weighed',
      decimal: 'comma',
      window: { from: 0, to: 23 },
    })
    const [stave] = input.staves
    expect(input.staves).toHaveLength(1)
    expect(stave).toMatchObject({ unitLabel: 'mg/m, lot means', decimals: 1, oneSided: false, leftOut: [2] })
    stave?.values.forEach((value, index) => {
      expect(value).toBeNear(397.5 + (index % 5) * 0.4, { absolute: 1e-9 })
    })
    const [set] = stave?.limitSets ?? []
    expect(set).toMatchObject({ fromIndex: 0, toIndex: 23, number: 6, provisional: true })
    expect(set?.centre).toBeNear(398.3, { absolute: 1e-9 })
    expect(set?.sigma).toBeNear(1.2, { absolute: 1e-9 })
    expect(set?.lower).toBeNear(394.7, { absolute: 1e-9 })
    expect(set?.upper).toBeNear(401.9, { absolute: 1e-9 })
    const chart = buildStaffChart(input)
    expect(chart.staves[0]?.notes.filter(({ leftOut }) => leftOut).map(({ code }) => code)).toEqual([
      'LA-303',
    ])
  })

  it('has no lower limit for a spread, and one more decimal', () => {
    const [stave] = proposalChart(
      facts({ statistic: 'within-lot-sd', proposal: { ...proposal, lower: undefined } }),
    ).staves
    expect(stave).toMatchObject({ oneSided: true, decimals: 2, unitLabel: 'mg/m, standard deviation' })
    expect(stave?.limitSets[0]?.lower).toBeUndefined()
  })

  it('shows lots without limits where none can be proposed, and nothing where there are no lots', () => {
    expect(proposalChart(facts({ proposal: undefined })).staves[0]?.limitSets).toEqual([])
    const none = proposalChart(facts({ lots: [], proposal: undefined }))
    expect(none.lots).toEqual([])
    expect(none.window).toBeUndefined()
  })

  it('writes deviations with their sign', () => {
    expect(proposalChart(facts({ characteristic: 'closure' })).staves[0]).toMatchObject({
      signed: true,
      unitLabel: '%, lot means',
    })
  })
})
