import type { ReactNode } from 'react'
import { VerdictMark } from '@/app/_ui/charts/VerdictMark'
import { formatDateTime } from '@/app/_ui/format/dates'
import { type LotCell, type LotColumn, type LotListItem, lotCell } from '@/lib/domain/record/lot-columns'
import { formatNumber, UNDEFINED_TEXT } from '@/lib/domain/units/format'
import { stateWords } from '../state-words'

export interface CellStyle {
  readonly timeZone: string
  readonly numberFormat: 'point' | 'comma'
}

/** Nothing is known yet: a dash in a table, left out on a phone. */
export const isOpen = (cell: LotCell): boolean =>
  cell.kind === 'text' ? cell.text === '' : (cell.kind === 'number' ? cell.value : cell.at) === undefined

/** A cell as a person reads it. */
export function lotCellView(column: LotColumn, lot: LotListItem, style: CellStyle): ReactNode {
  if (column.id === 'state') {
    const { mark, word } = stateWords[lot.state]
    return (
      <span className="lots-state">
        <VerdictMark verdict={mark} /> <em>{word}</em>
      </span>
    )
  }
  const cell = lotCell(column, lot)
  if (cell.kind === 'text') return cell.text || UNDEFINED_TEXT
  if (cell.kind === 'instant')
    return cell.at === undefined ? UNDEFINED_TEXT : formatDateTime(cell.at, style.timeZone)
  return formatNumber(cell.value, {
    decimals: column.decimals ?? 0,
    decimal: style.numberFormat,
    sign: column.signed ? 'always' : 'negative',
  })
}
