import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { buildStaffChart } from '@/lib/domain/charts/build-staff-chart'
import { lotTicks, sharedPrefix } from '@/lib/domain/charts/lot-axis'
import { plotFrame } from '@/lib/domain/charts/plot-frame'
import { textWidth } from '@/lib/domain/charts/text-width'
import { anyChart, anyWidth } from '@/test/support/random-charts'
import { sampleChart } from '@/test/support/staff-chart-sample'

describe('sharedPrefix', () => {
  it('is what all codes begin with, up to their last dash', () => {
    expect(sharedPrefix(['LA-301', 'LA-302'])).toBe('LA-')
    expect(sharedPrefix(['LA-2-01', 'LA-2-02'])).toBe('LA-2-')
    expect(sharedPrefix(['LA-1', 'LB-2'])).toBe('')
    expect(sharedPrefix(['LA-', 'LA-2'])).toBe('')
    expect(sharedPrefix(['X7'])).toBe('')
    expect(sharedPrefix([])).toBe('')
  })
})

describe('lotTicks', () => {
  it('stands at round code numbers and says the prefix once', () => {
    const chart = buildStaffChart({ ...sampleChart({}), window: { from: 8, to: 59 } })
    const { prefix, ticks } = lotTicks(chart, plotFrame(964, chart.window, 60))
    expect(prefix).toBe('LA-')
    expect(ticks.map(({ code }) => code)).toEqual([
      '312',
      '318',
      '324',
      '330',
      '336',
      '342',
      '348',
      '354',
      '360',
    ])
  })

  it('stands clear of its neighbours at any width, each under its own lot', () => {
    fc.assert(
      fc.property(anyChart(), anyWidth, (input, width) => {
        const chart = buildStaffChart(input)
        const frame = plotFrame(width, chart.window, chart.lots.length)
        const { prefix, ticks } = lotTicks(chart, frame)
        let free = Number.NEGATIVE_INFINITY
        for (const { index, x, code, day } of ticks) {
          const lot = chart.lots[index]
          expect(`${prefix}${code}`).toBe(lot?.code)
          expect(day).toBe(lot?.label)
          expect(x).toBe(frame.xAt(index))
          const half = Math.max(textWidth(code, 11), textWidth(day, 11)) / 2
          expect(x - half).toBeGreaterThan(free)
          free = x + half + 6
        }
        expect(ticks.length > 0).toBe(chart.lots.length > 0)
      }),
      { numRuns: 150, seed: 1 },
    )
  })
})
