import type { ChartNote, StaveModel } from './staff-chart'

/** Place in a stave’s notes (in order of lots) of the first one at or after a lot index; their number when none is. */
export function firstNoteFrom(notes: readonly ChartNote[], index: number): number {
  let [low, high] = [0, notes.length]
  while (low < high) {
    const middle = (low + high) >> 1
    if ((notes[middle]?.index ?? Number.POSITIVE_INFINITY) < index) low = middle + 1
    else high = middle
  }
  return low
}

/** The note of one lot on a stave; undefined where the lot has no value. */
export function noteAt({ notes }: StaveModel, index: number): ChartNote | undefined {
  const note = notes[firstNoteFrom(notes, index)]
  return note?.index === index ? note : undefined
}
