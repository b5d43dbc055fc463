import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { buildStaffChart } from '@/lib/domain/charts/build-staff-chart'
import { drawStaffChart, marginShapes, plotLayers } from '@/lib/domain/charts/draw-staff-chart'
import { layoutStaffChart } from '@/lib/domain/charts/layout-staff-chart'
import { svgText } from '@/lib/domain/charts/svg'
import { allShapes, marksIn, numbersIn, textsIn } from '@/test/support/drawing'
import { anyChart, anyWidth } from '@/test/support/random-charts'
import { sampleChart } from '@/test/support/staff-chart-sample'

const drawn = (options: Parameters<typeof sampleChart>[0], width?: number) =>
  drawStaffChart(layoutStaffChart(buildStaffChart(sampleChart(options)), width))

describe('drawStaffChart', () => {
  it('draws exactly one note for every charted lot of every stave where there is room', () => {
    const { shapes } = drawn({ window: { from: 8, to: 59 } })
    for (const [stave, missing] of [
      ['diameter', ['LA-331']],
      ['mass', []],
      ['closure', []],
      ['spread', []],
    ] as const) {
      const lots = marksIn(shapes, 'note', stave).map(({ role }) => role?.lot)
      expect(lots).toEqual(
        Array.from({ length: 52 }, (_, index) => `LA-${309 + index}`).filter(
          (code) => !(missing as readonly string[]).includes(code),
        ),
      )
    }
  })

  it('never draws a lot twice, nor one without a value, at any width', () => {
    fc.assert(
      fc.property(anyChart(), anyWidth, (input, width) => {
        const layout = layoutStaffChart(buildStaffChart(input), width)
        const { shapes } = drawStaffChart(layout)
        for (const { key, notes } of layout.chart.staves) {
          const lots = marksIn(shapes, 'note', key).map(({ role }) => role?.lot)
          expect(new Set(lots).size).toBe(lots.length)
          const charted = notes.map(({ code }) => code)
          if (layout.frame.step >= 12) expect(lots).toEqual(charted)
          else expect(charted).toEqual(expect.arrayContaining(lots))
        }
      }),
      { numRuns: 120, seed: 1 },
    )
  })

  it('has nothing but finite numbers, whatever the values: none, one, two, equal, huge, tiny, undefined', () => {
    fc.assert(
      fc.property(anyChart(), anyWidth, (input, width) => {
        const { shapes, width: w, height } = drawStaffChart(layoutStaffChart(buildStaffChart(input), width))
        for (const number of [...numbersIn(shapes), w, height]) expect(Number.isFinite(number)).toBe(true)
      }),
      { numRuns: 200, seed: 2 },
    )
    for (const options of [{ lots: 0 }, { lots: 1 }, { lots: 2 }, { lots: 30, equal: true }])
      for (const number of numbersIn(drawn(options).shapes)) expect(Number.isFinite(number)).toBe(true)
  })

  it('draws equal values of any size as notes at one height', () => {
    for (const value of [1e300, -1e300, 1e-300, 0, 254]) {
      const input = sampleChart({ lots: 15 })
      const staves = input.staves.slice(0, 1).map((stave) => ({
        ...stave,
        values: stave.values.map(() => value),
        tolerance: undefined,
        signals: [],
      }))
      const { shapes } = drawStaffChart(layoutStaffChart(buildStaffChart({ ...input, staves })))
      const notes = marksIn(shapes, 'note')
      expect(notes).toHaveLength(15)
      expect(new Set(notes.map((note) => (note.kind === 'ellipse' ? note.cy : Number.NaN))).size).toBe(1)
      expect(svgText({ width: 1, height: 1, label: '', shapes })).not.toMatch(/NaN|Infinity|e\+/)
    }
  })

  it('stays within a bounded number of marks however many lots there are', () => {
    // Quiet lots: what is not a signal is thinned to two notes a column of 12 px.
    const input = sampleChart({ lots: 400 })
    const count = 5000
    const quiet = {
      ...input,
      lots: Array.from({ length: count }, (_, index) => ({
        lotId: index,
        code: `LA-${index}`,
        madeAt: index,
        label: '',
      })),
      barLines: [],
      staves: input.staves.slice(0, 2).map((stave) => ({
        ...stave,
        values: Array.from({ length: count }, (_, index) => Math.sin(index * 1.7)),
        leftOut: [],
        limitSets: [],
        tolerance: undefined,
        signals: [],
      })),
      window: { from: 0, to: count - 1 },
    }
    const { shapes } = drawStaffChart(layoutStaffChart(buildStaffChart(quiet), 964))
    const columns = Math.ceil(764 / 12)
    expect(marksIn(shapes, 'note').length).toBeLessThanOrEqual(2 * 2 * (columns + 2))
    expect(allShapes(shapes).length).toBeLessThan(800)
  })

  it('gives the same bytes for the same input', () => {
    expect(svgText(drawn({}))).toBe(svgText(drawn({})))
    fc.assert(
      fc.property(anyChart(30), anyWidth, (input, width) => {
        const once = () => svgText(drawStaffChart(layoutStaffChart(buildStaffChart(input), width)))
        expect(once()).toBe(once())
      }),
      { numRuns: 30, seed: 3 },
    )
  })

  it('is named and described in words', () => {
    const { label, description } = drawn({})
    expect(label).toBe('Staff chart of Larch 254 on drawing machine 1')
    expect(description).toContain('60 lots, LA-301 to LA-360; 4 characteristics.')
  })

  it('says when there are no lots', () => {
    expect(
      textsIn(marginShapes(layoutStaffChart(buildStaffChart(sampleChart({ lots: 0 }))))).map(
        ({ text }) => text,
      ),
    ).toContain('no lots yet')
  })
})

describe('plotLayers', () => {
  it('lays notes over slurs over bar lines over staffs', () => {
    const layers = plotLayers(layoutStaffChart(buildStaffChart(sampleChart({}))))
    const firstWith = (mark: 'staff-line' | 'bar-line' | 'slur' | 'note') =>
      layers.findIndex(({ shapes }) => marksIn(shapes, mark).length > 0)
    expect(firstWith('staff-line')).toBeLessThan(firstWith('bar-line'))
    expect(firstWith('bar-line')).toBeLessThan(firstWith('note'))
    for (const { shapes } of layers) {
      const all = allShapes(shapes)
      const [slur, note] = (['slur', 'note'] as const).map((mark) =>
        all.findIndex(({ role }) => role?.mark === mark),
      )
      if (slur !== undefined && slur >= 0 && note !== undefined) expect(slur).toBeLessThan(note)
    }
  })
})
