import type { Segment } from './shape'

type Point = readonly [number, number]

/** A slur's outer edge; the inner one lies a little nearer to the notes, which makes the taper. */
export interface SlurCurve {
  readonly start: Point
  readonly startHandle: Point
  readonly endHandle: Point
  readonly end: Point
  /** −1: the slur lies above its notes (towards smaller y), +1: below. */
  readonly side: -1 | 1
}

/** How near a slur may come to the head of a note within it, and to its first and last note. */
export const CLEAR = 8.5
const END_OFFSET = 8
const MOST_END_OFFSET = 30
/** Flatter than this a slur reads as a line. */
const LEAST_HEIGHT = 6
const EXTRA_OFFSET_COST = 0.7
/** How much nearer the handles of the inner edge lie: three quarters of it is the thickness in the middle. */
const TAPER = 2.1

/** Length of a Bézier handle: 28 % of the slur's width, at most 40 px. */
export const handleLength = (width: number): number => Math.min(0.28 * width, 40)

const bezier = (a: number, b: number, c: number, d: number, t: number): number => {
  const s = 1 - t
  return s * s * s * a + 3 * s * s * t * b + 3 * s * t * t * c + t * t * t * d
}

/** Where the slur is at parameter t of 0 to 1; `inset` moves both handles towards the notes. */
export const slurPoint = (curve: SlurCurve, t: number, inset = 0): Point => [
  bezier(curve.start[0], curve.startHandle[0], curve.endHandle[0], curve.end[0], t),
  bezier(
    curve.start[1],
    curve.startHandle[1] - curve.side * inset,
    curve.endHandle[1] - curve.side * inset,
    curve.end[1],
    t,
  ),
]

/** The nearest the inner edge of a slur comes to a point; negative when the point lies on its outer side. */
export function slurClearance(curve: SlurCurve, [x, y]: Point): number {
  let nearest = Number.POSITIVE_INFINITY
  let at: Point = curve.start
  for (let step = 0; step <= 96; step++) {
    const [cx, cy] = slurPoint(curve, step / 96, TAPER)
    const distance = Math.hypot(cx - x, cy - y)
    if (distance < nearest) [nearest, at] = [distance, [cx, cy]]
  }
  return (at[1] - y) * curve.side < 0 ? -nearest : nearest
}

/** The curve over a base line that leans from end to end, its handles raised by `height`. */
function curveOf(first: Point, last: Point, side: -1 | 1, e1: number, e2: number, height: number): SlurCurve {
  const width = last[0] - first[0]
  const handle = handleLength(width)
  const y1 = first[1] + side * e1
  const y2 = last[1] + side * e2
  const lean = width === 0 ? 0 : ((y2 - y1) * handle) / width
  return {
    start: [first[0], y1],
    startHandle: [first[0] + handle, y1 + lean + side * height],
    endHandle: [last[0] - handle, y2 - lean + side * height],
    end: [last[0], y2],
    side,
  }
}

/** The smallest height at which every inner note is clear, or undefined when it would not be below `most`. */
function leastHeight(
  notes: readonly Point[],
  of: (height: number) => SlurCurve,
  most: number,
): number | undefined {
  const isClear = (height: number): boolean => {
    const curve = of(height)
    return notes.every((note) => slurClearance(curve, note) >= CLEAR)
  }
  if (isClear(LEAST_HEIGHT)) return LEAST_HEIGHT
  if (!isClear(most)) return undefined
  let [low, high] = [LEAST_HEIGHT, most]
  while (high - low > 0.05) {
    const middle = (low + high) / 2
    if (isClear(middle)) high = middle
    else low = middle
  }
  return high
}

/**
 * Fits a slur to the heads of its notes (px, in order of x, at least two): it begins and ends 8 px or more off the
 * first and last note and leans with them; of all end offsets and heights that leave every inner note at least
 * 8.5 px clear it takes those with the least height + 0.7 × extra offset. Engravers' rule of thumb, own numbers.
 */
export function fitSlur(notes: readonly Point[], side: -1 | 1): SlurCurve | undefined {
  const first = notes[0]
  const last = notes.at(-1)
  if (!first || !last || notes.length < 2 || !(last[0] > first[0])) return undefined
  const inner = notes.slice(1, -1)
  const spread = Math.max(...notes.map(([, y]) => y)) - Math.min(...notes.map(([, y]) => y))
  let best: { cost: number; curve: SlurCurve } | undefined
  for (let e1 = END_OFFSET; e1 <= MOST_END_OFFSET; e1 += 2)
    for (let e2 = END_OFFSET; e2 <= MOST_END_OFFSET; e2 += 2) {
      const extra = EXTRA_OFFSET_COST * (e1 + e2 - 2 * END_OFFSET)
      const most = Math.min(3 * spread + 60, (best?.cost ?? Number.POSITIVE_INFINITY) - extra)
      if (most < LEAST_HEIGHT) continue
      const of = (height: number) => curveOf(first, last, side, e1, e2, height)
      const height = leastHeight(inner, of, most)
      if (height === undefined) continue
      const cost = height + extra
      if (best === undefined || cost < best.cost) best = { cost, curve: of(height) }
    }
  // Notes too wild for any slur within reach: the highest of them decides.
  return best?.curve ?? curveOf(first, last, side, MOST_END_OFFSET, MOST_END_OFFSET, 3 * spread + 60)
}

/** The outline of a slur that is thin at its ends and thicker in the middle; filled and stroked with 0.7 px. */
export function slurOutline(curve: SlurCurve): readonly Segment[] {
  const inner = (handle: Point): Point => [handle[0], handle[1] - curve.side * TAPER]
  const [ix1, iy1] = inner(curve.endHandle)
  const [ix2, iy2] = inner(curve.startHandle)
  return [
    ['M', ...curve.start],
    ['C', ...curve.startHandle, ...curve.endHandle, ...curve.end],
    ['C', ix1, iy1, ix2, iy2, ...curve.start],
    ['Z'],
  ]
}
