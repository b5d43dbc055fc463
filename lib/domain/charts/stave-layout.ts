import { drawnNotes } from './decimate'
import { drawnRuns, NARROW_RUN, seenStretches } from './draw-fewer'
import type { PlotFrame } from './plot-frame'
import { fitSlur, type SlurCurve, slurPoint, smallSlur } from './slur'
import type { ChartNote, ChartSlur, LotWindow, StaffSegment, StaveModel, ToleranceLine } from './staff-chart'
import { STAFF_SPACE } from './stave-scale'

/** How far outside its staff a note is followed; further off it stands at that edge with an arrow. */
const FURTHEST = 77
/** Half of the space between two quiet staves. */
const QUIET = 27
/** Height of the words that may stand outside a mark. */
const WORDS = 17
/** A tolerance that lies within this much of the staff is drawn on any stave, on the first one from further off. */
const TOLERANCE_NEAR = 31
const TOLERANCE_FIRST = 112
const NEAR_NOTE = 21

export interface PlacedNote {
  readonly note: ChartNote
  readonly x: number
  /** px from the middle of the stave, downwards. */
  readonly y: number
  /** Further off than can be drawn: it stands at the edge with an arrow. */
  readonly off?: 'above' | 'below'
}

export interface PlacedSlur {
  readonly slur: ChartSlur
  readonly curve: SlurCurve
  readonly top: number
  readonly bottom: number
}

export interface PlacedSegment {
  readonly segment: StaffSegment
  readonly x1: number
  readonly x2: number
}

/** A stave on its own: all heights in px from its middle, downwards. */
export interface StaveParts {
  readonly stave: StaveModel
  readonly yAt: (value: number) => number
  readonly valueAt: (y: number) => number
  /** The staff itself. */
  readonly top: number
  readonly bottom: number
  readonly notes: readonly PlacedNote[]
  readonly segments: readonly PlacedSegment[]
  readonly slurs: readonly PlacedSlur[]
  readonly tolerances: readonly (ToleranceLine & { readonly y: number })[]
  /** Tolerances too far off to draw: they are told in words. */
  readonly untold: readonly ToleranceLine[]
  /** Room it needs above and below its staff. */
  readonly above: number
  readonly below: number
  /** As much of the room above as no mark needs. */
  readonly freeAbove: number
  /** Nothing lies below the staff. */
  readonly quietBelow: boolean
  /** Signals (notes and runs) that have no mark of their own, as too many lie in the window. */
  readonly hidden: number
}

/** More notes than these are not asked one by one whether a slur is clear of them. */
const MOST_FITTED = 240

/** Of the notes under a slur those that it must clear: where they are many, the furthest out of each 2 px. */
function furthestOf(
  points: readonly (readonly [number, number])[],
  side: -1 | 1,
): readonly (readonly [number, number])[] {
  if (points.length <= MOST_FITTED) return points
  const columns = new Map<number, readonly [number, number]>()
  for (const point of points) {
    const column = Math.floor(point[0] / 2)
    const before = columns.get(column)
    if (!before || side * point[1] > side * before[1]) columns.set(column, point)
  }
  const [first, last] = [points[0], points.at(-1)]
  const inner = [...columns.values()].filter((one) => one !== first && one !== last)
  return [...(first ? [first] : []), ...inner, ...(last ? [last] : [])]
}

function slurOf(slur: ChartSlur, notes: readonly PlacedNote[]): PlacedSlur | undefined {
  const [first, last] = [slur.members[0], slur.members.at(-1)]
  if (first === undefined || last === undefined) return undefined
  const side = slur.side === 'above' ? -1 : 1
  const within = notes.filter(({ note }) => note.index >= first && note.index <= last)
  const points = furthestOf(
    within.map(({ x, y }) => [x, y] as const),
    side,
  )
  const [left, right] = [within[0]?.x ?? 0, within.at(-1)?.x ?? 0]
  const curve =
    right - left >= NARROW_RUN
      ? fitSlur(points, side)
      : smallSlur(
          (left + right) / 2,
          points.reduce((far, [, y]) => (side * y > side * far ? y : far), points[0]?.[1] ?? 0),
          side,
          NARROW_RUN,
        )
  if (!curve) return undefined
  const heights = Array.from({ length: 25 }, (_, step) => slurPoint(curve, step / 24)[1])
  return { slur, curve, top: Math.min(...heights), bottom: Math.max(...heights) }
}

/**
 * Lays out one stave by itself: scale, staff, notes, slurs, and the room they need; `changes` as in notesToDraw.
 * With `held`, the staff keeps the heights it already has on the page.
 */
export function staveParts(
  stave: StaveModel,
  frame: PlotFrame,
  window: LotWindow,
  isFirst: boolean,
  changes: readonly number[] = [],
  held?: Pick<StaveParts, 'top' | 'bottom'>,
): StaveParts {
  const { middle, perSpace } = stave.scale
  const yAt = (value: number): number => ((middle - value) / perSpace) * STAFF_SPACE
  const valueAt = (y: number): number => middle - (y / STAFF_SPACE) * perSpace
  const newest = stave.segments.at(-1)
  const top = held?.top ?? (newest?.upper === undefined ? -3 * STAFF_SPACE : yAt(newest.upper))
  const ownBottom =
    newest?.lower !== undefined
      ? yAt(newest.lower)
      : newest?.upper !== undefined && stave.oneSided
        ? 0
        : 3 * STAFF_SPACE
  const bottom = held?.bottom ?? ownBottom
  const [highest, lowest] = [top - FURTHEST, bottom + FURTHEST]

  const heightOf = (value: number): number => Math.min(lowest, Math.max(highest, yAt(value)))
  const runs = drawnRuns(stave.slurs, frame.step, frame.w)
  const drawn = drawnNotes(stave, frame.step, yAt, changes, frame.w, runs.slurs)
  const notes = stave.notes
    .filter(({ index }) => drawn.kept.has(index))
    .map((note): PlacedNote => {
      const y = yAt(note.value)
      const off = y < highest ? 'above' : y > lowest ? 'below' : undefined
      return { note, x: frame.xAt(note.index), y: heightOf(note.value), off }
    })
  const slurs = runs.slurs.map((slur) => slurOf(slur, notes)).filter((slur) => slur !== undefined)
  const segments = seenStretches(
    stave.segments.map((segment) => ({
      segment,
      x1: segment.fromIndex <= window.from ? frame.x : frame.xAt(segment.fromIndex - 0.5),
      x2: segment.toIndex >= window.to ? frame.x + frame.w : frame.xAt(segment.toIndex + 0.5),
    })),
  )

  const placed = stave.tolerances.map((line) => ({ ...line, y: yAt(line.value) }))
  const isNear = ({ y, side }: { readonly y: number; readonly side: 'above' | 'below' }): boolean => {
    const out = Math.max(top - y, y - bottom)
    return (
      out <= (isFirst && side === 'above' ? TOLERANCE_FIRST : TOLERANCE_NEAR) ||
      (out <= FURTHEST && stave.notes.some(({ value }) => Math.abs(heightOf(value) - y) <= NEAR_NOTE))
    )
  }
  const tolerances = placed.filter(isNear)
  const lines = segments.flatMap(({ segment: { upper, lower, centre } }) => [upper, lower, centre])
  const lineHeights = lines.filter((value) => value !== undefined).map(yAt)
  const needAbove = Math.max(
    0,
    ...notes.map(({ y, note }) => top - y + 8 + (note.beyond === 'above' ? WORDS : 0)),
    ...slurs.map((slur) => top - slur.top + (slur.slur.side === 'above' ? WORDS : 0)),
    ...tolerances.map(({ y }) => top - y + (isFirst ? 40 : WORDS + 4)),
    ...lineHeights.map((y) => top - y + 4),
  )
  const needBelow = Math.max(
    0,
    ...notes.map(({ y, note }) => y - bottom + 8 + (note.beyond === 'below' ? WORDS : 0)),
    ...slurs.map((slur) => slur.bottom - bottom + (slur.slur.side === 'below' ? WORDS : 0)),
    ...tolerances.map(({ y }) => y - bottom + WORDS + 4),
    ...lineHeights.map((y) => y - bottom + 4),
    stave.withoutLimits ? WORDS : 0,
  )
  return {
    stave,
    yAt,
    valueAt,
    top,
    bottom,
    notes,
    segments,
    slurs,
    tolerances,
    untold: placed.filter((line) => !isNear(line)),
    above: Math.min(Math.max(QUIET, needAbove), FURTHEST + TOLERANCE_FIRST),
    below: Math.min(Math.max(QUIET, needBelow), FURTHEST + WORDS + 8),
    freeAbove: Math.max(0, QUIET - needAbove),
    // A head on the lowest line reaches this far below it.
    quietBelow: needBelow <= 8,
    hidden: drawn.hidden + runs.hidden,
  }
}
