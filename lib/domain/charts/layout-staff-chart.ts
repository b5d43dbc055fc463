import { type DrawnBar, drawnBars } from './draw-fewer'
import { type ColumnLine, columnHeight, columnText, labelColumn, readingBelow } from './label-column'
import { type LotTick, lotTicks } from './lot-axis'
import { type PlotFrame, plotFrame } from './plot-frame'
import { type PlacedReason, rankOf, reasonRows } from './reason-rows'
import type { StaffChart } from './staff-chart'
import { type StaveParts, staveParts } from './stave-layout'

export interface StaveLayout extends StaveParts {
  /** y of the middle of the stave on the page; everything in the parts is counted from here. */
  readonly y: number
  /** Values at the bottom and the top of the whole plot: the domain of the stave's own axis. */
  readonly domain: readonly [number, number]
  readonly column: readonly ColumnLine[]
  /** Where the pointer's reading stands. */
  readonly readout: { readonly valueX: number; readonly sigmaX: number; readonly y: number }
}

export interface PlacedBar extends DrawnBar {
  /** A change of limit sets has a second line 3 px before it. */
  readonly xs: readonly number[]
}

export interface StaffLayout {
  readonly width: number
  readonly height: number
  readonly chart: StaffChart
  readonly frame: PlotFrame
  /** The ground that all staves share: from the room above the first to the room below the last. */
  readonly plot: { readonly x: number; readonly y: number; readonly w: number; readonly h: number }
  /** Heights between which bar lines run: first to last staff. */
  readonly bars: { readonly y1: number; readonly y2: number; readonly placed: readonly PlacedBar[] }
  readonly staves: readonly StaveLayout[]
  readonly reasons: readonly PlacedReason[]
  readonly reasonsY: number
  readonly axis: { readonly y: number; readonly prefix: string; readonly ticks: readonly LotTick[] }
  /** How many notes are drawn, when not all are. */
  readonly decimated?: { readonly shown: number; readonly of: number }
  /** Signals without a mark of their own. */
  readonly hidden: number
}

/** Room for the pointer's flag above the first stave. */
const FLAG = 22
const REASON_ROW = 31
/** Room for the line that says how many signals are not drawn. */
const HIDDEN_LINE = 18

function stack(
  parts: readonly (readonly [StaveParts, ReturnType<typeof columnText>])[],
  compact: boolean,
): { readonly ys: readonly number[]; readonly end: number } {
  const ys: number[] = []
  let end = FLAG
  for (const [part, text] of parts) {
    // On a narrow page the name stands above its stave, in room that no mark needs.
    const y = end + (compact ? Math.max(0, columnHeight(text) - part.freeAbove) : 0) + part.above - part.top
    ys.push(y)
    // Label and reading stand beside the staff and need their height even where the staff is lower.
    end = y + Math.max(part.bottom + part.below, compact ? 0 : part.top + readingBelow(part, text) + 12)
  }
  return { ys, end }
}

function decimation(
  staves: readonly StaveParts[],
): { readonly shown: number; readonly of: number } | undefined {
  const of = staves.reduce((sum, { stave }) => sum + stave.notes.length, 0)
  const shown = staves.reduce((sum, { notes }) => sum + notes.length, 0)
  return shown < of ? { shown, of } : undefined
}

/**
 * Pixel geometry of a staff chart on a page `width` px wide. All positions follow from the axes' domains, which a
 * view with axes of its own can take over: x is linear in the lot index over the plot's width, and each stave's y
 * is linear in its value over the plot's height.
 */
export function layoutStaffChart(chart: StaffChart, width = 964): StaffLayout {
  const frame = plotFrame(width, chart.window, chart.lots.length)
  const drawn = drawnBars(
    chart.barLines,
    ({ atIndex }) => (atIndex <= chart.window.from ? frame.x : frame.xAt(atIndex - 0.5)),
    rankOf,
  )
  const changes = drawn.map(({ bar }) => bar.atIndex)
  const parts = chart.staves.map((stave, index) =>
    staveParts(stave, frame, chart.window, index === 0, changes),
  )
  const texts = parts.map((part) => columnText(part, frame, chart))
  const { ys, end } = stack(
    parts.map((part, index) => [part, texts[index] ?? []]),
    frame.compact,
  )
  const plot = { x: frame.x, y: FLAG, w: frame.w, h: Math.max(1, end - FLAG) }
  const staves = parts.map((part, index): StaveLayout => {
    const y = ys[index] ?? 0
    return {
      ...part,
      y,
      domain: [part.valueAt(plot.y + plot.h - y), part.valueAt(plot.y - y)],
      ...labelColumn(part, y, frame, texts[index] ?? []),
    }
  })
  const [first, last] = [staves[0], staves.at(-1)]
  const bars = {
    y1: first ? first.y + first.top : plot.y,
    y2: last ? last.y + last.bottom : plot.y + plot.h,
    placed: drawn.map((one): PlacedBar => ({ ...one, xs: one.bar.double ? [one.x - 3, one.x] : [one.x] })),
  }
  const placeOf = new Map(drawn.map(({ bar, x }) => [bar, x]))
  const reasons = reasonRows(
    drawn.map(({ bar }) => bar),
    (bar) => {
      const x = placeOf.get(bar) ?? frame.x
      return x === frame.x ? x : x + 3
    },
    frame.x + frame.w + 40,
  )
  const reasonsY = !last || last.quietBelow ? end - 9 : end + 8
  const rows = Math.max(-1, ...reasons.map(({ row }) => row ?? -1)) + 1
  const axisY = reasonsY + (rows === 0 ? -8 : 22 + (rows - 1) * REASON_ROW)
  const hidden = parts.reduce((sum, part) => sum + part.hidden, 0)
  return {
    width,
    height: axisY + 34 + (hidden > 0 ? HIDDEN_LINE : 0),
    chart,
    frame,
    plot,
    bars,
    staves,
    reasons,
    reasonsY,
    axis: { y: axisY, ...lotTicks(chart, frame) },
    decimated: decimation(parts),
    hidden,
  }
}
