import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { buildStaffChart, clampWindow, newestWindow } from '@/lib/domain/charts/build-staff-chart'
import { deepFreeze } from '@/test/support/deep-freeze'
import { anyChart } from '@/test/support/random-charts'
import { sampleChart } from '@/test/support/staff-chart-sample'

describe('clampWindow', () => {
  it('is all lots without a window, and never leaves the lots there are', () => {
    expect(clampWindow(undefined, 60)).toEqual({ from: 0, to: 59 })
    expect(clampWindow({ from: -5, to: 99 }, 60)).toEqual({ from: 0, to: 59 })
    expect(clampWindow({ from: 40, to: 20 }, 60)).toEqual({ from: 20, to: 40 })
    expect(clampWindow({ from: 3.4, to: 8.6 }, 60)).toEqual({ from: 3, to: 9 })
  })

  it('is empty without lots', () => {
    expect(clampWindow(undefined, 0)).toEqual({ from: 0, to: -1 })
    expect(clampWindow({ from: 0, to: 5 }, 0)).toEqual({ from: 0, to: -1 })
  })
})

describe('newestWindow', () => {
  it('is the newest 52 lots, or all', () => {
    expect(newestWindow(160)).toEqual({ from: 108, to: 159 })
    expect(newestWindow(20)).toEqual({ from: 0, to: 19 })
    expect(newestWindow(0)).toEqual({ from: 0, to: -1 })
  })
})

describe('buildStaffChart', () => {
  it('makes exactly one note of every lot of the window that has a finite value', () => {
    fc.assert(
      fc.property(anyChart(), (input) => {
        const chart = buildStaffChart(input)
        const { from, to } = chart.window
        chart.staves.forEach((stave, place) => {
          const values = input.staves[place]?.values ?? []
          const expected = input.lots
            .map((lot, index) => ({ code: lot.code, lotId: lot.lotId, index, value: values[index] }))
            .filter(({ index, value }) => index >= from && index <= to && Number.isFinite(value))
          expect(stave.notes.map(({ code, lotId, index, value }) => ({ code, lotId, index, value }))).toEqual(
            expected,
          )
        })
      }),
      { numRuns: 200, seed: 1 },
    )
  })

  it('leaves what it is given untouched and gives the same for the same', () => {
    const input = deepFreeze(sampleChart({}))
    expect(buildStaffChart(input)).toEqual(buildStaffChart(input))
  })

  it('passes on title, number format and the bar lines of the window', () => {
    const chart = buildStaffChart({ ...sampleChart({}), decimal: 'comma', window: { from: 30, to: 59 } })
    expect(chart).toMatchObject({ title: 'Larch 254 on drawing machine 1', decimal: 'comma' })
    expect(chart.barLines.map(({ atIndex }) => atIndex)).toEqual([33, 36])
  })
})
