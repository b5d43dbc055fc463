import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { buildStaffChart } from '@/lib/domain/charts/build-staff-chart'
import { staffChartRows } from '@/lib/domain/charts/staff-chart-csv'
import { anyChart } from '@/test/support/random-charts'
import { sampleChart } from '@/test/support/staff-chart-sample'

describe('staffChartRows', () => {
  it('holds every charted value unrounded, in rows as long as their head', () => {
    fc.assert(
      fc.property(anyChart(), (input) => {
        const chart = buildStaffChart(input)
        const [head = [], ...rows] = staffChartRows(chart)
        expect(rows).toHaveLength(Math.max(0, chart.window.to - chart.window.from + 1))
        rows.forEach((row, offset) => {
          expect(row).toHaveLength(head.length)
          const index = chart.window.from + offset
          expect(row[0]).toBe(input.lots[index]?.code)
          for (const { key, values } of input.staves) {
            const value = values[index]
            expect(row[head.indexOf(`${key}_value`)]).toBe(Number.isFinite(value) ? value : undefined)
          }
        })
      }),
      { numRuns: 100, seed: 1 },
    )
  })

  it('says unit, limits, distance, what was left out and how it stands, in UTC', () => {
    const [head = [], ...rows] = staffChartRows(buildStaffChart(sampleChart({})))
    const cell = (code: string, column: string) => rows.find((row) => row[0] === code)?.[head.indexOf(column)]
    expect(cell('LA-301', 'made_at')).toMatch(/^2026-07-\d\dT\d\d:\d\d:00\.000Z$/)
    expect(cell('LA-356', 'diameter_unit')).toBe('µm')
    expect(cell('LA-356', 'diameter_limit_set')).toBe(5)
    expect(cell('LA-356', 'diameter_centre')).toBe(253.92)
    expect(cell('LA-356', 'diameter_upper')).toBeNear(255.18, { absolute: 1e-9 })
    expect(cell('LA-356', 'diameter_lower')).toBeNear(252.66, { absolute: 1e-9 })
    expect(cell('LA-356', 'diameter_sigmas')).toBeNear(
      (Number(cell('LA-356', 'diameter_value')) - 253.92) / 0.42,
      {
        absolute: 1e-9,
      },
    )
    expect(cell('LA-356', 'diameter_beyond')).toBe('above')
    expect(cell('LA-356', 'diameter_signals')).toContain('diameter-run-35')
    expect(cell('LA-301', 'diameter_left_out')).toBe('yes')
    expect(cell('LA-356', 'diameter_left_out')).toBe('no')
    expect(cell('LA-356', 'spread_lower')).toBeUndefined()
    expect(cell('LA-331', 'diameter_left_out')).toBeUndefined()
    expect(cell('LA-334', 'change')).toBe('die 7 in, 6 Sep, T. Aldous')
  })
})
