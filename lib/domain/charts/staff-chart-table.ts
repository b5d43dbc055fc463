import { sigmasText, valueText } from './readout'
import type { StaffChart } from './staff-chart'

export interface ChartTable {
  readonly head: readonly string[]
  readonly rows: readonly { readonly code: string; readonly cells: readonly string[] }[]
}

/** The chart as a table: one row a lot, one column a stave, what changed and what was raised in words. */
export function staffChartTable(chart: StaffChart): ChartTable {
  const { from, to } = chart.window
  const rows = chart.lots.slice(from, to + 1).map((lot, offset) => {
    const index = from + offset
    const cells = chart.staves.map((stave) => {
      const note = stave.notes.find((one) => one.index === index)
      const remarks = note
        ? [
            note.sigmas === undefined ? '' : sigmasText(note.sigmas, chart),
            note.beyond ? `beyond the limits, ${note.beyond}` : '',
            note.leftOut ? 'left out' : '',
          ]
        : []
      const said = remarks.filter((word) => word !== '').join(', ')
      return said === ''
        ? valueText(note?.value, stave, chart)
        : `${valueText(note?.value, stave, chart)} (${said})`
    })
    const signals = chart.staves.flatMap(({ slurs }) =>
      slurs.filter(({ members }) => members.includes(index)).map(({ words }) => words),
    )
    const changes = chart.barLines.filter(({ atIndex }) => atIndex === index).map(({ reason }) => reason)
    return { code: lot.code, cells: [lot.label, ...cells, [...changes, ...new Set(signals)].join('; ')] }
  })
  return {
    head: ['Lot', 'Made', ...chart.staves.map(({ label, unitLabel }) => `${label}, ${unitLabel}`), 'Remarks'],
    rows,
  }
}
