/** Bench files for tests: rows as header → cell, written as CSV. */
export type FileCells = Readonly<Record<string, string>>

export interface CsvStyle {
  readonly delimiter?: string
  readonly lineEnd?: string
  readonly decimalComma?: boolean
  readonly mark?: boolean
}

const quoted = (cell: string, delimiter: string): string =>
  cell.includes(delimiter) || /["\n\r]/.test(cell) ? `"${cell.replaceAll('"', '""')}"` : cell

/** A file of these rows, the headers those of the first. */
export function csvOf(
  rows: readonly FileCells[],
  { decimalComma = false, delimiter = ',', lineEnd = '\n', mark = false }: CsvStyle = {},
): string {
  const headers = Object.keys(rows[0] ?? {})
  const cellOf = (row: FileCells, header: string): string => {
    const cell = row[header] ?? ''
    return decimalComma && /^-?\d*\.\d+( \d*\.\d+)*$/.test(cell) ? cell.replaceAll('.', ',') : cell
  }
  const lines = [
    headers.map((header) => quoted(header, delimiter)),
    ...rows.map((row) => headers.map((header) => quoted(cellOf(row, header), delimiter))),
  ]
  return (mark ? '\uFEFF' : '') + lines.map((cells) => cells.join(delimiter) + lineEnd).join('')
}

export interface SpecimenOfFile {
  readonly lot: string
  readonly number: number
  /** Epoch milliseconds. */
  readonly madeAt: number
  readonly measuredAt: number
  /** Diameter in tenths of a micrometre. */
  readonly tenths: number
  readonly end?: 'head' | 'tail'
}

/** One specimen of plain steel 0.254 mm at the set-up of the works under test. */
export const steelRow = ({
  end = 'head',
  lot,
  madeAt,
  measuredAt,
  number,
  tenths,
}: SpecimenOfFile): FileCells => {
  const [a, b] = [(tenths / 1e4).toFixed(4), ((tenths + 2) / 1e4).toFixed(4)]
  return {
    lot,
    product: 'L254',
    made_at: new Date(madeAt).toISOString(),
    machine: 'DM-1',
    specimen: String(number),
    taken_at: end,
    measured_at: new Date(measuredAt).toISOString(),
    d1a_mm: a,
    d1b_mm: b,
    d2a_mm: a,
    d2b_mm: b,
    d3a_mm: a,
    d3b_mm: b,
    cut_length_mm: '500.0',
    cut_mass_mg: (199.1 * (tenths / 2540) ** 2).toFixed(2),
    span_mm: '648.0',
    frequency_hz: (331.0 * (2540 / tenths)).toFixed(2),
    note: '',
  }
}
