import type { LotColumnId, LotListItem } from '@/lib/domain/record/lot-columns'
import { lotsSheet, type SheetStyle } from './lots-sheet'
import { xlsxFile } from './xlsx'

/** The list of lots as an Excel file. */
export const lotsXlsx = (
  lots: readonly LotListItem[],
  columns: readonly LotColumnId[],
  style: SheetStyle,
): Promise<Uint8Array> => xlsxFile('Lots', lotsSheet(lots, columns, style))
