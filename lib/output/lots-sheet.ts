import type { ResultUnits } from '@/lib/domain/record/display-unit'
import { type LotColumnId, type LotListItem, lotCell, lotColumn } from '@/lib/domain/record/lot-columns'

/** What of the works decides how a list looks. */
export interface SheetStyle {
  readonly units: ResultUnits
  readonly timeZone: string
  readonly numberFormat: 'point' | 'comma'
}

/** A cell of a file: a text, a number, or an instant as the clock in the works showed it (read its UTC fields). */
export type SheetCell = string | number | Date | undefined

export interface SheetColumn {
  readonly head: string
  /** Of numbers, as the page shows them; the cell itself holds more. */
  readonly decimals: number | undefined
}

export interface Sheet {
  readonly columns: readonly SheetColumn[]
  readonly rows: readonly (readonly SheetCell[])[]
}

/** Digits that mean something: the rest is noise of the change of units (254.00000000000003). */
const DIGITS = 12

/** The list of lots as a table for a file: its code, then the chosen columns, in the units of the works. */
export function lotsSheet(
  lots: readonly LotListItem[],
  ids: readonly LotColumnId[],
  { units, timeZone }: SheetStyle,
): Sheet {
  const columns = ids.map((id) => lotColumn(id, units))
  const onTheWall = wallClock(timeZone)
  return {
    columns: [
      { head: 'Lot', decimals: undefined },
      ...columns.map(({ id, name, unit, decimals }) => {
        const of = id === 'made' || id === 'measured' ? timeZone : unit
        return { head: of ? `${name} (${of})` : name, decimals }
      }),
    ],
    rows: lots.map((lot) => [
      lot.code,
      ...columns.map((column): SheetCell => {
        const cell = lotCell(column, lot)
        if (cell.kind === 'text') return cell.text === '' ? undefined : cell.text
        if (cell.kind === 'number')
          return cell.value === undefined ? undefined : Number(cell.value.toPrecision(DIGITS))
        return cell.at === undefined ? undefined : onTheWall(cell.at)
      }),
    ]),
  }
}

/** A spreadsheet knows no time zones: what it holds is what the clock on the wall showed. */
function wallClock(timeZone: string): (at: number) => Date {
  const format = new Intl.DateTimeFormat('en-GB', {
    timeZone,
    year: 'numeric',
    month: '2-digit',
    day: '2-digit',
    hour: '2-digit',
    minute: '2-digit',
    second: '2-digit',
    hourCycle: 'h23',
  })
  return (at) => {
    const parts = new Map(format.formatToParts(at).map(({ type, value }) => [type, Number(value)]))
    const of = (type: Intl.DateTimeFormatPartTypes): number => parts.get(type) ?? 0
    return new Date(Date.UTC(of('year'), of('month') - 1, of('day'), of('hour'), of('minute'), of('second')))
  }
}
