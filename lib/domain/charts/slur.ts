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

/** Distance from the origin to the line from a to b. */
function distanceToLine(ax: number, ay: number, bx: number, by: number): number {
  const [dx, dy] = [bx - ax, by - ay]
  const length = dx * dx + dy * dy
  const along = length === 0 ? 0 : Math.min(1, Math.max(0, -(ax * dx + ay * dy) / length))
  const [x, y] = [ax + along * dx, ay + along * dy]
  return Math.sqrt(x * x + y * y)
}

/** How near the inner edge of a slur comes to a point, px; negative when the point lies on its outer side. */
export function slurClearance(curve: SlurCurve, [x, y]: Point): number {
  const steps = Math.max(64, Math.ceil(curve.end[0] - curve.start[0]))
  let nearest = Number.POSITIVE_INFINITY
  let sign = 1
  let [ax, ay] = slurPoint(curve, 0, TAPER)
  for (let step = 1; step <= steps; step += 1) {
    const [bx, by] = slurPoint(curve, step / steps, TAPER)
    const distance = distanceToLine(ax - x, ay - y, bx - x, by - y)
    if (distance < nearest) {
      nearest = distance
      // On which side of the stretch, produced both ways, the point lies.
      sign = ((bx - ax) * (ay - y) + (x - ax) * (by - ay)) * curve.side < 0 ? -1 : 1
    }
    ax = bx
    ay = by
  }
  return sign * nearest
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

/**
 * The inner edge near one note, sampled: x and outward height relative to the note, the height split into what
 * each end offset and the slur's height add to it. x does not depend on any of them, so all is known beforehand.
 */
interface Neighbour {
  readonly x: Float64Array
  readonly fixed: Float64Array
  readonly perFirst: Float64Array
  readonly perLast: Float64Array
  readonly perHeight: Float64Array
}

/** Outward height of the inner edge over its level ends, for one parameter. */
function shares(t: number, lean: number): readonly [number, number, number] {
  const s = 1 - t
  const [b0, b1, b2, b3] = [s * s * s, 3 * s * s * t, 3 * s * t * t, t * t * t]
  return [b0 + b1 * (1 - lean) + b2 * lean, b1 * lean + b2 * (1 - lean) + b3, b1 + b2]
}

function neighboursOf(notes: readonly Point[], first: Point, last: Point, side: -1 | 1): Neighbour[] {
  const width = last[0] - first[0]
  const lean = handleLength(width) / width
  const flat = curveOf(first, last, side, 0, 0, 0)
  const steps = Math.max(48, Math.ceil(width / 2))
  const samples = Array.from({ length: steps + 1 }, (_, step) => step / steps).map((t) => ({
    x: slurPoint(flat, t)[0],
    parts: shares(t, lean),
  }))
  return notes.map(([x, y]) => {
    // One sample further on either side, so that the edge is whole over the stretch that matters.
    const from = samples.findIndex((sample) => sample.x >= x - CLEAR - 1)
    const to = samples.findLastIndex((sample) => sample.x <= x + CLEAR + 1)
    const near = samples.slice(Math.max(0, from - 1), to + 2)
    return {
      x: Float64Array.from(near, (sample) => sample.x - x),
      fixed: Float64Array.from(
        near,
        ({ parts: [one, other] }) => side * (first[1] * one + last[1] * other - y),
      ),
      perFirst: Float64Array.from(near, ({ parts }) => parts[0]),
      perLast: Float64Array.from(near, ({ parts }) => parts[1]),
      perHeight: Float64Array.from(near, ({ parts }) => parts[2]),
    }
  })
}

/** The edge passes outside the note and stays clear of its head. */
function isClearOf(
  { x, fixed, perFirst, perLast, perHeight }: Neighbour,
  e1: number,
  e2: number,
  height: number,
): boolean {
  const inner = height - TAPER
  let beforeX = 0
  let before = 0
  for (let at = 0; at < x.length; at += 1) {
    const nowX = x[at] ?? 0
    const now =
      (fixed[at] ?? 0) + e1 * (perFirst[at] ?? 0) + e2 * (perLast[at] ?? 0) + inner * (perHeight[at] ?? 0)
    if (at > 0) {
      if (distanceToLine(beforeX, before, nowX, now) < CLEAR) return false
      if (beforeX <= 0 && nowX >= 0 && before + now < 0) return false
    }
    beforeX = nowX
    before = now
  }
  return true
}

/** The smallest height at which every inner note is clear, or undefined when it would not be below `most`. */
function leastHeight(neighbours: Neighbour[], e1: number, e2: number, most: number): number | undefined {
  const isClear = (height: number): boolean => {
    const at = neighbours.findIndex((one) => !isClearOf(one, e1, e2, height))
    const [hit] = at > 0 ? neighbours.splice(at, 1) : []
    // The note that was in the way is asked first next time: it will mostly be in the way again.
    if (hit) neighbours.unshift(hit)
    return at < 0
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
  const inner = neighboursOf(notes.slice(1, -1), first, last, side)
  const spread = Math.max(...notes.map(([, y]) => y)) - Math.min(...notes.map(([, y]) => y))
  let best: { cost: number; e1: number; e2: number; height: number } | undefined
  const furthest = Math.max(...notes.map(([, y]) => side * y))
  for (const e1 of endOffsets(furthest - side * first[1]))
    for (const e2 of endOffsets(furthest - side * last[1])) {
      const extra = EXTRA_OFFSET_COST * (e1 + e2 - 2 * END_OFFSET)
      const most = Math.min(3 * spread + 60, (best?.cost ?? Number.POSITIVE_INFINITY) - extra)
      if (most < LEAST_HEIGHT) continue
      const height = leastHeight(inner, e1, e2, most)
      if (height !== undefined && (best === undefined || height + extra < best.cost))
        best = { cost: height + extra, e1, e2, height }
    }
  // Notes too wild for any slur within reach: the highest of them decides.
  const { e1, e2, height } = best ?? {
    e1: MOST_END_OFFSET,
    e2: MOST_END_OFFSET,
    height: 3 * spread + 60,
  }
  return curveOf(first, last, side, e1, e2, height)
}

/** A small slur of a fixed shape over one place: for a run too narrow to follow its notes. */
export const smallSlur = (x: number, y: number, side: -1 | 1, width: number): SlurCurve =>
  curveOf([x - width / 2, y], [x + width / 2, y], side, END_OFFSET, END_OFFSET, LEAST_HEIGHT)

/**
 * Offsets to try at an end, px off its note: 8 to 30 in steps of two, then in wider steps up to where the end
 * stands clear above the furthest note, which lies `reach` px further out. A long run may climb steeply beside its
 * first or last note; without lifting that end the slur would have to rise like an arch. Beyond the furthest note
 * an end is never lifted: the slur would point away from its notes.
 */
function endOffsets(reach: number): readonly number[] {
  const near = Array.from(
    { length: (MOST_END_OFFSET - END_OFFSET) / 2 + 1 },
    (_, step) => END_OFFSET + 2 * step,
  )
  const beyond = Math.max(0, Math.ceil((reach + CLEAR + 2 - MOST_END_OFFSET) / WIDE_STEP))
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
