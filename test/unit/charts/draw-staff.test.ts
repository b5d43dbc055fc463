import { describe, expect, it } from 'vitest'
import { buildStaffChart } from '@/lib/domain/charts/build-staff-chart'
import {
  barShapes,
  footShapes,
  futureShapes,
  limitValueShapes,
  staffShapes,
  toleranceShapes,
  unlimitedShapes,
} from '@/lib/domain/charts/draw-staff'
import { layoutStaffChart } from '@/lib/domain/charts/layout-staff-chart'
import type { Shape } from '@/lib/domain/charts/shape'
import { marksIn, textsIn } from '@/test/support/drawing'
import { sampleChart } from '@/test/support/staff-chart-sample'

const layoutOf = (options: Parameters<typeof sampleChart>[0] = {}, width?: number) =>
  layoutStaffChart(buildStaffChart(sampleChart(options)), width)

const linesOf = (shape: Shape | undefined): number =>
  shape?.kind === 'path' ? shape.segments.filter(([letter]) => letter === 'M').length : 0

const first = <T>(all: readonly T[]): T => {
  const [one] = all
  if (one === undefined) throw new Error('none there')
  return one
}

describe('staffShapes', () => {
  it('draws four inner lines, centre and two limits for each limit set, where it holds', () => {
    const layout = layoutOf()
    const stave = first(layout.staves)
    const shapes = staffShapes(stave)
    expect(marksIn(shapes, 'staff-line').map(linesOf)).toEqual([4, 4])
    expect(marksIn(shapes, 'centre-line').map(linesOf)).toEqual([1, 1])
    expect(marksIn(shapes, 'limit-line').map(linesOf)).toEqual([2, 2])
    expect(marksIn(shapes, 'limit-line').map(({ role }) => role?.state)).toEqual(['set 4', 'set 5'])
    const [older, newer] = stave.segments
    expect(older?.x2).toBe(newer?.x1)
    expect(older?.x1).toBe(layout.frame.x)
    expect(newer?.x2).toBe(layout.frame.x + layout.frame.w)
  })

  it('draws the upper half of a bounded characteristic', () => {
    const spread = layoutOf().staves.at(-1)
    const shapes = spread ? staffShapes(spread) : []
    expect(marksIn(shapes, 'staff-line').map(linesOf)).toEqual([2, 2])
    expect(marksIn(shapes, 'limit-line').map(linesOf)).toEqual([1, 1])
  })
})

describe('unlimitedShapes', () => {
  it('is one broken line where there are no limits, nothing where there are', () => {
    const few = layoutOf({ lots: 12 })
    expect(unlimitedShapes(first(few.staves), few)).toMatchObject([{ dash: [2, 4] }])
    const many = layoutOf()
    expect(unlimitedShapes(first(many.staves), many)).toEqual([])
  })
})

describe('toleranceShapes', () => {
  it('is vermilion, broken 7 4, across the whole plot', () => {
    const layout = layoutOf()
    const [line] = toleranceShapes(first(layout.staves), layout)
    const y = first(layout.staves).y + first(layout.staves).yAt(257)
    expect(line).toMatchObject({
      stroke: 'vermilion',
      dash: [7, 4],
      segments: [
        ['M', layout.frame.x, y],
        ['L', layout.frame.x + layout.frame.w, y],
      ],
    })
  })
})

describe('limitValueShapes', () => {
  it('says tolerance, limits and centre at the right, 12 px apart at least', () => {
    for (const width of [964, 358]) {
      const layout = layoutOf({}, width)
      for (const stave of layout.staves) {
        const texts = textsIn(limitValueShapes(stave, layout))
        const heights = texts.map(({ y }) => y).sort((a, b) => a - b)
        for (const [index, y] of heights.slice(1).entries())
          expect(y - (heights[index] ?? 0)).toBeGreaterThanOrEqual(12 - 1e-6)
        for (const { x } of texts) expect(x).toBeGreaterThan(layout.frame.x + layout.frame.w)
      }
      expect(textsIn(limitValueShapes(first(layout.staves), layout)).map(({ text }) => text)).toEqual([
        '257.00',
        '255.18',
        '253.92',
        '252.66',
      ])
    }
  })
})

describe('barShapes', () => {
  it('opens the chart with a bar and draws one line a change, two for limits', () => {
    const shapes = barShapes(layoutOf())
    expect(marksIn(shapes, 'bar-line')).toHaveLength(4)
    const kinds = marksIn(shapes, 'bar-line').map((bar) => [
      bar.role?.state,
      bar.kind === 'group' ? linesOf(bar.shapes[0]) : 0,
      bar.kind === 'group' ? bar.title : '',
    ])
    expect(kinds).toEqual([
      ['limit-set', 2, 'limit set 5, 2 Aug, M. Orrin'],
      ['machine', 1, 'coil C-118, 18 Aug'],
      ['die', 1, 'die 7 in, 6 Sep, T. Aldous'],
      ['setting', 1, 'oil 41 °C, 12 Sep, T. Aldous'],
    ])
    expect(shapes).toHaveLength(5)
  })

  it('has no second bar where a change opens the window', () => {
    expect(barShapes(layoutOf({ window: { from: 33, to: 59 } }))).toHaveLength(2)
  })
})

describe('futureShapes', () => {
  it('washes what is still to be made, and nothing in a full or an older window', () => {
    const [ground, said] = futureShapes(layoutOf({ lots: 30 }))
    expect(ground).toMatchObject({ kind: 'rect', fill: 'wash' })
    expect(said).toMatchObject({ text: 'still to be made' })
    expect(futureShapes(layoutOf())).toEqual([])
    expect(futureShapes(layoutOf({ window: { from: 0, to: 19 } }))).toEqual([])
  })
})

describe('footShapes', () => {
  it('says reasons with date and person, the codes of lots with their days, and what is not drawn', () => {
    const texts = textsIn(footShapes(layoutOf({}, 1400))).map(({ text }) => text)
    expect(texts).toEqual(
      expect.arrayContaining([
        'limit set 5',
        '2 Aug, M. Orrin',
        'die 7 in',
        '6 Sep, T. Aldous',
        'Lot, LA-',
        '318',
        '360',
      ]),
    )
    expect(texts.join()).not.toContain('notes drawn')
    const crowded = textsIn(footShapes(layoutOf({ lots: 160 }))).map(({ text }) => text)
    expect(crowded.join()).toMatch(/\d+ of 639 notes drawn/)
  })

  it('says from which lot an older window begins', () => {
    const texts = textsIn(footShapes(layoutOf({ window: { from: 20, to: 50 } }))).map(({ text }) => text)
    expect(texts).toContain('from LA-321')
  })
})
