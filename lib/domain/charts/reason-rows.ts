import type { BarLine, BarLineKind } from './staff-chart'
import { textWidth } from './text-width'

export interface PlacedReason {
  readonly bar: BarLine
  readonly x: number
  /** 0 or 1; undefined where there is no room: it is read by the pointer and in the table. */
  readonly row?: 0 | 1
}

const widthOf = ({ reason, detail }: BarLine): number =>
  Math.max(textWidth(reason, 13, 'italic') * 1.04, textWidth(detail, 11))

/** Who chooses first where reasons are dense: what changes seldom and tells most. */
const ranks: Readonly<Record<BarLineKind, number>> = {
  'limit-set': 0,
  product: 0,
  die: 1,
  specification: 1,
  machine: 2,
  coil: 2,
  resin: 2,
  setting: 3,
  spool: 3,
}

/** The lower, the earlier a bar line and its reason choose their place. */
export const rankOf = ({ kinds }: BarLine): number => Math.min(...kinds.map((kind) => ranks[kind]))

/**
 * Reasons stand under their bar lines in one row, or in a second one where the first is taken; what fits in
 * neither is left out. Limits and products choose before dies, dies before machines and materials, settings and
 * spools last; later before earlier.
 */
export function reasonRows(
  bars: readonly BarLine[],
  xOf: (bar: BarLine) => number,
  right: number,
): PlacedReason[] {
  const taken: { row: 0 | 1; from: number; to: number }[] = []
  const rows = new Map<BarLine, 0 | 1>()
  for (const bar of bars.toSorted((a, b) => rankOf(a) - rankOf(b) || b.atIndex - a.atIndex)) {
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
