import { NARROW_RUN } from './draw-fewer'
import type { Ink } from './ink'
import type { StaffLayout, StaveLayout } from './layout-staff-chart'
import { words } from './marks'
import { type Box, labelBox, placeLabels, type Spot, type Wish } from './place-labels'
import { valueText } from './readout'
import type { Role, TextShape } from './shape'
import { slurPoint } from './slur'
import type { PlacedNote, PlacedSlur } from './stave-layout'

interface Label {
  readonly ink: Ink
  readonly italic: boolean
  readonly role: Role
}

/** About the room that the words of a run take, px. */
const RUN_WORDS = 40

/** Words stand at least 3 px off a limit line. */
const OFF_LINE = 3

const noteBox = ({ x, y: down, note }: PlacedNote, y: number): Box => {
  const half = note.beyond ? 10 : 6
  return { x: x - half, y: y + down - 5, w: 2 * half, h: 10 }
}

function slurBoxes({ curve, top, bottom }: PlacedSlur, y: number): Box[] {
  const [left, right] = [curve.start[0], curve.end[0]]
  if (right - left <= NARROW_RUN) return [{ x: left, y: y + top - 1, w: right - left, h: bottom - top + 3 }]
  return Array.from({ length: 32 }, (_, step) => {
    const [x1, y1] = slurPoint(curve, step / 32)
    const [x2, y2] = slurPoint(curve, (step + 1) / 32)
    return {
      x: Math.min(x1, x2),
      y: y + Math.min(y1, y2) - 1,
      w: Math.abs(x2 - x1),
      h: Math.abs(y2 - y1) + 3,
    }
  })
}

/**
 * 9 px above the head, or below a head that is below; else beside it. On its inner side only where no neighbour
 * lies further out: there one could not say whose value it is.
 */
function noteWish(
  { note, x, y: down, off }: PlacedNote,
  stave: StaveLayout,
  layout: StaffLayout,
): Wish<Label> {
  const y = stave.y + down
  const beyondArrow = off ? 4 : 0
  const outward = note.beyond === 'above' ? -1 : 1
  const isFurthest = !stave.notes.some(
    (other) => other.note !== note && Math.abs(other.x - x) < 30 && (other.y - down) * outward >= 0,
  )
  const above: Spot = { x, y: y - 9 - beyondArrow, anchor: 'middle' }
  const below: Spot = { x, y: y + 17 + beyondArrow, anchor: 'middle' }
  const beside: Spot[] = [
    { x: x + 13, y: y + 4, anchor: 'start' },
    { x: x - 13, y: y + 4, anchor: 'end' },
  ]
  return {
    of: {
      ink: note.open ? 'vermilion' : 'ink',
      italic: false,
      role: { mark: 'value-label', lot: note.code, stave: stave.stave.key },
    },
    text: valueText(note.value, stave.stave, layout.chart),
    size: 11,
    face: 'strong',
    rank: Math.abs(down),
    spots: [
      note.beyond === 'above' ? above : below,
      ...beside,
      ...(isFurthest ? [note.beyond === 'above' ? below : above] : []),
    ],
  }
}

/** Outside slur and staff, in its middle or at its ends, a little further out where that is taken. */
function runWish({ slur, curve, top, bottom }: PlacedSlur, stave: StaveLayout): Wish<Label> {
  const isAbove = slur.side === 'above'
  const edge = isAbove
    ? stave.y + Math.min(top - 5, stave.top - OFF_LINE - 4)
    : stave.y + Math.max(bottom + 14, stave.bottom + OFF_LINE + 10)
  const outward = isAbove ? -1 : 1
  const [left, right] = [curve.start[0], curve.end[0]]
  const places: Omit<Spot, 'y'>[] = [
    { x: (left + right) / 2, anchor: 'middle' },
    { x: right, anchor: 'end' },
    { x: left, anchor: 'start' },
    { x: left - 4, anchor: 'end' },
    { x: right + 4, anchor: 'start' },
  ]
  const beside = stave.y + (isAbove ? stave.top - OFF_LINE - 4 : stave.bottom + OFF_LINE + 10)
  return {
    of: {
      ink: slur.state === 'open' ? 'vermilion' : 'slate',
      italic: true,
      role: { mark: 'run-label', stave: stave.stave.key, signal: slur.signal, state: slur.state },
    },
    text: slur.words,
    size: 13,
    face: 'italic',
    rank: Math.max(Math.abs(top), Math.abs(bottom)),
    spots: [
      ...[0, 5, 10].flatMap((further) => places.map((place) => ({ ...place, y: edge + outward * further }))),
      ...places.slice(3).map((place) => ({ ...place, y: beside })),
    ],
  }
}

/** A tolerance's name at the left end of its line, after a bar line, or at the first free place along the line. */
function toleranceWishes(stave: StaveLayout, { frame, bars }: StaffLayout): Wish<Label>[] {
  const along = Array.from({ length: Math.floor(frame.w / 12) }, (_, place) => frame.x + 12 * (place + 1))
  const starts = [frame.x, frame.x + 4, ...bars.placed.map(({ x }) => x + 4)]
  return stave.tolerances.map((line) => {
    const [out, inwards] = line.side === 'above' ? [-5, 12] : [12, -5]
    return {
      of: { ink: 'vermilion', italic: false, role: { stave: stave.stave.key } },
      text: line.label,
      shorter: line.label.split(',')[0],
      size: 11,
      face: 'sans',
      // Values and runs choose first: they have one place, a name has its whole line.
      rank: Number.NEGATIVE_INFINITY,
      spots: [starts, along].flatMap((places) =>
        [out, inwards].flatMap((off) =>
          places.map((x) => ({
            x: x + (frame.compact ? 2 : 0),
            y: stave.y + line.y + off,
            anchor: 'start' as const,
          })),
        ),
      ),
    }
  })
}

/** Why a stave has no limits: over its newest end, where notes leave room. */
function unlimitedWishes({ stave, y, bottom }: StaveLayout, { frame }: StaffLayout): Wish<Label>[] {
  if (stave.withoutLimits === undefined) return []
  const right = frame.x + frame.w - 4
  const heights = [y - 6, y + 16, y + bottom + 15, y + bottom - 8]
  return [
    {
      of: { ink: 'slate', italic: true, role: { stave: stave.key, state: 'without-limits' } },
      text: stave.withoutLimits,
      size: 13,
      face: 'italic',
      rank: Number.POSITIVE_INFINITY,
      spots: heights.flatMap((height) => [
        { x: right, y: height, anchor: 'end' as const },
        { x: frame.x + 4, y: height, anchor: 'start' as const },
      ]),
    },
  ]
}

/** The notes furthest out of a stave: more values than these would be a wall of figures. */
const MOST_VALUES = 8

function noteWishes(stave: StaveLayout, layout: StaffLayout): Wish<Label>[] {
  return stave.notes
    .filter(({ note }) => note.beyond && !note.leftOut)
    .toSorted((a, b) => Math.abs(b.note.sigmas ?? 0) - Math.abs(a.note.sigmas ?? 0))
    .slice(0, MOST_VALUES)
    .map((placed) => noteWish(placed, stave, layout))
}

/** Words for the unanswered runs first, then for the widest: as many as have room side by side. */
function runWishes(stave: StaveLayout, { frame }: StaffLayout): Wish<Label>[] {
  const widthOf = ({ curve }: PlacedSlur): number => curve.end[0] - curve.start[0]
  const isOpen = ({ slur }: PlacedSlur): number => (slur.state === 'open' ? 1 : 0)
  return stave.slurs
    .toSorted((a, b) => isOpen(b) - isOpen(a) || widthOf(b) - widthOf(a))
    .slice(0, Math.ceil(frame.w / RUN_WORDS))
    .map((slur) => runWish(slur, stave))
}

/** Names of tolerances, values of notes beyond their limits, words of runs: where they touch nothing. */
export function labelShapes(layout: StaffLayout): TextShape[] {
  const { staves, frame, plot, bars } = layout
  const drawnLines = staves.flatMap(({ tolerances, y }) =>
    tolerances.map((line): Box => ({ x: frame.x, y: y + line.y - 1, w: frame.w, h: 2 })),
  )
  const hasStaff = ({ segments }: StaveLayout): boolean =>
    segments.some(({ segment }) => segment.upper !== undefined)
  const staffs = staves.filter(hasStaff).map(
    ({ y, top, bottom }): Box => ({
      x: frame.x,
      y: y + top - OFF_LINE,
      w: frame.w,
      h: bottom - top + 2 * OFF_LINE,
    }),
  )
  const names = frame.compact
    ? staves.flatMap(({ column }) =>
        column.map(({ x, y, text, kind }) =>
          labelBox(text, kind === 'name' ? 13 : 11, 'strong', { x, y, anchor: 'start' }),
        ),
      )
    : []
  const wishes = staves.flatMap((stave) => [
    ...unlimitedWishes(stave, layout),
    ...toleranceWishes(stave, layout),
    ...noteWishes(stave, layout),
    ...runWishes(stave, layout),
  ])
  const placed = placeLabels(wishes, {
    taken: [
      ...drawnLines,
      ...staffs,
      ...names,
      ...staves.flatMap(({ y, notes, slurs }) => [
        ...notes.map((note) => noteBox(note, y)),
        ...slurs.flatMap((slur) => slurBoxes(slur, y)),
      ]),
    ],
    bars: [frame.x, ...bars.placed.flatMap(({ xs }) => xs)].map((x) => ({ x, y1: bars.y1, y2: bars.y2 })),
    within: { x: frame.x, y: plot.y, w: frame.w, h: plot.h },
  })
  return placed.map(({ of, text, spot }) =>
    words(spot.x, spot.y, text, {
      anchor: spot.anchor,
      ink: of.ink,
      role: of.role,
      ...(of.italic
        ? { italic: true, halo: frame.future === undefined || spot.x < frame.future }
        : { weight: of.role.mark === 'value-label' ? 600 : 400 }),
    }),
  )
}
