import { describe, expect, it } from 'vitest'
import { buildStaffChart } from '@/lib/domain/charts/build-staff-chart'
import { describeStaffChart } from '@/lib/domain/charts/describe-staff-chart'
import { sampleChart } from '@/test/support/staff-chart-sample'

const told = (options: Parameters<typeof sampleChart>[0]): string =>
  describeStaffChart(buildStaffChart(sampleChart(options)))

describe('describeStaffChart', () => {
  it('says range, limits, last lot, what is beyond, runs and changes', () => {
    const words = told({})
    expect(words).toMatch(/^60 lots, LA-301 to LA-360; 4 characteristics\. /)
    expect(words).toContain('Diameter, µm, individuals: limit set 5, 252.66 to 255.18.')
    expect(words).toContain('Spread within the lot, %, standard deviation: limit set 5, at most 0.43.')
    expect(words).toMatch(/Last lot LA-360 \d+\.\d\d, \+\d\.\d\u00a0σ\./)
    expect(words).toMatch(/Beyond the limits: .*LA-356 255\.79/)
    expect(words).toContain('25 lots above the centre, LA-336 to LA-360.')
    expect(words).toContain(
      'Changes: limit set 5 before LA-310; coil C-118 before LA-319; die 7 in before LA-334; oil 41 °C before LA-337.',
    )
  })

  it('says what became of a run', () => {
    const input = sampleChart({})
    const chart = (state: 'answered' | 'no-longer-holds') =>
      buildStaffChart({
        ...input,
        staves: input.staves.map((stave) => ({
          ...stave,
          signals: stave.signals.map((signal) => ({ ...signal, state })),
        })),
      })
    expect(describeStaffChart(chart('answered'))).toContain('LA-336 to LA-360. (answered)')
    expect(describeStaffChart(chart('no-longer-holds'))).toContain('(no longer holds)')
  })

  it('says one lot, no limits, no values and no lots', () => {
    expect(told({ lots: 1 })).toMatch(/^One lot, LA-301; .*no limits before 20 lots: 1 so far\./)
    expect(told({ lots: 0 })).toBe('Larch 254 on drawing machine 1: no lots yet.')
    const input = sampleChart({ lots: 2 })
    const empty = input.staves.slice(0, 1).map((stave) => ({ ...stave, values: [undefined, Number.NaN] }))
    expect(describeStaffChart(buildStaffChart({ ...input, staves: empty }))).toContain('No values.')
  })

  it('says provisional limits', () => {
    expect(told({ window: { from: 0, to: 5 } })).toMatch(/limit set 4, .*, provisional\./)
  })
})
