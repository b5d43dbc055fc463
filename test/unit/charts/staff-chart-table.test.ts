import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { buildStaffChart } from '@/lib/domain/charts/build-staff-chart'
import { valueText } from '@/lib/domain/charts/readout'
import { staffChartTable } from '@/lib/domain/charts/staff-chart-table'
import { anyChart } from '@/test/support/random-charts'
import { sampleChart } from '@/test/support/staff-chart-sample'

describe('staffChartTable', () => {
  it('has a row for every lot of the window with every value, and a dash where there is none', () => {
    fc.assert(
      fc.property(anyChart(), (input) => {
        const chart = buildStaffChart(input)
        const { head, rows } = staffChartTable(chart)
        expect(head).toHaveLength(chart.staves.length + 3)
        expect(rows.map(({ code }) => code)).toEqual(
          input.lots.slice(chart.window.from, chart.window.to + 1).map(({ code }) => code),
        )
        rows.forEach(({ cells }, offset) => {
          expect(cells).toHaveLength(chart.staves.length + 2)
          input.staves.forEach((stave, place) => {
            const value = stave.values[chart.window.from + offset]
            const cell = cells[place + 1] ?? ''
            const text = valueText(Number.isFinite(value) ? value : undefined, stave, input)
            expect(cell === text || cell.startsWith(`${text} (`)).toBe(true)
          })
        })
      }),
      { numRuns: 100, seed: 1 },
    )
  })

  it('says distance, limits left, what was left out, changes and runs', () => {
    const { head, rows } = staffChartTable(buildStaffChart(sampleChart({})))
    expect(head).toEqual([
      'Lot',
      'Made',
      'Diameter, µm, individuals',
      'Mass per metre, weighed, mg/m, individuals',
      'Closure, %, individuals',
      'Spread within the lot, %, standard deviation',
      'Remarks',
    ])
    const row = (code: string) => rows.find((one) => one.code === code)?.cells ?? []
    expect(
      row('LA-301')
        .slice(1, 5)
        .every((cell) => cell.includes('left out')),
    ).toBe(true)
    expect(row('LA-356')[1]).toBe('255.79 (+4.5\u00a0σ, beyond the limits, above)')
    expect(row('LA-331')[1]).toBe('\u2013')
    expect(row('LA-334').at(-1)).toBe('die 7 in')
    expect(row('LA-356').at(-1)).toContain('25 above centre')
  })
})
