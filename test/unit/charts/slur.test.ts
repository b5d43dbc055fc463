import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import {
  fitSlur,
  handleLength,
  type SlurCurve,
  slurClearance,
  slurOutline,
  slurPoint,
} from '@/lib/domain/charts/slur'
import { seeded } from '@/test/support/staff-chart-sample'

type Point = readonly [number, number]

const points = (heights: readonly number[], step = 14.2): Point[] =>
  heights.map((y, index) => [150 + step * index, y])

const fitted = (notes: readonly Point[], side: -1 | 1 = -1): SlurCurve => {
  const curve = fitSlur(notes, side)
  if (!curve) throw new Error('no slur for these notes')
  return curve
}

/** Distance from a point to the inner edge by brute force: ten thousand places along it. */
function clearanceBySampling(curve: SlurCurve, [x, y]: Point): number {
  let nearest = Number.POSITIVE_INFINITY
  let outside = false
  for (let step = 0; step <= 10_000; step += 1) {
    const [cx, cy] = slurPoint(curve, step / 10_000, 2.1)
    const distance = Math.hypot(cx - x, cy - y)
    if (distance < nearest) {
      nearest = distance
      outside = (cy - y) * curve.side < 0
    }
  }
  return outside ? -nearest : nearest
}

/** How far the slur rises over the furthest of its notes. */
function overFurthest(curve: SlurCurve, notes: readonly Point[]): number {
  const along = Array.from({ length: 401 }, (_, step) => slurPoint(curve, step / 400)[1] * curve.side)
  return Math.max(...along) - Math.max(...notes.map(([, y]) => y * curve.side))
}

const anyRun = fc.record({
  heights: fc.array(fc.double({ min: -119, max: 119, noNaN: true }), { minLength: 2, maxLength: 60 }),
  step: fc.constantFrom(4.7, 12, 14.2, 40),
  side: fc.constantFrom(-1 as const, 1 as const),
})

describe('fitSlur', () => {
  it('draws a level run with the ends 8 px off and the least height', () => {
    const notes = points(Array.from({ length: 9 }, () => -20))
    const curve = fitted(notes)
    expect(curve.start).toEqual([150, -28])
    expect(curve.end).toEqual([150 + 8 * 14.2, -28])
    expect(overFurthest(curve, notes)).toBeNear(8 + 0.75 * 6, { absolute: 1 })
  })

  it('mirrors: a run below has the slur of the same run above, upside down', () => {
    const heights = [-3, -17, -8, -30, -22, -35, -11, -25, -14]
    const above = fitted(points(heights), -1)
    const below = fitted(points(heights.map((y) => -y)), 1)
    for (const t of [0, 0.2, 0.5, 0.9, 1]) {
      expect(slurPoint(below, t)[0]).toBeNear(slurPoint(above, t)[0], { absolute: 1e-9 })
      expect(slurPoint(below, t)[1]).toBeNear(-slurPoint(above, t)[1], { absolute: 1e-9 })
    }
  })

  it('passes every inner note at least 8.5 px clear, starts and ends at least 8 px off, for any run', () => {
    fc.assert(
      fc.property(anyRun, ({ heights, step, side }) => {
        const notes = points(heights, step)
        const curve = fitted(notes, side)
        for (const note of notes.slice(1, -1))
          expect(slurClearance(curve, note)).toBeGreaterThanOrEqual(8.5 - 0.05)
        const [first, last] = [notes[0], notes.at(-1)]
        expect((curve.start[1] - (first?.[1] ?? 0)) * side).toBeGreaterThanOrEqual(8 - 1e-9)
        expect((curve.end[1] - (last?.[1] ?? 0)) * side).toBeGreaterThanOrEqual(8 - 1e-9)
        expect(curve.start[0]).toBe(first?.[0])
        expect(curve.end[0]).toBe(last?.[0])
      }),
      { numRuns: 150, seed: 11 },
    )
  })

  it('stays flat: never more than 45 px over the furthest note, however wild the run', () => {
    fc.assert(
      fc.property(
        fc.array(fc.oneof(fc.double({ min: 0, max: 119, noNaN: true }), fc.constantFrom(0, 119)), {
          minLength: 9,
          maxLength: 60,
        }),
        fc.constantFrom(4.7, 12, 14.2, 40),
        fc.constantFrom(-1 as const, 1 as const),
        (off, step, side) => {
          const notes = points(
            off.map((y) => side * y),
            step,
          )
          expect(overFurthest(fitted(notes, side), notes)).toBeLessThanOrEqual(45)
        },
      ),
      { numRuns: 200, seed: 12 },
    )
  })

  it('lifts no end above the furthest note by more than it must', () => {
    // Forty lots of which only the last and one in the middle stand out: the slur leans, but does not point away.
    const notes = points(Array.from({ length: 40 }, (_, index) => (index === 22 || index === 39 ? -119 : 0)))
    const curve = fitted(notes)
    expect(overFurthest(curve, notes)).toBeLessThanOrEqual(45)
    expect(-119 - curve.end[1]).toBeLessThanOrEqual(30)
  })

  for (const [what, last] of [
    ['climbs away', -100],
    ['falls back to the centre', -2],
  ] as const)
    it(`stays flat over forty lots whose last note ${what}`, () => {
      const next = seeded(40)
      const notes = points([...Array.from({ length: 39 }, () => -30 - 25 * next()), last])
      const curve = fitted(notes)
      expect(overFurthest(curve, notes)).toBeLessThanOrEqual(20)
      for (const note of notes.slice(1, -1))
        expect(slurClearance(curve, note)).toBeGreaterThanOrEqual(8.5 - 0.05)
    })

  it('never costs more than a slur of a coarse grid that is clear, too', () => {
    const heights = [-12, -40, -22, -31, -55, -38, -20, -44, -18]
    const notes = points(heights)
    const curve = fitted(notes)
    const height = (of: SlurCurve): number =>
      (of.startHandle[1] -
        of.start[1] -
        ((of.end[1] - of.start[1]) * handleLength(notes.length * 14.2 - 14.2)) /
          (notes.length * 14.2 - 14.2)) *
      -1
    const cost = (of: SlurCurve): number =>
      height(of) + 0.7 * ((notes[0]?.[1] ?? 0) - of.start[1] - 8 + ((notes.at(-1)?.[1] ?? 0) - of.end[1] - 8))
    const width = (notes.at(-1)?.[0] ?? 0) - 150
    const handle = handleLength(width)
    let cheapest = Number.POSITIVE_INFINITY
    for (let e1 = 8; e1 <= 30; e1 += 2)
      for (let e2 = 8; e2 <= 30; e2 += 2)
        for (let h = 6; h <= 90; h += 1) {
          const [y1, y2] = [(notes[0]?.[1] ?? 0) - e1, (notes.at(-1)?.[1] ?? 0) - e2]
          const lean = ((y2 - y1) * handle) / width
          const other: SlurCurve = {
            start: [150, y1],
            startHandle: [150 + handle, y1 + lean - h],
            endHandle: [150 + width - handle, y2 - lean - h],
            end: [150 + width, y2],
            side: -1,
          }
          const own = h + 0.7 * (e1 + e2 - 16)
          if (own < cheapest && notes.slice(1, -1).every((note) => slurClearance(other, note) >= 8.5))
            cheapest = own
        }
    expect(cheapest).toBeLessThan(200)
    expect(cost(curve)).toBeLessThanOrEqual(cheapest + 0.1)
  })

  it('has no slur for one note, none, or two at one place', () => {
    expect(fitSlur([], -1)).toBeUndefined()
    expect(fitSlur([[10, 0]], -1)).toBeUndefined()
    expect(
      fitSlur(
        [
          [10, 0],
          [10, 5],
        ],
        -1,
      ),
    ).toBeUndefined()
  })

  it('gives the same curve for the same notes', () => {
    const notes = points([-3, -17, -8, -30, -22])
    expect(fitSlur(notes, -1)).toEqual(fitSlur(notes, -1))
  })
})

describe('slurClearance', () => {
  it('agrees with ten thousand places along the edge', () => {
    fc.assert(
      fc.property(
        anyRun,
        fc.double({ min: 0.05, max: 0.95, noNaN: true }),
        fc.double({ min: 3, max: 40, noNaN: true }),
        fc.boolean(),
        ({ heights, step, side }, along, off, isOutside) => {
          const curve = fitted(points(heights, step), side)
          const [x, y] = slurPoint(curve, along, 2.1)
          const point = [x, y + (isOutside ? 1 : -1) * side * off] as const
          const slow = clearanceBySampling(curve, point)
          expect(slurClearance(curve, point)).toBeNear(slow, { absolute: 0.1 })
        },
      ),
      { numRuns: 30, seed: 13 },
    )
  })
})

describe('handleLength', () => {
  it('is 28 % of the width, at most 40 px', () => {
    expect(handleLength(100)).toBeNear(28, { absolute: 1e-9 })
    expect(handleLength(400)).toBe(40)
  })
})

describe('slurOutline', () => {
  it('is thin at the ends and about 1.6 px thick in the middle', () => {
    const curve = fitted(points(Array.from({ length: 12 }, () => -20)))
    expect(slurPoint(curve, 0, 2.1)).toEqual(slurPoint(curve, 0))
    expect(slurPoint(curve, 1, 2.1)).toEqual(slurPoint(curve, 1))
    expect(slurPoint(curve, 0.5, 2.1)[1] - slurPoint(curve, 0.5)[1]).toBeNear(1.6, { absolute: 0.1 })
    expect(slurOutline(curve).map(([letter]) => letter)).toEqual(['M', 'C', 'C', 'Z'])
  })
})
