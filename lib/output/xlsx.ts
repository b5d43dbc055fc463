import writeXlsxFile, { type Cell } from 'write-excel-file/node'
import type { Sheet, SheetCell, SheetColumn } from './lots-sheet'

/** Text that a spreadsheet would take for a formula once somebody edits its cell or saves the sheet as CSV. */
const formulaLike = /^[=+\-@\t\r]/

/** Longest text of a cell; a spreadsheet calls a file with a longer one damaged. */
const LONGEST = 32_767

/** Width of the widest text of a column in characters, within reason. */
const widthOf = (column: number, { columns, rows }: Sheet): number =>
  Math.min(
    40,
    rows.reduce(
      (most, row) => Math.max(most, textLength(row[column])),
      Math.max(8, (columns[column]?.head.length ?? 0) + 2),
    ),
  )

const textLength = (cell: SheetCell | undefined): number =>
  typeof cell === 'string' ? cell.length + 1 : cell instanceof Date ? 17 : 0

function cellOf(cell: SheetCell, { decimals }: SheetColumn): Cell {
  if (cell === undefined) return null
  if (cell instanceof Date) return { value: cell, type: Date, format: 'yyyy-mm-dd hh:mm' }
  if (typeof cell === 'number') {
    if (!Number.isFinite(cell)) throw new RangeError(`a file cannot hold the number ${cell}`)
    return { value: cell, type: Number, format: decimals ? `0.${'0'.repeat(decimals)}` : '0' }
  }
  const text = formulaLike.test(cell) ? `'${cell}` : cell
  return { value: text.slice(0, LONGEST), type: String }
}

/**
 * A table as an Excel file of one sheet. Numbers and dates are numbers and dates, shown with the decimals of their
 * column; a text that begins like a formula gets a leading apostrophe, as in a CSV file. The head stays in sight.
 * @throws RangeError for numbers that are not finite
 */
export const xlsxFile = (name: string, sheet: Sheet): Promise<Uint8Array> =>
  writeXlsxFile(
    [
      sheet.columns.map(({ head, decimals }) => ({
        value: head,
        type: String,
        fontWeight: 'bold',
        align: decimals === undefined ? 'left' : 'right',
      })),
      ...sheet.rows.map((row) => sheet.columns.map((column, index) => cellOf(row[index], column))),
    ],
    {
      sheet: name,
      columns: sheet.columns.map((_, index) => ({ width: widthOf(index, sheet) })),
      stickyRowsCount: 1,
      stickyColumnsCount: 1,
    },
  ).toBuffer()
