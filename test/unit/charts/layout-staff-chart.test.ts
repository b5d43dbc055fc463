import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { buildStaffChart } from '@/lib/domain/charts/build-staff-chart'
import { layoutStaffChart } from '@/lib/domain/charts/layout-staff-chart'
import { anyChart, anyWidth } from '@/test/support/random-charts'
import { sampleChart } from '@/test/support/staff-chart-sample'

const layoutOf = (options: Parameters<typeof sampleChart>[0], width?: number) =>
  layoutStaffChart(buildStaffChart(sampleChart(options)), width)

describe('layoutStaffChart', () => {
  it('stacks staves in order, none reaching into the next, quiet ones 54 px apart', () => {
    fc.assert(
      fc.property(anyChart(), anyWidth, (input, width) => {
        const { staves, plot, height } = layoutStaffChart(buildStaffChart(input), width)
        staves.slice(1).forEach((stave, index) => {
          const before = staves[index]
          if (!before) return
          const [foot, head] = [before.y + before.bottom, stave.y + stave.top]
          expect(head - foot).toBeGreaterThanOrEqual(before.below + stave.above - 1e-6)
          expect(head - foot).toBeGreaterThanOrEqual(54 - 1e-6)
        })
        for (const { y, top, above, bottom, below } of staves) {
          expect(y + top - above).toBeGreaterThanOrEqual(plot.y - 1e-6)
          expect(y + bottom + below).toBeLessThanOrEqual(plot.y + plot.h + 1e-6)
        }
        expect(height).toBeGreaterThan(plot.y)
      }),
      { numRuns: 150, seed: 1 },
    )
  })

  it('gives axes from which every note’s place follows', () => {
    const { staves, plot, frame } = layoutOf({})
    for (const { domain, y, yAt, notes } of staves)
      for (const { note } of notes.slice(0, 5)) {
        const share = (note.value - domain[0]) / (domain[1] - domain[0])
        expect(plot.y + plot.h * (1 - share)).toBeNear(y + yAt(note.value), { absolute: 1e-6 })
        const along = (note.index - frame.domain[0]) / (frame.domain[1] - frame.domain[0])
        expect(plot.x + plot.w * along).toBeNear(frame.xAt(note.index), { absolute: 1e-6 })
      }
  })

  it('draws bar lines between lots, through all staves, double where limits change', () => {
    const { bars, frame, staves } = layoutOf({})
    expect(bars.placed.map(({ x }) => x)).toEqual([9, 18, 33, 36].map((index) => frame.xAt(index - 0.5)))
    expect(bars.placed.map(({ xs }) => xs.length)).toEqual([2, 1, 1, 1])
    expect(bars.y1).toBe((staves[0]?.y ?? 0) + (staves[0]?.top ?? 0))
    expect(bars.y2).toBe((staves.at(-1)?.y ?? 0) + (staves.at(-1)?.bottom ?? 0))
  })

  it('puts a change before the first lot of the window at its left edge', () => {
    const { bars, frame } = layoutOf({ window: { from: 33, to: 59 } })
    expect(bars.placed[0]?.x).toBe(frame.x)
  })

  it('says how many notes are drawn when not all are', () => {
    expect(layoutOf({}).decimated).toBeUndefined()
    const { decimated, staves } = layoutOf({ lots: 160 })
    expect(decimated?.of).toBe(639)
    expect(decimated?.shown).toBe(staves.reduce((sum, { notes }) => sum + notes.length, 0))
    expect(decimated?.shown).toBeLessThan(639)
  })

  it('keeps words under the staves clear of notes that hang below the last one', () => {
    fc.assert(
      fc.property(anyChart(), anyWidth, (input, width) => {
        const { staves, reasons, reasonsY } = layoutStaffChart(buildStaffChart(input), width)
        const last = staves.at(-1)
        if (!last || reasons.length === 0) return
        // Italic letters of 13 px rise 10 px over their line; a head reaches 5 px below its centre.
        for (const { y } of last.notes) expect(last.y + y + 5).toBeLessThanOrEqual(reasonsY - 9)
      }),
      { numRuns: 200, seed: 2 },
    )
  })

  it('lays out charts without lots, without staves, of one lot and of two', () => {
    for (const lots of [0, 1, 2]) {
      const layout = layoutOf({ lots })
      expect(layout.staves).toHaveLength(4)
      expect(layout.staves.map(({ notes }) => notes.length)).toEqual([lots, lots, lots, lots])
      expect(layout.axis.ticks).toHaveLength(Math.min(1, lots))
    }
    expect(layoutStaffChart(buildStaffChart({ ...sampleChart({}), staves: [] })).staves).toEqual([])
  })
})
