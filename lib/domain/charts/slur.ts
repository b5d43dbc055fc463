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
const WIDE_STEP = 6
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

/** Signed distance from a point to the nearest of the points `near`; negative on the outer side of the slur. */
function signedDistance(near: readonly Point[], [x, y]: Point, side: -1 | 1): number {
  let nearest = Number.POSITIVE_INFINITY
  let sign = 1
  for (const [cx, cy] of near) {
    const distance = Math.hypot(cx - x, cy - y)
    if (distance >= nearest) continue
    nearest = distance
    sign = (cy - y) * side < 0 ? -1 : 1
  }
  return sign * nearest
}

/** How near the inner edge of a slur comes to a point, px; negative when the point lies on its outer side. */
export function slurClearance(curve: SlurCurve, point: Point): number {
  const steps = Math.max(64, Math.ceil(curve.end[0] - curve.start[0]))
  const edge = Array.from({ length: steps + 1 }, (_, step) => slurPoint(curve, step / steps, TAPER))
  return signedDistance(edge, point, curve.side)
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

/** A note and the parameters at which a slur passes over it: only these need looking at. */
interface Neighbour {
  readonly note: Point
  readonly at: readonly number[]
}

function neighboursOf(notes: readonly Point[], flat: SlurCurve): Neighbour[] {
  const steps = Math.max(48, Math.ceil((flat.end[0] - flat.start[0]) / 2))
  const all = Array.from({ length: steps + 1 }, (_, step) => step / steps)
  const placed = all.map((t) => [t, slurPoint(flat, t)[0]] as const)
  return notes.map((note) => ({
    note,
    at: placed.filter(([, x]) => Math.abs(x - note[0]) <= CLEAR + 4).map(([t]) => t),
  }))
}

/** The smallest height at which every inner note is clear, or undefined when it would not be below `most`. */
function leastHeight(
  neighbours: readonly Neighbour[],
  of: (height: number) => SlurCurve,
  most: number,
): number | undefined {
  const isClear = (height: number): boolean => {
    const curve = of(height)
    return neighbours.every(({ note, at }) => {
      const near = at.map((t) => slurPoint(curve, t, TAPER))
      return signedDistance(near, note, curve.side) >= CLEAR
    })
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
  const inner = neighboursOf(notes.slice(1, -1), curveOf(first, last, side, 0, 0, 0))
  const spread = Math.max(...notes.map(([, y]) => y)) - Math.min(...notes.map(([, y]) => y))
  let best: { cost: number; curve: SlurCurve } | undefined
  const offsets = endOffsets(spread)
  for (const e1 of offsets)
    for (const e2 of offsets) {
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

/**
 * Offsets to try at either end, px off the note: 8 to 30 in steps of two, then in wider steps up to where the end
 * stands above the furthest note. A long run may climb steeply beside its first or last note; without lifting that
 * end the slur would have to rise like an arch.
 */
function endOffsets(spread: number): readonly number[] {
  const near = Array.from(
    { length: (MOST_END_OFFSET - END_OFFSET) / 2 + 1 },
    (_, step) => END_OFFSET + 2 * step,
  )
  const beyond = Math.max(0, Math.ceil((spread + END_OFFSET - MOST_END_OFFSET) / WIDE_STEP))
  return [...near, ...Array.from({ length: beyond }, (_, step) => MOST_END_OFFSET + WIDE_STEP * (step + 1))]
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
