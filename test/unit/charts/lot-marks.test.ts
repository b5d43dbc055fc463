import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { lotMarks } from '@/lib/domain/charts/lot-marks'
import { allShapes, marksIn, numbersIn, textsIn } from '@/test/support/drawing'

const marks = (values: readonly number[], more: Partial<Parameters<typeof lotMarks>[0]> = {}) =>
  lotMarks({ unit: 'mg/m', decimals: 1, values, mean: 397.9, band: { from: 396.4, to: 399.4 }, ...more })

describe('lotMarks', () => {
  it('draws one note a lot, piled where its mean lies, none over another', () => {
    fc.assert(
      fc.property(fc.array(fc.double({ min: 390, max: 406, noNaN: true }), { maxLength: 120 }), (values) => {
        const { shapes, width, height } = marks(values)
        const notes = marksIn(shapes, 'lot')
        expect(notes).toHaveLength(values.length)
        const places = notes.map((note) => (note.kind === 'ellipse' ? `${note.cx} ${note.cy}` : ''))
        expect(new Set(places).size).toBe(values.length)
        for (const number of numbersIn(shapes)) expect(Number.isFinite(number)).toBe(true)
        for (const note of notes)
          if (note.kind === 'ellipse') {
            expect(note.cx >= 0 && note.cx <= width).toBe(true)
            expect(note.cy >= 0 && note.cy <= height).toBe(true)
          }
      }),
      { numRuns: 100, seed: 1 },
    )
  })

  it('stands each note within half a pile of its value, and keeps their order', () => {
    const values = [394, 396, 397, 397.9, 399, 402]
    const { shapes } = marks(values)
    const xs = marksIn(shapes, 'lot').map((note) => (note.kind === 'ellipse' ? note.cx : 0))
    const [from, to] = [394 - 8 * 0.18, 402 + 8 * 0.18]
    for (const [index, x] of xs.entries())
      expect(Math.abs(x - (((values[index] ?? 0) - from) / (to - from)) * 330)).toBeLessThanOrEqual(
        4.5 + 1e-9,
      )
  })

  it('shows the band and the mean that are stated, and says them', () => {
    const { shapes, label } = marks([397, 398])
    expect(label).toBe('2 lots, mean 397.9 mg/m, from 396.4 to 399.4')
    expect(allShapes(shapes).filter((shape) => shape.kind === 'rect')).toHaveLength(1)
    expect(
      textsIn(shapes)
        .filter(({ weight }) => weight === 600)
        .map(({ text }) => text),
    ).toEqual(['397.9'])
    const xs = textsIn(shapes)
      .map(({ x }) => x)
      .sort((a, b) => a - b)
    for (const [index, x] of xs.slice(1).entries()) expect(x - (xs[index] ?? 0)).toBeGreaterThan(20)
  })

  it('draws no lots, equal lots and lots without a band', () => {
    expect(marksIn(marks([]).shapes, 'lot')).toHaveLength(0)
    const equal = marks(Array(40).fill(397.9), { band: undefined })
    expect(marksIn(equal.shapes, 'lot')).toHaveLength(40)
    expect(equal.height).toBeLessThan(110)
    expect(equal.label).toBe('40 lots, mean 397.9 mg/m')
    for (const number of numbersIn(equal.shapes)) expect(Number.isFinite(number)).toBe(true)
  })
})
