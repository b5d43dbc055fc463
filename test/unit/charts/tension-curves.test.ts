import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { type TensionCurvesInput, tensionCurves } from '@/lib/domain/charts/tension-curves'
import { marksIn, numbersIn, textsIn } from '@/test/support/drawing'

const curve = (label: string, length: number) => ({
  label,
  points: Array.from({ length: 13 }, (_, step) => ({
    semitone: step - 6,
    tension: length * 60 * 2 ** (step / 6),
  })),
})

const input = (more: Partial<TensionCurvesInput> = {}): TensionCurvesInput => ({
  unit: 'N',
  curves: [curve('864 mm', 1.3), curve('648 mm', 1), curve('580 mm', 0.9)],
  pitches: Array.from({ length: 13 }, (_, step) => ({ semitone: step - 6, label: `p${step}` })),
  breaking: 280,
  working: { from: 90, to: 180, upper: 220 },
  ...more,
})

const pathOf = (drawing: ReturnType<typeof tensionCurves>, label: string) => {
  const path = marksIn(drawing.shapes, 'curve').find(({ role }) => role?.state === label)
  return path?.kind === 'path' ? path.segments.map(([, x, y]) => [Number(x), Number(y)] as const) : []
}

describe('tensionCurves', () => {
  it('draws every curve rising, the longer string above the shorter', () => {
    const drawing = tensionCurves(input())
    const [long, short] = [pathOf(drawing, '864 mm'), pathOf(drawing, '580 mm')]
    expect(short).toHaveLength(13)
    for (const points of [long, short])
      for (const [index, [x, y]] of points.slice(1).entries()) {
        expect(x).toBeGreaterThan(points[index]?.[0] ?? Number.NaN)
        expect(y).toBeLessThan(points[index]?.[1] ?? Number.NaN)
      }
    expect(long[0]?.[1]).toBeLessThan(short[0]?.[1] ?? 0)
  })

  it('cuts curves at the breaking tension and says it', () => {
    const drawing = tensionCurves(input())
    const breaking = marksIn(drawing.shapes, 'limit-line')[0]
    const at = breaking?.kind === 'path' ? Number(breaking.segments[0]?.[2]) : Number.NaN
    for (const [, y] of pathOf(drawing, '864 mm')) expect(y).toBeGreaterThanOrEqual(at - 1e-6)
    expect(pathOf(drawing, '864 mm').at(-1)?.[1]).toBeNear(at, { absolute: 1e-6 })
    expect(textsIn(drawing.shapes).map(({ text }) => text)).toContain('breaks near 280 N')
  })

  it('leaves out a breaking tension that is far above, and zones that are not given', () => {
    const drawing = tensionCurves(input({ breaking: 5000, working: undefined }))
    expect(marksIn(drawing.shapes, 'limit-line')).toHaveLength(0)
    expect(textsIn(drawing.shapes).map(({ text }) => text)).not.toContain('working zone')
    expect(textsIn(tensionCurves(input()).shapes).map(({ text }) => text)).toContain('working zone')
  })

  it('tells curves apart by their strokes, names them, and names pitches clear of each other', () => {
    const drawing = tensionCurves(input())
    const strokes = marksIn(drawing.shapes, 'curve').map((path) =>
      path.kind === 'path' ? JSON.stringify([path.dash, path.width]) : '',
    )
    expect(new Set(strokes).size).toBe(3)
    const texts = textsIn(drawing.shapes)
    expect(texts.map(({ text }) => text)).toEqual(expect.arrayContaining(['864 mm', '648 mm', '580 mm', 'N']))
    const pitches = texts.filter(({ text }) => /^p\d+$/.test(text)).map(({ x }) => x)
    expect(pitches.length).toBeGreaterThan(5)
    for (const [index, x] of pitches.slice(1).entries())
      expect(x - (pitches[index] ?? 0)).toBeGreaterThanOrEqual(26)
  })

  it('is finite for no curves, one point, and any tensions', () => {
    fc.assert(
      fc.property(
        fc.array(fc.array(fc.double({ min: 0, max: 1e6, noNaN: true }), { maxLength: 10 }), { maxLength: 5 }),
        fc.option(fc.double({ min: 0, max: 1e6, noNaN: true }), { nil: undefined }),
        (tensions, breaking) => {
          const { shapes } = tensionCurves(
            input({
              breaking,
              curves: tensions.map((all, index) => ({
                label: `${index}`,
                points: all.map((tension, semitone) => ({ semitone, tension })),
              })),
              pitches: [{ semitone: 0, label: 'E4' }],
            }),
          )
          for (const number of numbersIn(shapes)) expect(Number.isFinite(number)).toBe(true)
        },
      ),
      { numRuns: 150, seed: 1 },
    )
  })
})
