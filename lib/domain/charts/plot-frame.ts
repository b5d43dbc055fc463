import { type LotWindow, NEWEST_LOTS } from './staff-chart'

/** Lots stand this far apart; where there are more than fit, closer, and below 12 px not every note is drawn. */
export const LOT_STEP = 14.2
export const LEAST_STEP = 12
/** Lots further apart would no longer be seen as one line. */
const MOST_STEP = 40
/** The first lot stands 1.1 steps from the left bar, and a full window leaves as much at its right. */
const LEAD = 1.1
/** In a crowded window that would put its head, or its ledger line, onto the bar. */
const LEAST_LEAD = 11

/** px between the bar and the first lot, for a step in px. */
export const leadOf = (step: number): number => Math.max(LEAD * step, LEAST_LEAD)

/** The horizontal frame that all staves share. */
export interface PlotFrame {
  readonly x: number
  readonly w: number
  /** px per lot. */
  readonly step: number
  /** Lot indices (fractions) at the plot's left and right edge: the domain of the lot axis. */
  readonly domain: readonly [number, number]
  /** On a narrow page labels stand above their stave, not beside it. */
  readonly compact: boolean
  readonly xAt: (index: number) => number
  readonly indexAt: (x: number) => number
  /** Where the part that is still to be made begins, when the newest lot is in the window and there is room. */
  readonly future?: number
}

const NARROW = 600

/**
 * Fits the lots of a window to a page `width` px wide. A window that ends at the newest lot keeps 14.2 px a lot
 * and leaves the rest of the plot for lots still to be made, unless somebody has zoomed in to fewer lots than a
 * chart opens with; any other window fills the plot.
 */
export function plotFrame(width: number, window: LotWindow, lotCount: number): PlotFrame {
  const compact = width < NARROW
  const x = compact ? 2 : 138
  const w = Math.max(60, width - x - (compact ? 50 : 62))
  const count = window.to - window.from + 1
  const even = w / (Math.max(0, count) - 1 + 2 * LEAD)
  const fit = even * LEAD < LEAST_LEAD ? (w - 2 * LEAST_LEAD) / (count - 1) : even
  const isNewest = window.to >= lotCount - 1
  const isUsual = isNewest && (window.from <= 0 || count >= NEWEST_LOTS)
  const step = Math.min(isUsual ? LOT_STEP : MOST_STEP, count > 0 ? fit : LOT_STEP)
  const left = window.from - leadOf(step) / step
  const xAt = (index: number): number => x + (index - left) * step
  const end = xAt(window.to) + step / 2
  return {
    x,
    w,
    step,
    compact,
    domain: [left, left + w / step],
    xAt,
    indexAt: (at) => left + (at - x) / step,
    future: isNewest && count > 0 && x + w - end > 4 * LOT_STEP ? end : undefined,
  }
}
