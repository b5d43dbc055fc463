import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { buildStaffChart } from '@/lib/domain/charts/build-staff-chart'
import { plotLayers } from '@/lib/domain/charts/draw-staff-chart'
import { layoutStaffChart } from '@/lib/domain/charts/layout-staff-chart'
import { wideLayout } from '@/lib/domain/charts/wide-layout'
import { numbersIn } from '@/test/support/drawing'
import { anyChart, anyWidth } from '@/test/support/random-charts'
import { sampleChart } from '@/test/support/staff-chart-sample'

describe('wideLayout', () => {
  it('has half a window more at either end, as far as there are lots', () => {
    const input = sampleChart({ lots: 200 })
    const wideOf = (from: number, to: number) =>
      wideLayout(input, layoutStaffChart(buildStaffChart({ ...input, window: { from, to } }), 964)).chart
        .window
    expect(wideOf(100, 139)).toEqual({ from: 80, to: 159 })
    expect(wideOf(10, 49)).toEqual({ from: 0, to: 69 })
    expect(wideOf(148, 199)).toEqual({ from: 122, to: 199 })
  })

  it('leaves every drawn note of the window where it stands, and its staves at their heights', () => {
    fc.assert(
      fc.property(anyChart(), anyWidth, (input, width) => {
        const layout = layoutStaffChart(buildStaffChart(input), width)
        const wide = wideLayout(input, layout)
        expect(wide.frame.step).toBe(layout.frame.step)
        expect(wide.frame.w).toBeLessThanOrEqual(2.5 * layout.frame.w + 60)
        wide.staves.forEach((stave, place) => {
          const before = layout.staves[place]
          if (!before) return
          expect([stave.y, stave.top, stave.bottom]).toEqual([before.y, before.top, before.bottom])
          const places = new Map(stave.notes.map(({ note, x, y }) => [note.index, [x, y]]))
          for (const { note, x, y } of before.notes)
            if (places.has(note.index)) expect(places.get(note.index)).toEqual([x, y])
          // Lots 12 px apart or more are all drawn, here and there.
          if (layout.frame.step >= 12)
            for (const { note } of before.notes) expect(places.has(note.index)).toBe(true)
        })
        for (const number of numbersIn(plotLayers(wide).flatMap(({ shapes }) => shapes)))
          expect(Number.isFinite(number)).toBe(true)
      }),
      { numRuns: 120, seed: 1 },
    )
  })
})
