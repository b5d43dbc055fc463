import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { type MiniStaffInput, miniStaff } from '@/lib/domain/charts/mini-staff'
import { allShapes, marksIn, numbersIn } from '@/test/support/drawing'

const value = fc.oneof(
  { weight: 6, arbitrary: fc.double({ min: -4, max: 4, noNaN: true }) },
  { weight: 1, arbitrary: fc.constantFrom(undefined, Number.NaN, Number.POSITIVE_INFINITY, 1e12, -1e12) },
)

const input = (more: Partial<MiniStaffInput>): MiniStaffInput => ({ title: 'Diameter', values: [], ...more })

const heights = (all: readonly ReturnType<typeof marksIn>[number][]): number[] =>
  all.map((shape) => (shape.kind === 'ellipse' ? shape.cy : Number.NaN))

describe('miniStaff', () => {
  it('draws one note a lot with a value, five px a σ', () => {
    const { shapes, label } = miniStaff(input({ values: [0, 1, undefined, -3], centre: 0, sigma: 1 }))
    expect(heights(marksIn(shapes, 'note'))).toEqual([24, 19, 39])
    expect(label).toBe('Diameter: 3 lots')
  })

  it('keeps everything it draws within 300 × 46 px, finite, whatever the values and runs', () => {
    fc.assert(
      fc.property(
        fc.array(value, { maxLength: 30 }),
        fc.boolean(),
        fc.boolean(),
        fc.constantFrom(undefined, 0, 1),
        fc.constantFrom('above' as const, 'below' as const),
        (values, oneSided, open, sigma, side) => {
          const sign = side === 'above' ? 1 : -1
          const members = values.map((_, index) => index)
          const { shapes, width, height } = miniStaff(
            input({
              // A run lies on one side of the centre.
              values: values.map((one) => (one === undefined ? undefined : sign * Math.abs(one))),
              centre: 0,
              sigma,
              oneSided,
              runs: [{ members, side, open }],
              leftOut: [0],
              beyond: [{ index: 1, open }],
            }),
          )
          for (const number of numbersIn(shapes)) expect(Number.isFinite(number)).toBe(true)
          for (const shape of allShapes(shapes)) {
            if (shape.kind === 'ellipse') {
              expect(shape.cx - shape.rx >= 0 && shape.cx + shape.rx <= width).toBe(true)
              expect(shape.cy - shape.ry >= 0 && shape.cy + shape.ry <= height).toBe(true)
            }
            if (shape.kind === 'path' && shape.role?.mark === 'slur')
              // The curve lies between its own ends and three quarters of its handles.
              for (let t = 0; t <= 1; t += 0.05) {
                const [, start, curve] = [0, shape.segments[0], shape.segments[1]]
                if (start?.[0] !== 'M' || curve?.[0] !== 'C') throw new Error('a slur is a curve')
                const s = 1 - t
                const y =
                  s ** 3 * start[2] + 3 * s * s * t * curve[2] + 3 * s * t * t * curve[4] + t ** 3 * curve[6]
                expect(y).toBeGreaterThanOrEqual(-0.5)
                expect(y).toBeLessThanOrEqual(height + 0.5)
              }
          }
          expect(marksIn(shapes, 'note')).toHaveLength(values.filter((one) => Number.isFinite(one)).length)
        },
      ),
      { numRuns: 200, seed: 1 },
    )
  })

  it('draws limits only when there are some, and says when there are none', () => {
    const without = miniStaff(input({ values: [1, 2, 3] }))
    expect(without.label).toContain('no limits yet')
    expect(without.shapes[0]).toMatchObject({ dash: [2, 4] })
    const half = miniStaff(input({ values: [1], centre: 0, sigma: 1, oneSided: true }))
    const limits = half.shapes[1]
    expect(limits?.kind === 'path' ? limits.segments.filter(([letter]) => letter === 'M') : []).toHaveLength(
      1,
    )
  })

  it('marks what left its limits with a ledger line, vermilion while open, and leaves out open heads', () => {
    const { shapes } = miniStaff(
      input({
        values: [0, 4, 4, 0],
        centre: 0,
        sigma: 1,
        leftOut: [3],
        beyond: [
          { index: 1, open: true },
          { index: 2, open: false },
        ],
      }),
    )
    expect(marksIn(shapes, 'ledger-line').map((line) => (line.kind === 'path' ? line.stroke : ''))).toEqual([
      'vermilion',
      'ink',
    ])
    expect(marksIn(shapes, 'note').map(({ role }) => role?.state)).toEqual([
      undefined,
      undefined,
      undefined,
      'left-out',
    ])
  })

  it('draws none, one and equal values', () => {
    expect(marksIn(miniStaff(input({})).shapes, 'note')).toHaveLength(0)
    expect(heights(marksIn(miniStaff(input({ values: [7] })).shapes, 'note'))).toEqual([24])
    expect(new Set(heights(marksIn(miniStaff(input({ values: [7, 7, 7] })).shapes, 'note'))).size).toBe(1)
  })
})
