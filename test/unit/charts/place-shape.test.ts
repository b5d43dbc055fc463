import { describe, expect, it } from 'vitest'
import { placeShape } from '@/lib/domain/charts/place-shape'
import type { Shape } from '@/lib/domain/charts/shape'

const shapes: readonly Shape[] = [
  { kind: 'path', segments: [['M', 1, 2], ['L', 3, 4], ['C', 1, 1, 2, 2, 3, 3], ['Z']], stroke: 'ink' },
  { kind: 'ellipse', cx: 1, cy: 2, rx: 5, ry: 4, turn: -20 },
  { kind: 'rect', x: 1, y: 2, w: 3, h: 4 },
  { kind: 'text', x: 1, y: 2, text: 'nine above centre' },
]

describe('placeShape', () => {
  it('moves places and leaves the sizes of heads and letters', () => {
    const twice = shapes.map((shape) => placeShape(shape, (x, y) => [2 * x, 10 + y]))
    expect(twice).toEqual([
      {
        kind: 'path',
        segments: [['M', 2, 12], ['L', 6, 14], ['C', 2, 11, 4, 12, 6, 13], ['Z']],
        stroke: 'ink',
      },
      { kind: 'ellipse', cx: 2, cy: 12, rx: 5, ry: 4, turn: -20 },
      { kind: 'rect', x: 2, y: 12, w: 6, h: 4 },
      { kind: 'text', x: 2, y: 12, text: 'nine above centre' },
    ])
  })

  it('places what a group holds, and leaves all as it was where places stay', () => {
    const group: Shape = { kind: 'group', href: '/lots/LA-1', shapes }
    expect(placeShape(group, (x, y) => [x, y])).toEqual(group)
  })
})
