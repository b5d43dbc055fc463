import { noteAt } from './note-at'
import { sigmasText, valueText } from './readout'
import type { ChartNote, LotWindow, StaffChart, StaveModel } from './staff-chart'

export interface ChartTable {
  readonly head: readonly string[]
  readonly rows: readonly { readonly code: string; readonly cells: readonly string[] }[]
}

/**
 * The chart as a table: one row a lot, one column a stave, what changed and what was raised in words. `part` names
 * the lots told, where a window holds more of them than a page does; without it all of the window.
 */
export function staffChartTable(chart: StaffChart, part: LotWindow = chart.window): ChartTable {
  const from = Math.max(part.from, chart.window.from)
  const to = Math.min(part.to, chart.window.to)
  const runsAt = runWordsWithin(chart, from, to)
  const changes = new Map(chart.barLines.map(({ atIndex, reason }) => [atIndex, reason]))
  const rows = chart.lots.slice(from, to + 1).map((lot, offset) => {
    const index = from + offset
    const cells = chart.staves.map((stave) => cellOf(noteAt(stave, index), stave, chart))
    const change = changes.get(index)
    const remarks = [...(change === undefined ? [] : [change]), ...(runsAt.get(index) ?? [])]
    return { code: lot.code, cells: [lot.label, ...cells, remarks.join('; ')] }
  })
  return {
    head: ['Lot', 'Made', ...chart.staves.map(({ label, unitLabel }) => `${label}, ${unitLabel}`), 'Remarks'],
    rows,
  }
}

function cellOf(note: ChartNote | undefined, stave: StaveModel, chart: StaffChart): string {
  const value = valueText(note?.value, stave, chart)
  if (!note) return value
  const said = [
    note.sigmas === undefined ? '' : sigmasText(note.sigmas, chart),
    note.beyond ? `beyond the limits, ${note.beyond}` : '',
    note.leftOut ? 'left out' : '',
  ].filter((word) => word !== '')
  return said.length === 0 ? value : `${value} (${said.join(', ')})`
}

/** Words of the runs that each lot is part of, each said once. */
function runWordsWithin({ staves }: StaffChart, from: number, to: number): Map<number, Set<string>> {
  const found = new Map<number, Set<string>>()
  for (const { slurs } of staves)
    for (const { members, words } of slurs)
      for (const index of members) {
        if (index < from || index > to) continue
        const own = found.get(index)
        if (own) own.add(words)
        else found.set(index, new Set([words]))
      }
  return found
}
