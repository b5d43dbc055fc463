import { notesToDraw } from './decimate'
import type { PlotFrame } from './plot-frame'
import { fitSlur, type SlurCurve, slurPoint } from './slur'
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
}

function slurOf(slur: ChartSlur, notes: readonly PlacedNote[]): PlacedSlur | undefined {
  const [first, last] = [slur.members[0], slur.members.at(-1)]
  if (first === undefined || last === undefined) return undefined
  const within = notes.filter(({ note }) => note.index >= first && note.index <= last)
  const curve = fitSlur(
    within.map(({ x, y }) => [x, y] as const),
    slur.side === 'above' ? -1 : 1,
  )
  if (!curve) return undefined
  const heights = Array.from({ length: 25 }, (_, step) => slurPoint(curve, step / 24)[1])
  return { slur, curve, top: Math.min(...heights), bottom: Math.max(...heights) }
}

/** Lays out one stave by itself: scale, staff, notes, slurs, and the room they need; `changes` as in notesToDraw. */
export function staveParts(
  stave: StaveModel,
  frame: PlotFrame,
  window: LotWindow,
  isFirst: boolean,
  changes: readonly number[] = [],
): StaveParts {
  const { middle, perSpace } = stave.scale
  const yAt = (value: number): number => ((middle - value) / perSpace) * STAFF_SPACE
  const valueAt = (y: number): number => middle - (y / STAFF_SPACE) * perSpace
  const newest = stave.segments.at(-1)
  const top = newest?.upper === undefined ? -3 * STAFF_SPACE : yAt(newest.upper)
  const bottom =
    newest?.lower !== undefined
      ? yAt(newest.lower)
      : newest?.upper !== undefined && stave.oneSided
        ? 0
        : 3 * STAFF_SPACE
  const [highest, lowest] = [top - FURTHEST, bottom + FURTHEST]

  const all = stave.notes.map((note): PlacedNote => {
    const y = yAt(note.value)
    const off = y < highest ? 'above' : y > lowest ? 'below' : undefined
    return { note, x: frame.xAt(note.index), y: Math.min(lowest, Math.max(highest, y)), off }
  })
  const drawn = notesToDraw(stave, frame.step, yAt, changes)
  const notes = all.filter(({ note }) => drawn.has(note.index))
  const slurs = stave.slurs.map((slur) => slurOf(slur, all)).filter((slur) => slur !== undefined)
  const segments = stave.segments.map((segment) => ({
    segment,
    x1: segment.fromIndex <= window.from ? frame.x : frame.xAt(segment.fromIndex - 0.5),
    x2: segment.toIndex >= window.to ? frame.x + frame.w : frame.xAt(segment.toIndex + 0.5),
  }))

  const placed = stave.tolerances.map((line) => ({ ...line, y: yAt(line.value) }))
  const isNear = ({ y, side }: { readonly y: number; readonly side: 'above' | 'below' }): boolean => {
    const out = Math.max(top - y, y - bottom)
    return (
      out <= (isFirst && side === 'above' ? TOLERANCE_FIRST : TOLERANCE_NEAR) ||
      (out <= FURTHEST && all.some((one) => Math.abs(one.y - y) <= NEAR_NOTE))
    )
  }
  const tolerances = placed.filter(isNear)
  const lines = stave.segments.flatMap(({ upper, lower, centre }) => [upper, lower, centre])
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
  }
}
