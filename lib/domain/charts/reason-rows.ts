import type { BarLine } from './staff-chart'
import { textWidth } from './text-width'

export interface PlacedReason {
  readonly bar: BarLine
  readonly x: number
  /** 0 or 1; undefined where there is no room: it is read by the pointer and in the table. */
  readonly row?: 0 | 1
}

const widthOf = ({ reason, detail }: BarLine): number =>
  Math.max(textWidth(reason, 13, 'italic') * 1.04, textWidth(detail, 11))

/**
 * Reasons stand under their bar lines in one row, or in a second one where the first is taken; what fits in
 * neither is left out. Changes of limits and dies choose before settings, and later before earlier.
 */
export function reasonRows(
  bars: readonly BarLine[],
  xOf: (bar: BarLine) => number,
  right: number,
): PlacedReason[] {
  const taken: { row: 0 | 1; from: number; to: number }[] = []
  const rows = new Map<BarLine, 0 | 1>()
  const rank = ({ kinds }: BarLine): number =>
    kinds.includes('limit-set') ? 0 : kinds.includes('die') || kinds.includes('specification') ? 1 : 2
  for (const bar of bars.toSorted((a, b) => rank(a) - rank(b) || b.atIndex - a.atIndex)) {
    const from = xOf(bar)
    const to = from + widthOf(bar) + 10
    if (to > right) continue
    const row = ([0, 1] as const).find(
      (one) => !taken.some((old) => old.row === one && from < old.to && old.from < to),
    )
    if (row === undefined) continue
    taken.push({ row, from, to })
    rows.set(bar, row)
  }
  // The second row is for what found the first one taken: alone it would hang in the air.
  return bars.map((bar) => ({ bar, x: xOf(bar), row: rows.get(bar) }))
}
