import { barLinesWithin } from './bar-lines'
import { buildStave } from './build-stave'
import { type LotWindow, NEWEST_LOTS, type StaffChart, type StaffChartInput } from './staff-chart'

/** A window within the lots there are, ends in order; without one, all lots. */
export function clampWindow(window: LotWindow | undefined, lotCount: number): LotWindow {
  const last = Math.max(0, lotCount - 1)
  const within = (index: number): number => Math.min(last, Math.max(0, Math.round(index)))
  if (!window) return { from: 0, to: lotCount === 0 ? -1 : last }
  if (lotCount === 0) return { from: 0, to: -1 }
  const [from, to] = [within(window.from), within(window.to)]
  return { from: Math.min(from, to), to: Math.max(from, to) }
}

/** The newest lots: where a chart opens. */
export const newestWindow = (lotCount: number, most = NEWEST_LOTS): LotWindow =>
  clampWindow({ from: Math.max(0, lotCount - most), to: lotCount - 1 }, lotCount)

/**
 * The staff chart of several characteristics on one lot axis as plain data in their own units: notes, ledger
 * notes, runs, limit lines, bar lines and scales; no pixel in it. Values are taken as they are: what is undefined
 * or not finite is a gap.
 */
export function buildStaffChart(input: StaffChartInput): StaffChart {
  const window = clampWindow(input.window, input.lots.length)
  return {
    title: input.title,
    decimal: input.decimal,
    lots: input.lots,
    window,
    staves: input.staves.map((stave) => buildStave(stave, input.lots, window)),
    barLines: barLinesWithin(input.barLines, window),
  }
}
