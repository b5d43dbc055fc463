import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { buildStaffChart } from '@/lib/domain/charts/build-staff-chart'
import { plotFrame } from '@/lib/domain/charts/plot-frame'
import { slurClearance } from '@/lib/domain/charts/slur'
import type { StaffChartInput } from '@/lib/domain/charts/staff-chart'
import { staveParts } from '@/lib/domain/charts/stave-layout'
import { anyChart, anyWidth } from '@/test/support/random-charts'
import { sampleChart } from '@/test/support/staff-chart-sample'

function partsOf(input: StaffChartInput, width = 964) {
  const chart = buildStaffChart(input)
  const frame = plotFrame(width, chart.window, chart.lots.length)
  return chart.staves.map((stave, index) => staveParts(stave, frame, chart.window, index === 0))
}

const diameter = (more: Partial<StaffChartInput['staves'][number]>): StaffChartInput => {
  const input = sampleChart({})
  const [first] = input.staves
  if (!first) throw new Error('the sample has staves')
  return { ...input, staves: [{ ...first, ...more }] }
}

describe('staveParts', () => {
  it('draws the staff 84 px high: 14 px a σ, limits three spaces from the centre', () => {
    const [parts] = partsOf(sampleChart({}))
    expect(parts?.top).toBeNear(-42, { absolute: 1e-6 })
    expect(parts?.bottom).toBeNear(42, { absolute: 1e-6 })
    expect(parts?.yAt(253.92 + 0.42)).toBeNear(-14, { absolute: 1e-6 })
    expect(parts?.valueAt(-14)).toBeNear(253.92 + 0.42, { absolute: 1e-9 })
  })

  it('draws the upper half of a bounded characteristic', () => {
    const spread = partsOf(sampleChart({})).at(-1)
    expect(spread?.top).toBeNear(-42, { absolute: 1e-6 })
    expect(spread?.bottom).toBe(0)
  })

  it('stands a note that is too far off at the edge, pointing on', () => {
    const values = sampleChart({}).staves[0]?.values.map((value, index) => (index === 40 ? 290 : value)) ?? []
    const [parts] = partsOf(diameter({ values, signals: [] }))
    const far = parts?.notes.find(({ note }) => note.index === 40)
    expect(far).toMatchObject({ off: 'above' })
    expect(far?.y).toBeNear((parts?.top ?? 0) - 77, { absolute: 1e-9 })
    expect(parts?.notes.filter(({ off }) => off !== undefined)).toHaveLength(1)
  })

  it('draws a tolerance near the staff and tells one far off in words', () => {
    const near = partsOf(diameter({ tolerance: { lower: 200, upper: 255.5, label: 'x' } }))[0]
    expect(near?.tolerances.map(({ side }) => side)).toEqual(['above'])
    expect(near?.untold.map(({ side }) => side)).toEqual(['below'])
  })

  it('keeps each slur clear of every note within it and inside the room it asks for', () => {
    fc.assert(
      fc.property(anyChart(), anyWidth, (input, width) => {
        for (const parts of partsOf(input, width)) {
          for (const { slur, curve, top, bottom } of parts.slurs) {
            const [first = 0, last = 0] = [slur.members[0], slur.members.at(-1)]
            for (const { note, x, y } of parts.notes)
              if (note.index > first && note.index < last)
                expect(slurClearance(curve, [x, y])).toBeGreaterThanOrEqual(8.4)
            expect(top).toBeGreaterThanOrEqual(parts.top - parts.above)
            expect(bottom).toBeLessThanOrEqual(parts.bottom + parts.below)
          }
          for (const { y } of parts.notes) {
            expect(y - 5).toBeGreaterThanOrEqual(parts.top - parts.above)
            expect(y + 5).toBeLessThanOrEqual(parts.bottom + parts.below)
          }
        }
      }),
      { numRuns: 150, seed: 1 },
    )
  })

  it('is quiet below only where nothing hangs below the staff', () => {
    fc.assert(
      fc.property(anyChart(), (input) => {
        for (const { quietBelow, notes, bottom } of partsOf(input))
          if (quietBelow) for (const { y } of notes) expect(y).toBeLessThanOrEqual(bottom + 1e-9)
      }),
      { numRuns: 100, seed: 2 },
    )
  })
})
