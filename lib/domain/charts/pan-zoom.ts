import { clampWindow } from './build-staff-chart'
import type { StaffLayout } from './layout-staff-chart'
import { leadOf } from './plot-frame'
import { LEAST_WINDOW } from './staff-brush'
import type { LotWindow } from './staff-chart'

/** A press of a button, or a key, shows this many times as many lots, or as few. */
export const ZOOM_STEP = 1.5

/**
 * A window with `factor` times as many lots (below 1: fewer, drawn larger), the lot at `anchor` staying where it
 * is. Never fewer than eight lots, never more than there are. Ends are fractions of lots, so that a slow gesture is
 * not lost in rounding; `clampWindow` rounds them.
 */
export function zoomWindow(window: LotWindow, factor: number, anchor: number, lotCount: number): LotWindow {
  const last = Math.max(0, lotCount - 1)
  const span = Math.max(0, window.to - window.from)
  const least = Math.min(LEAST_WINDOW - 1, last)
  const wanted = Number.isFinite(factor) && factor > 0 ? Math.max(span, 1) * factor : span
  const next = Math.min(last, Math.max(least, wanted))
  const held = Math.min(window.to, Math.max(window.from, anchor))
  const share = span === 0 ? 0.5 : (held - window.from) / span
  const from = Math.min(last - next, Math.max(0, held - share * next))
  return { from, to: from + next }
}

/** How far the drawn layer of a chart can be dragged: px to the right (older lots) and to the left (newer ones). */
export function panReach({ chart, frame }: StaffLayout): { readonly older: number; readonly newer: number } {
  const { from, to } = chart.window
  return {
    older: Math.max(0, from) * frame.step,
    newer: Math.max(0, chart.lots.length - 1 - to) * frame.step,
  }
}

/**
 * The window after the drawn layer was dragged by `dx` px (to the right: older lots come in). A plot with room for
 * lots still to be made fills up with older ones; otherwise as many lots as before are shown.
 */
export function panWindow({ chart, frame }: StaffLayout, dx: number): LotWindow {
  const { from, to } = chart.window
  const lotCount = chart.lots.length
  const count = to - from + 1
  const fits = Math.floor((frame.w - 2 * leadOf(frame.step)) / frame.step + 1 + 1e-6)
  const shown = frame.future === undefined ? count : Math.max(count, fits)
  const wanted = from - Math.round(dx / frame.step)
  // As far as the newest lot at the right, or where it stands already.
  const start = Math.max(0, Math.min(wanted, Math.max(from, lotCount - shown)))
  return clampWindow({ from: start, to: Math.min(lotCount - 1, start + shown - 1) }, lotCount)
}
