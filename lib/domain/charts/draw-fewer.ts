import type { BarLine, ChartSlur } from './staff-chart'

/** Bar lines nearer than this, in px, would be a hatch. */
export const BARS_APART = 6
/** Steps of limits nearer than this, in px, would be a blot. */
const SEGMENTS_APART = 2
/** A run narrower than this, in px, has a small slur of a fixed shape over its furthest note. */
export const NARROW_RUN = 12
/** Where runs crowd, one stands for each column of so many px on either side of the staff. */
const RUN_COLUMN = 4

/** A bar line that is drawn, and how many near it are not: those are read by the pointer and in the table. */
export interface DrawnBar {
  readonly bar: BarLine
  readonly x: number
  readonly near: number
}

/**
 * Bar lines at least 6 px apart, in order of lots: the lower `rankOf` chooses first, later before earlier; each one
 * left out is counted at a line that took its place. No more than one for 6 px of width are drawn.
 */
export function drawnBars(
  bars: readonly BarLine[],
  xOf: (bar: BarLine) => number,
  rankOf: (bar: BarLine) => number,
): DrawnBar[] {
  const cells = new Map<number, { bar: BarLine; x: number; near: number }>()
  for (const bar of bars.toSorted((a, b) => rankOf(a) - rankOf(b) || b.atIndex - a.atIndex)) {
    const x = xOf(bar)
    const cell = Math.floor(x / BARS_APART)
    const taken = [cell, cell - 1, cell + 1]
      .map((one) => cells.get(one))
      .find((one) => one && Math.abs(one.x - x) < BARS_APART - 1e-9)
    if (taken) taken.near += 1
    else cells.set(cell, { bar, x, near: 0 })
  }
  return [...cells.values()].sort((a, b) => a.x - b.x)
}

/** Stretches that are wide enough to be seen, the last one always: at most one for two px. */
export function seenStretches<T extends { readonly x1: number; readonly x2: number }>(
  stretches: readonly T[],
): T[] {
  let end = Number.NEGATIVE_INFINITY
  return stretches.filter(({ x1, x2 }, place) => {
    const seen = x2 - Math.max(end, x1) >= SEGMENTS_APART || place === stretches.length - 1
    if (seen) end = x2
    return seen
  })
}

const weight = { open: 2, answered: 1, 'no-longer-holds': 0 } as const

/**
 * The runs of a stave that are drawn: all of them, or where more lie in the window than one for 4 px of `width`, in
 * each column of 4 px and on each side one, an unanswered one before the others, the longer before the shorter.
 */
export function drawnRuns(
  slurs: readonly ChartSlur[],
  step: number,
  width: number,
): { readonly slurs: readonly ChartSlur[]; readonly hidden: number } {
  if (slurs.length <= Math.max(20, width / RUN_COLUMN)) return { slurs, hidden: 0 }
  const columns = new Map<string, ChartSlur>()
  for (const slur of slurs) {
    const column = `${Math.floor(((slur.members[0] ?? 0) * step) / RUN_COLUMN)} ${slur.side}`
    const before = columns.get(column)
    const more =
      before && (weight[slur.state] - weight[before.state] || slur.members.length - before.members.length)
    if (more === undefined || more > 0) columns.set(column, slur)
  }
  const kept = new Set(columns.values())
  return { slurs: slurs.filter((slur) => kept.has(slur)), hidden: slurs.length - kept.size }
}
