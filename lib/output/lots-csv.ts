import type { LotColumnId, LotListItem } from '@/lib/domain/record/lot-columns'
import { csvText } from './csv'
import { lotsSheet, type SheetStyle } from './lots-sheet'

/** The list of lots as CSV, with the separator and the decimal sign that the works reads. */
export const lotsCsv = (
  lots: readonly LotListItem[],
  columns: readonly LotColumnId[],
  style: SheetStyle,
): string => {
  const sheet = lotsSheet(lots, columns, style)
  return csvText(
    [
      sheet.columns.map(({ head }) => head),
      ...sheet.rows.map((row) => row.map((cell) => (cell instanceof Date ? minutes(cell) : cell))),
    ],
    style.numberFormat === 'comma'
      ? { separator: ';', decimal: 'comma' }
      : { separator: ',', decimal: 'point' },
  )
}

/** `2026-11-27 09:48`, which every spreadsheet takes for a date. */
const minutes = (wall: Date): string => wall.toISOString().slice(0, 16).replace('T', ' ')
