import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import {
  type Box,
  boxesTouch,
  labelBox,
  placeLabels,
  spreadColumn,
  type Wish,
} from '@/lib/domain/charts/place-labels'

const within: Box = { x: 0, y: 0, w: 400, h: 200 }
const anyBox = fc.record({
  x: fc.integer({ min: 0, max: 380 }),
  y: fc.integer({ min: 0, max: 190 }),
  w: fc.integer({ min: 1, max: 30 }),
  h: fc.integer({ min: 1, max: 20 }),
})
const anyWish: fc.Arbitrary<Wish<number>> = fc.record({
  of: fc.nat(),
  text: fc.constantFrom('255.79', 'nine above centre', 'upper tolerance, specification revision 6'),
  shorter: fc.option(fc.constant('upper'), { nil: undefined }),
  size: fc.constantFrom(11, 13),
  face: fc.constantFrom('sans' as const, 'strong' as const, 'italic' as const),
  rank: fc.integer({ min: 0, max: 5 }),
  spots: fc.array(
    fc.record({
      x: fc.integer({ min: -20, max: 420 }),
      y: fc.integer({ min: -20, max: 220 }),
      anchor: fc.constantFrom('start' as const, 'middle' as const, 'end' as const),
    }),
    { maxLength: 6 },
  ),
})

const wish = (text: string, rank: number, x: number, more: Partial<Wish<string>> = {}): Wish<string> => ({
  of: text,
  text,
  size: 11,
  face: 'sans',
  rank,
  spots: [{ x, y: 50, anchor: 'middle' }],
  ...more,
})

describe('placeLabels', () => {
  it('lets no label touch a mark, a bar line, another label or the edge', () => {
    fc.assert(
      fc.property(
        fc.array(anyWish, { maxLength: 12 }),
        fc.array(anyBox, { maxLength: 12 }),
        fc.array(fc.integer({ min: 0, max: 400 }), { maxLength: 3 }),
        (wishes, taken, bars) => {
          const lines = bars.map((x) => ({ x, y1: 10, y2: 150 }))
          const placed = placeLabels(wishes, { taken, bars: lines, within }).map(({ of, text, spot }) => {
            const own = wishes.find((one) => one.of === of && [one.text, one.shorter].includes(text))
            if (!own) throw new Error('a label that nobody wished for')
            expect(own.spots).toContainEqual(spot)
            return labelBox(text, own.size, own.face, spot)
          })
          placed.forEach((box, index) => {
            for (const mark of taken) expect(boxesTouch(box, mark)).toBe(false)
            for (const { x, y1, y2 } of lines)
              expect(boxesTouch(box, { x, y: y1, w: 0, h: y2 - y1 })).toBe(false)
            for (const other of placed.slice(index + 1)) expect(boxesTouch(box, other, 2.9)).toBe(false)
            expect(box.x >= 0 && box.x + box.w <= 400 && box.y >= 0 && box.y + box.h <= 200).toBe(true)
          })
        },
      ),
      { numRuns: 300, seed: 1 },
    )
  })

  it('lets the one further out choose first and leaves out the other', () => {
    const placed = placeLabels([wish('254.9', 1, 100), wish('255.8', 9, 110)], {
      taken: [],
      bars: [],
      within,
    })
    expect(placed.map(({ text }) => text)).toEqual(['255.8'])
  })

  it('takes the first free spot', () => {
    const [placed] = placeLabels(
      [
        wish('255.8', 1, 0, {
          spots: [
            { x: 100, y: 50, anchor: 'start' },
            { x: 100, y: 90, anchor: 'start' },
          ],
        }),
      ],
      { taken: [{ x: 110, y: 45, w: 4, h: 4 }], bars: [], within },
    )
    expect(placed?.spot).toEqual({ x: 100, y: 90, anchor: 'start' })
  })

  it('says the shorter text where the whole has no room', () => {
    const taken = [{ x: 150, y: 30, w: 10, h: 40 }]
    const long = wish('upper tolerance, specification revision 6', 1, 0, {
      shorter: 'upper tolerance',
      spots: [{ x: 20, y: 50, anchor: 'start' }],
    })
    expect(placeLabels([long], { taken, bars: [], within })[0]?.text).toBe('upper tolerance')
    expect(placeLabels([long], { taken: [], bars: [], within })[0]?.text).toBe(long.text)
  })
})

describe('labelBox', () => {
  it('stands on its baseline, left, around or right of its place', () => {
    const at = (anchor: 'start' | 'middle' | 'end') => labelBox('0000', 10, 'sans', { x: 100, y: 50, anchor })
    expect(at('start').x).toBe(100)
    expect(at('middle').x).toBe(88)
    expect(at('end').x).toBe(76)
    expect(at('start').w).toBe(24)
    expect(at('start').y).toBeLessThan(50 - 7)
    expect(at('start').y + at('start').h).toBeGreaterThan(50)
  })
})

describe('spreadColumn', () => {
  it('leaves alone what stands apart', () => {
    expect(spreadColumn([0, 40, 20], 12)).toEqual([0, 40, 20])
    expect(spreadColumn([], 12)).toEqual([])
  })

  it('moves equal values apart around their place', () => {
    expect(spreadColumn([50, 50], 12)).toEqual([44, 56])
  })

  it('keeps order and distance for any heights, and the mean of all', () => {
    fc.assert(
      fc.property(
        fc.array(fc.double({ min: -500, max: 500, noNaN: true }), { maxLength: 8 }),
        fc.integer({ min: 1, max: 30 }),
        (heights, apart) => {
          const moved = spreadColumn(heights, apart)
          const order = heights.map((_, index) => index).sort((a, b) => (heights[a] ?? 0) - (heights[b] ?? 0))
          order.slice(1).forEach((index, place) => {
            const before = order[place] ?? 0
            expect((moved[index] ?? 0) - (moved[before] ?? 0)).toBeGreaterThanOrEqual(apart - 1e-6)
          })
          const sum = (all: readonly number[]): number => all.reduce((total, one) => total + one, 0)
          expect(sum(moved)).toBeNear(sum(heights), { absolute: 1e-6 })
        },
      ),
      { numRuns: 200, seed: 2 },
    )
  })
})
