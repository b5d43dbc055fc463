import { noteAt } from './note-at'
import type { StaffChart, StaveModel } from './staff-chart'

export type CsvCell = string | number | undefined

/**
 * The chart's own data as rows for a CSV writer, one row a lot of the window: what was charted, unrounded, and how
 * it stands to its limits. The first row names the columns; instants are ISO 8601 in UTC.
 */
export function staffChartRows(chart: StaffChart): readonly (readonly CsvCell[])[] {
  const { from, to } = chart.window
  const head = [
    'lot',
    'made_at',
    ...chart.staves.flatMap(({ key }) =>
      [
        'value',
        'unit',
        'sigmas',
        'limit_set',
        'centre',
        'lower',
        'upper',
        'left_out',
        'beyond',
        'signals',
      ].map((column) => `${key}_${column}`),
    ),
    'change',
  ]
  const changes = new Map(chart.barLines.map((bar) => [bar.atIndex, bar]))
  const rows = chart.lots.slice(from, to + 1).map((lot, offset) => {
    const index = from + offset
    return [
      lot.code,
      new Date(lot.madeAt).toISOString(),
      ...chart.staves.flatMap((stave) => staveCells(stave, index)),
      [changes.get(index)?.reason ?? '', changes.get(index)?.detail ?? '']
        .filter((text) => text !== '')
        .join(', '),
    ]
  })
  return [head, ...rows]
}

function staveCells(stave: StaveModel, index: number): CsvCell[] {
  const note = noteAt(stave, index)
  const segment = stave.segments.find(({ fromIndex, toIndex }) => index >= fromIndex && index <= toIndex)
  const unit = stave.unitLabel.split(',')[0] ?? ''
  return [
    note?.value,
    unit,
    note?.sigmas,
    segment?.number,
    segment?.centre,
    segment?.lower,
    segment?.upper,
    note ? (note.leftOut ? 'yes' : 'no') : undefined,
    note?.beyond,
    note?.signals.join(' '),
  ]
}
