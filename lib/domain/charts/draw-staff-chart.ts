import { labelShapes } from './chart-labels'
import { describeStaffChart } from './describe-staff-chart'
import { ledgerShapes, noteShapes, slurShapes } from './draw-notes'
import {
  barShapes,
  footShapes,
  futureShapes,
  limitValueShapes,
  staffShapes,
  toleranceShapes,
  unlimitedShapes,
} from './draw-staff'
import type { StaffLayout } from './layout-staff-chart'
import { words } from './marks'
import type { Drawing, Shape } from './shape'

/** Shapes that follow the axes of one stave; without a key, those of the first. */
export interface PlotLayer {
  readonly stave?: string
  readonly shapes: readonly Shape[]
}

/** What lies in the plot, bottom first. */
export function plotLayers(layout: StaffLayout): readonly PlotLayer[] {
  const { staves } = layout
  const labels = labelShapes(layout)
  return [
    { shapes: futureShapes(layout) },
    ...staves.map((stave) => ({
      stave: stave.stave.key,
      shapes: [...staffShapes(stave), ...unlimitedShapes(stave, layout), ...toleranceShapes(stave, layout)],
    })),
    { shapes: barShapes(layout) },
    ...staves.map((stave) => ({
      stave: stave.stave.key,
      shapes: [
        ...slurShapes(stave),
        ...ledgerShapes(stave),
        ...noteShapes(stave, layout),
        ...labels.filter(({ role }) => role?.stave === stave.stave.key),
      ],
    })),
  ]
}

/** Names of the staves, beside them or above. */
export const nameShapes = (layout: StaffLayout): readonly Shape[] =>
  layout.staves.flatMap(({ column, stave }) =>
    column.map(
      ({ x, y, text, kind }): Shape =>
        words(x, y, text, {
          ...(kind === 'name' ? { size: 13, weight: 600 } : { ink: 'slate' }),
          // Above its stave a name lies across bar lines.
          halo: layout.frame.compact,
          role: { stave: stave.key },
        }),
    ),
  )

/** What stands around the plot: names of the staves, values at the right, reasons, lot axis. */
export function marginShapes(layout: StaffLayout): readonly Shape[] {
  const empty =
    layout.chart.lots.length === 0
      ? [words(layout.frame.x, layout.plot.y + 16, 'no lots yet', { italic: true, ink: 'slate' })]
      : []
  return [
    ...nameShapes(layout),
    ...layout.staves.flatMap((stave) => limitValueShapes(stave, layout)),
    ...footShapes(layout),
    ...empty,
  ]
}

/** The whole chart as one picture: for files, paper, and pages without scripts. */
export const drawStaffChart = (layout: StaffLayout): Drawing => ({
  width: layout.width,
  height: layout.height,
  label: `Staff chart of ${layout.chart.title}`,
  description: describeStaffChart(layout.chart),
  shapes: [...plotLayers(layout).flatMap(({ shapes }) => shapes), ...marginShapes(layout)],
})
