export type CsvCell = string | number | undefined

export interface CsvStyle {
  /** Between cells: a comma, or the semicolon that goes with a decimal comma. */
  readonly separator: ',' | ';'
  readonly decimal: 'point' | 'comma'
}

/** The usual reader of a works' files: comma between cells, point in numbers. */
const plain: CsvStyle = { separator: ',', decimal: 'point' }

/** Spreadsheets tell UTF-8 by it; without it µ and ρ turn into two letters each. */
const BYTE_ORDER_MARK = '\uFEFF'

/** Text that a spreadsheet would take for a formula. */
const formulaLike = /^[=+\-@\t\r]/

/**
 * Rows as CSV text (RFC 4180: CRLF, quotes doubled), with a byte order mark. Numbers are written unrounded, as the
 * shortest text that reads back to the same binary value; undefined is an empty cell. A text that begins like a
 * formula gets a leading apostrophe, so that a spreadsheet runs nothing that somebody typed into a name.
 * @throws RangeError for numbers that are not finite
 */
export function csvText(rows: readonly (readonly CsvCell[])[], style: CsvStyle = plain): string {
  return (
    BYTE_ORDER_MARK +
    rows.map((row) => `${row.map((cell) => cellText(cell, style)).join(style.separator)}\r\n`).join('')
  )
}

function cellText(cell: CsvCell, { separator, decimal }: CsvStyle): string {
  if (cell === undefined) return ''
  if (typeof cell === 'number') {
    if (!Number.isFinite(cell)) throw new RangeError(`a file cannot hold the number ${cell}`)
    const text = String(cell)
    return quoted(decimal === 'comma' ? text.replace('.', ',') : text, separator)
  }
  return quoted(formulaLike.test(cell) ? `'${cell}` : cell, separator)
}

/** A cell between quotes where it needs them (RFC 4180); its content stays as it is, formulas too. */
export const quoted = (text: string, separator: string): string =>
  text.includes(separator) || /["\r\n]/.test(text) || /^\s|\s$/.test(text)
    ? `"${text.replaceAll('"', '""')}"`
    : text
