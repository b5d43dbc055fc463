import { buildStaffChart } from './build-staff-chart'
import { drawnBars } from './draw-fewer'
import type { StaffLayout } from './layout-staff-chart'
import { lotTicks } from './lot-axis'
import { leadOf, type PlotFrame } from './plot-frame'
import { rankOf, reasonRows } from './reason-rows'
import type { LotWindow, StaffChartInput } from './staff-chart'
import { staveParts } from './stave-layout'

/** Half a window more at either end, as far as there are lots. */
function wideWindow({ chart }: StaffLayout): LotWindow {
  const { from, to } = chart.window
  const half = Math.ceil((to - from + 1) / 2)
  return { from: Math.max(0, from - half), to: Math.min(chart.lots.length - 1, to + half) }
}

/**
 * The layer that is dragged: a chart as it is laid out, with half a window more at either end. Every lot of the
 * window stands where `layout` has it, staves keep their scale and height; `input` is what the chart was built from.
 */
export function wideLayout(input: StaffChartInput, layout: StaffLayout): StaffLayout {
  const window = wideWindow(layout)
  const chart = buildStaffChart({ ...input, window })
  const frame = wideFrame(layout, window)
  const drawn = drawnBars(
    chart.barLines,
    ({ atIndex }) => (atIndex <= window.from ? frame.x : frame.xAt(atIndex - 0.5)),
    rankOf,
  )
  const changes = drawn.map(({ bar }) => bar.atIndex)
  const staves = layout.staves.map((held, index) => {
    const own = chart.staves.find(({ key }) => key === held.stave.key) ?? held.stave
    const parts = staveParts({ ...own, scale: held.stave.scale }, frame, window, index === 0, changes, held)
    return { ...held, ...parts, tolerances: held.tolerances, untold: held.untold }
  })
  const placeOf = new Map(drawn.map(({ bar, x }) => [bar, x]))
  const rows = Math.max(-1, ...layout.reasons.map(({ row }) => row ?? -1)) + 1
  const reasons = reasonRows(
    drawn.map(({ bar }) => bar),
    (bar) => (placeOf.get(bar) ?? frame.x) + 3,
    frame.x + frame.w + 40,
  ).map((reason) => ({ ...reason, row: (reason.row ?? 2) < rows ? reason.row : undefined }))
  return {
    ...layout,
    chart,
    frame,
    staves,
    bars: {
      ...layout.bars,
      placed: drawn.map((one) => ({ ...one, xs: one.bar.double ? [one.x - 3, one.x] : [one.x] })),
    },
    reasons,
    axis: { y: layout.axis.y, ...lotTicks(chart, frame) },
    hidden: 0,
  }
}

/** Further to the left and right; x of a lot, step and the part still to be made stay. */
function wideFrame({ frame, chart }: StaffLayout, window: LotWindow): PlotFrame {
  const lead = leadOf(frame.step)
  const x = window.from < chart.window.from ? frame.xAt(window.from) - lead : frame.x
  const right = window.to > chart.window.to ? frame.xAt(window.to) + lead : frame.x + frame.w
  return { ...frame, x, w: right - x, domain: [frame.indexAt(x), frame.indexAt(right)] }
}
