import type { Segment, Shape } from './shape'

/** Maps a place on the page to another. */
export type Place = (x: number, y: number) => readonly [number, number]

function placeSegment(segment: Segment, place: Place): Segment {
  switch (segment[0]) {
    case 'Z':
      return segment
    case 'C':
      return [
        'C',
        ...place(segment[1], segment[2]),
        ...place(segment[3], segment[4]),
        ...place(segment[5], segment[6]),
      ]
    default:
      return [segment[0], ...place(segment[1], segment[2])]
  }
}

/** The same shape at other places: positions follow `place`, the sizes of heads and letters stay. */
export function placeShape(shape: Shape, place: Place): Shape {
  switch (shape.kind) {
    case 'path':
      return { ...shape, segments: shape.segments.map((segment) => placeSegment(segment, place)) }
    case 'ellipse': {
      const [cx, cy] = place(shape.cx, shape.cy)
      return { ...shape, cx, cy }
    }
    case 'rect': {
      const [x, y] = place(shape.x, shape.y)
      const [right, bottom] = place(shape.x + shape.w, shape.y + shape.h)
      return { ...shape, x, y, w: right - x, h: bottom - y }
    }
    case 'text': {
      const [x, y] = place(shape.x, shape.y)
      return { ...shape, x, y }
    }
    case 'group':
      return { ...shape, shapes: shape.shapes.map((one) => placeShape(one, place)) }
  }
}
