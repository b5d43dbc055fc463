import type { MarkKind, Shape, TextShape } from '@/lib/domain/charts/shape'

/** All shapes of a drawing, groups and what they hold. */
export const allShapes = (shapes: readonly Shape[]): Shape[] =>
  shapes.flatMap((shape) => (shape.kind === 'group' ? [shape, ...allShapes(shape.shapes)] : [shape]))

/** The marks of one kind, on one stave or on all. */
export const marksIn = (shapes: readonly Shape[], mark: MarkKind, stave?: string): Shape[] =>
  allShapes(shapes).filter(({ role }) => role?.mark === mark && (stave === undefined || role.stave === stave))

export const textsIn = (shapes: readonly Shape[]): TextShape[] =>
  allShapes(shapes).filter((shape) => shape.kind === 'text')

function numbersOf(shape: Shape): readonly number[] {
  switch (shape.kind) {
    case 'path':
      return shape.segments.flatMap((segment) => segment.filter((part) => typeof part === 'number'))
    case 'ellipse':
      return [shape.cx, shape.cy, shape.rx, shape.ry]
    case 'rect':
      return [shape.x, shape.y, shape.w, shape.h]
    case 'text':
      return [shape.x, shape.y]
    case 'group':
      return []
  }
}

/** Every number that decides where a shape is or how large: none may be anything but finite. */
export const numbersIn = (shapes: readonly Shape[]): number[] => allShapes(shapes).flatMap(numbersOf)
