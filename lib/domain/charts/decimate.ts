import { LEAST_STEP } from './plot-frame'
import type { StaveModel } from './staff-chart'

/** Heads nearer than this in height hide each other within one column. */
const HEAD_HEIGHT = 8.4

/**
 * Which notes of a stave are drawn when lots stand closer than 12 px: columns of at least 12 px keep their highest
 * and lowest note (one of them where the two would hide each other: the one further out); every note that has
 * left its limits, every note of a signal that is no run, the ends of every run and the notes on either side of a
 * change (`changes`: index of the first lot after it) stay. Everything is drawn when there is room. Returns lot
 * indices.
 */
export function notesToDraw(
  stave: StaveModel,
  step: number,
  heightOf: (value: number) => number,
  changes: readonly number[] = [],
): ReadonlySet<number> {
  const perColumn = Math.ceil(LEAST_STEP / step - 1e-9)
  if (perColumn <= 1) return new Set(stave.notes.map(({ index }) => index))
  const kept = new Set<number>()
  for (const { members } of stave.slurs)
    for (const end of [members[0], members.at(-1)]) if (end !== undefined) kept.add(end)
  const runs = new Set(stave.slurs.map(({ signal }) => signal))
  for (const note of stave.notes)
    if (note.beyond || note.open || note.signals.some((signal) => !runs.has(signal))) kept.add(note.index)
  for (const change of changes) {
    const before = stave.notes.findLast(({ index }) => index < change)
    const after = stave.notes.find(({ index }) => index >= change)
    for (const note of [before, after]) if (note) kept.add(note.index)
  }
  const columns = new Map<number, (typeof stave.notes)[number][]>()
  for (const note of stave.notes) {
    const column = Math.floor(note.index / perColumn)
    columns.set(column, [...(columns.get(column) ?? []), note])
  }
  for (const notes of columns.values()) {
    const highest = notes.reduce((best, note) => (note.value > best.value ? note : best))
    const lowest = notes.reduce((best, note) => (note.value < best.value ? note : best))
    const outer =
      Math.abs(highest.value - stave.scale.middle) >= Math.abs(lowest.value - stave.scale.middle)
        ? highest
        : lowest
    const apart = Math.abs(heightOf(highest.value) - heightOf(lowest.value)) >= HEAD_HEIGHT
    for (const note of apart ? [highest, lowest] : [outer]) kept.add(note.index)
  }
  return kept
}
