import { firstNoteFrom } from './note-at'
import { LEAST_STEP } from './plot-frame'
import type { ChartNote, ChartSlur, StaveModel } from './staff-chart'

/** Heads nearer than this in height hide each other within one column. */
const HEAD_HEIGHT = 8.4

/** What is drawn of the notes of a stave. */
export interface DrawnNotes {
  /** Lot indices. */
  readonly kept: ReadonlySet<number>
  /** Notes of signals that are hidden behind one further out in the same column of pixels. */
  readonly hidden: number
}

/** Where more than these lie in one window, each column of pixels keeps only the outermost. */
export const mostSignalNotes = (width: number): number => Math.max(60, Math.floor(width))

/**
 * Which notes of a stave are drawn when lots stand closer than 12 px: columns of at least 12 px keep their highest
 * and lowest note (one of them where the two would hide each other: the one further out); every note that has
 * left its limits, every note of a signal that is no run, the ends of every run and the notes on either side of a
 * change (`changes`: index of the first lot after it) stay. Everything is drawn when there is room.
 *
 * `width` is that of the plot in px. When more signals than that lie in the window, each column of one px keeps the
 * outermost of them, an open one before the others. So no more notes are drawn than 1 + 2/12 a px of width, two
 * for each change and two for each run of `slurs`, however many lots there are.
 */
export function drawnNotes(
  stave: StaveModel,
  step: number,
  heightOf: (value: number) => number,
  changes: readonly number[] = [],
  width = Number.POSITIVE_INFINITY,
  slurs: readonly ChartSlur[] = stave.slurs,
): DrawnNotes {
  const { notes } = stave
  const perColumn = Math.ceil(LEAST_STEP / step - 1e-9)
  if (perColumn <= 1) return { kept: new Set(notes.map(({ index }) => index)), hidden: 0 }
  const kept = new Set<number>()
  for (const { members } of slurs)
    for (const end of [members[0], members.at(-1)]) if (end !== undefined) kept.add(end)
  for (const change of changes) {
    const place = firstNoteFrom(notes, change)
    for (const note of [notes[place - 1], notes[place]]) if (note) kept.add(note.index)
  }
  keepExtremes(stave, perColumn, heightOf, kept)

  const runs = new Set(stave.slurs.map(({ signal }) => signal))
  const told = notes.filter(
    (note) => note.beyond || note.open || note.signals.some((signal) => !runs.has(signal)),
  )
  const stay = told.length <= mostSignalNotes(width) ? told : outermost(told, step, stave.scale.middle)
  for (const { index } of stay) kept.add(index)
  return { kept, hidden: told.reduce((sum, { index }) => sum + (kept.has(index) ? 0 : 1), 0) }
}

/** The indices that `drawnNotes` keeps. */
export const notesToDraw = (...what: Parameters<typeof drawnNotes>): ReadonlySet<number> =>
  drawnNotes(...what).kept

/** Adds the highest and the lowest note of each column to those kept. */
function keepExtremes(
  { notes, scale }: StaveModel,
  perColumn: number,
  heightOf: (value: number) => number,
  kept: Set<number>,
): void {
  for (let at = 0; at < notes.length; ) {
    let [highest, lowest] = [notes[at], notes[at]]
    const column = Math.floor((notes[at]?.index ?? 0) / perColumn)
    for (let note = notes[at]; note && Math.floor(note.index / perColumn) === column; note = notes[++at]) {
      if (!highest || note.value > highest.value) highest = note
      if (!lowest || note.value < lowest.value) lowest = note
    }
    if (!highest || !lowest) return
    const highOut = Math.abs(highest.value - scale.middle) >= Math.abs(lowest.value - scale.middle)
    const apart = Math.abs(heightOf(highest.value) - heightOf(lowest.value)) >= HEAD_HEIGHT
    if (apart || highOut) kept.add(highest.index)
    if (apart || !highOut) kept.add(lowest.index)
  }
}

/** Of notes in order of lots the one furthest out in each column of one px, an open one before the others. */
function outermost(notes: readonly ChartNote[], step: number, middle: number): readonly ChartNote[] {
  const columns = new Map<number, ChartNote>()
  for (const note of notes) {
    const column = Math.floor(note.index * step)
    const before = columns.get(column)
    const further = before && Math.abs(note.value - middle) > Math.abs(before.value - middle)
    if (!before || (note.open === before.open ? further : note.open)) columns.set(column, note)
  }
  return [...columns.values()]
}
