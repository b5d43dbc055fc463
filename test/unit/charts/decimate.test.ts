import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { buildStaffChart } from '@/lib/domain/charts/build-staff-chart'
import { notesToDraw } from '@/lib/domain/charts/decimate'
import type { StaffChart, StaveModel } from '@/lib/domain/charts/staff-chart'
import { anyChart } from '@/test/support/random-charts'
import { sampleChart } from '@/test/support/staff-chart-sample'

const heightIn =
  ({ scale }: StaveModel) =>
  (value: number): number =>
    ((scale.middle - value) / scale.perSpace) * 14

interface Drawn {
  readonly chart: StaffChart
  readonly stave: StaveModel | undefined
}

const anyStave: fc.Arbitrary<Drawn> = fc
  .tuple(
    anyChart(160).map((input) => buildStaffChart({ ...input, window: undefined })),
    fc.nat({ max: 2 }),
  )
  .map(([chart, place]) => ({ chart, stave: chart.staves[place % Math.max(1, chart.staves.length)] }))

const anyStep = fc.double({ min: 0.5, max: 11.9, noNaN: true })

describe('notesToDraw', () => {
  it('draws every note where lots stand 12 px apart or more', () => {
    fc.assert(
      fc.property(anyStave, fc.double({ min: 12, max: 40, noNaN: true }), ({ stave }, step) => {
        if (!stave) return
        expect([...notesToDraw(stave, step, heightIn(stave))]).toEqual(stave.notes.map(({ index }) => index))
      }),
      { numRuns: 40, seed: 1 },
    )
  })

  it('never loses an extreme, a note beyond its limits, an unanswered one or an end of a run', () => {
    fc.assert(
      fc.property(anyStave, anyStep, ({ stave }, step) => {
        if (!stave) return
        const kept = notesToDraw(stave, step, heightIn(stave))
        for (const { index, beyond, open } of stave.notes) if (beyond || open) expect(kept).toContain(index)
        for (const { members } of stave.slurs) {
          expect(kept).toContain(members[0])
          expect(kept).toContain(members.at(-1))
        }
        const drawn = stave.notes.filter(({ index }) => kept.has(index)).map(({ value }) => value)
        const all = stave.notes.map(({ value }) => value)
        const reach = (values: readonly number[]): number =>
          Math.max(...values.map((value) => Math.abs(value - stave.scale.middle)))
        if (all.length === 0) return
        // The furthest of all is there; the other extreme may hide at most a head's height behind another note.
        expect(reach(drawn)).toBe(reach(all))
        const height = heightIn(stave)
        expect(Math.abs(height(Math.max(...drawn)) - height(Math.max(...all)))).toBeLessThan(8.4)
        expect(Math.abs(height(Math.min(...drawn)) - height(Math.min(...all)))).toBeLessThan(8.4)
      }),
      { numRuns: 150, seed: 2 },
    )
  })

  it('keeps the notes on either side of every change', () => {
    fc.assert(
      fc.property(anyStave, anyStep, ({ stave, chart }, step) => {
        if (!stave) return
        const changes = chart.barLines.map(({ atIndex }) => atIndex)
        const kept = notesToDraw(stave, step, heightIn(stave), changes)
        const indices = stave.notes.map(({ index }) => index)
        for (const change of changes) {
          const before = indices.findLast((index) => index < change)
          const after = indices.find((index) => index >= change)
          if (before !== undefined) expect(kept).toContain(before)
          if (after !== undefined) expect(kept).toContain(after)
        }
      }),
      { numRuns: 100, seed: 3 },
    )
  })

  it('draws no more than two notes a column beside those that must stay', () => {
    fc.assert(
      fc.property(anyStave, anyStep, ({ stave }, step) => {
        if (!stave) return
        const kept = notesToDraw(stave, step, heightIn(stave))
        const must = stave.notes.filter(({ beyond, open, signals }) => beyond || open || signals.length > 0)
        const columns = Math.ceil(160 / Math.ceil(12 / step - 1e-9)) + 1
        expect(kept.size).toBeLessThanOrEqual(must.length + 2 * columns)
        for (const index of kept) expect(stave.notes.map((note) => note.index)).toContain(index)
      }),
      { numRuns: 100, seed: 4 },
    )
  })

  it('keeps a lone signal that lies within the newest limits', () => {
    const input = sampleChart({ lots: 160 })
    const [first] = input.staves
    if (!first) throw new Error('the sample has staves')
    const quiet = { ...first, values: first.values.map((_, index) => 253.92 + (index % 2 ? 0.01 : -0.01)) }
    const chart = buildStaffChart({
      ...input,
      staves: [
        {
          ...quiet,
          signals: [
            {
              id: 7,
              rule: 'beyond-the-limits',
              side: 'above',
              members: [77],
              state: 'answered',
              sentence: '',
            },
          ],
        },
      ],
    })
    const [stave] = chart.staves
    if (!stave) throw new Error('one stave went in')
    expect(stave.notes.find(({ index }) => index === 77)?.beyond).toBeUndefined()
    expect(notesToDraw(stave, 1.5, heightIn(stave))).toContain(77)
    const without = { ...stave, notes: stave.notes.map((note) => ({ ...note, signals: [] })) }
    expect(notesToDraw(without, 1.5, heightIn(stave))).not.toContain(77)
  })
})
