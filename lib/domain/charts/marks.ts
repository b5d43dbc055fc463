import type { Ink } from './ink'
import type { EllipseShape, Paint, PathShape, Role, Segment, TextShape } from './shape'

/** Note heads lean like handwriting: degrees. */
export const NOTE_TURN = -20

/** One straight line, or several with one paint: [x1, y1, x2, y2] each. */
export const lines = (
  ends: readonly (readonly [number, number, number, number])[],
  paint: Paint,
  role?: Role,
): PathShape => ({
  kind: 'path',
  segments: ends.flatMap(([x1, y1, x2, y2]): Segment[] => [
    ['M', x1, y1],
    ['L', x2, y2],
  ]),
  ...paint,
  role,
})

/** A line through points. */
export const polyline = (
  points: readonly (readonly [number, number])[],
  paint: Paint,
  more: { readonly closed?: boolean; readonly role?: Role } = {},
): PathShape => ({
  kind: 'path',
  segments: [
    ...points.map(([x, y], index): Segment => [index === 0 ? 'M' : 'L', x, y]),
    ...(more.closed ? ([['Z']] as const) : []),
  ],
  ...paint,
  role: more.role,
})

/** A filled note head of a given half width. */
export const noteHead = (
  cx: number,
  cy: number,
  ink: Ink,
  size: { readonly rx: number; readonly ry: number } = { rx: 5.8, ry: 4.2 },
  role?: Role,
): EllipseShape => ({ kind: 'ellipse', cx, cy, ...size, turn: NOTE_TURN, fill: ink, role })

/** An open note head: paper inside. */
export const openHead = (
  cx: number,
  cy: number,
  ink: Ink,
  size: { readonly rx: number; readonly ry: number } = { rx: 5.2, ry: 3.6 },
  role?: Role,
  width = 1.3,
): EllipseShape => ({
  kind: 'ellipse',
  cx,
  cy,
  ...size,
  turn: NOTE_TURN,
  fill: 'paper',
  stroke: ink,
  width,
  role,
})

/** Chart words; 11 px of the sans unless told otherwise. */
export const words = (x: number, y: number, text: string, more: Partial<TextShape> = {}): TextShape => ({
  kind: 'text',
  x,
  y,
  text,
  ...more,
})
