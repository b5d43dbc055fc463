import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { buildStaffChart } from '@/lib/domain/charts/build-staff-chart'
import { layoutStaffChart } from '@/lib/domain/charts/layout-staff-chart'
import { valueText } from '@/lib/domain/charts/readout'
import { lotAt, pointerShapes, readingShapes, readingText, readLot } from '@/lib/domain/charts/staff-pointer'
import { allShapes, numbersIn, textsIn } from '@/test/support/drawing'
import { anyChart, anyWidth } from '@/test/support/random-charts'
import { sampleChart } from '@/test/support/staff-chart-sample'

const layout = layoutStaffChart(buildStaffChart({ ...sampleChart({}), window: { from: 8, to: 59 } }))

describe('lotAt', () => {
  it('is the nearest lot of the window to any place', () => {
    fc.assert(
      fc.property(fc.integer({ min: -100, max: 1200 }), (x) => {
        const index = lotAt(layout, x)
        const distances = Array.from({ length: 52 }, (_, offset) =>
          Math.abs(layout.frame.xAt(8 + offset) - x),
        )
        expect(Math.abs(layout.frame.xAt(index ?? Number.NaN) - x)).toBeNear(Math.min(...distances), {
          absolute: 1e-9,
        })
      }),
      { numRuns: 100, seed: 1 },
    )
  })

  it('is none without lots', () => {
    expect(lotAt(layoutStaffChart(buildStaffChart(sampleChart({ lots: 0 }))), 300)).toBeUndefined()
  })
})

describe('readLot', () => {
  it('reads all staves at one lot, with a dash where there is no value', () => {
    expect(readLot(layout, 30)).toMatchObject({ index: 30, code: 'LA-331' })
    expect(readLot(layout, 30)?.staves[0]).toEqual({
      key: 'diameter',
      label: 'Diameter',
      value: '\u2013',
      sigmas: '',
    })
    expect(readLot(layout, 55)?.staves[0]).toMatchObject({ value: '255.79', sigmas: '+4.5\u00a0σ' })
    expect(readLot(layout, 55)?.staves.map(({ key }) => key)).toEqual([
      'diameter',
      'mass',
      'closure',
      'spread',
    ])
  })

  it('reads nothing outside the window', () => {
    for (const index of [-1, 7, 60, Number.NaN]) expect(readLot(layout, index)).toBeUndefined()
  })
})

describe('readingText', () => {
  it('is one line of words', () => {
    const reading = readLot(layout, 55)
    expect(reading ? readingText(reading) : '').toMatch(
      /^LA-356, \d+ Oct: Diameter 255\.79, \+4\.5\u00a0σ; Mass per metre, weighed 40\d\.\d, \+\d\.\d\u00a0σ; Closure .*; Spread within the lot /,
    )
  })
})

describe('pointerShapes', () => {
  it('rings every note of the lot and breaks its line 8 px around each', () => {
    fc.assert(
      fc.property(anyChart(), anyWidth, fc.nat({ max: 80 }), (input, width, index) => {
        const own = layoutStaffChart(buildStaffChart(input), width)
        const shapes = pointerShapes(own, index)
        const reading = readLot(own, index)
        if (!reading) {
          expect(shapes).toEqual([])
          return
        }
        for (const number of numbersIn(shapes)) expect(Number.isFinite(number)).toBe(true)
        const rings = allShapes(shapes).filter((shape) => shape.kind === 'ellipse')
        const noted = own.chart.staves.filter(({ notes }) => notes.some((note) => note.index === index))
        expect(rings.map(({ role }) => role?.stave)).toEqual(noted.map(({ key }) => key))
        const line = shapes.find((shape) => shape.kind === 'path')
        const stretches = line?.kind === 'path' ? line.segments.map((segment) => Number(segment[2])) : []
        for (const ring of rings) {
          expect(ring).toMatchObject({ rx: 9, ry: 7.2, cx: own.frame.xAt(index), stroke: 'brass' })
          for (let at = 0; at + 1 < stretches.length; at += 2) {
            const [from = 0, to = 0] = [stretches[at], stretches[at + 1]]
            expect(from >= ring.cy + 8 - 1e-6 || to <= ring.cy - 8 + 1e-6).toBe(true)
          }
        }
        // The flag stays on the page.
        const flag = shapes.find((shape) => shape.kind === 'rect')
        if (flag?.kind === 'rect') {
          expect(flag.x).toBeGreaterThanOrEqual(0)
          expect(flag.x + flag.w).toBeLessThanOrEqual(width)
        }
      }),
      { numRuns: 150, seed: 2 },
    )
  })

  it('rings a note that a crowded chart does not draw', () => {
    const crowded = layoutStaffChart(buildStaffChart(sampleChart({ lots: 160 })))
    const drawn = new Set(crowded.staves[2]?.notes.map(({ note }) => note.index))
    const hidden = crowded.chart.staves[2]?.notes.find(({ index }) => !drawn.has(index))
    expect(hidden).toBeDefined()
    const rings = allShapes(pointerShapes(crowded, hidden?.index ?? -1)).filter(
      (shape) => shape.kind === 'ellipse' && shape.role?.stave === 'closure',
    )
    expect(rings).toHaveLength(1)
  })
})

describe('readingShapes', () => {
  it('writes value and distance beside each stave, 17 px in brass', () => {
    const texts = textsIn(readingShapes(layout, 55))
    expect(texts).toHaveLength(8)
    for (const [place, { readout, stave }] of layout.staves.entries()) {
      const note = stave.notes.find(({ index }) => index === 55)
      expect(texts[2 * place]).toMatchObject({
        x: readout.valueX,
        y: readout.y,
        text: valueText(note?.value, stave),
        size: 17,
        ink: 'brass',
      })
      expect(texts[2 * place + 1]).toMatchObject({ x: readout.sigmaX, anchor: 'end' })
    }
    expect(readingShapes(layout, 7)).toEqual([])
  })
})
