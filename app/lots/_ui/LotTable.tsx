import Link from 'next/link'
import type { ReactNode } from 'react'
import {
  type LotColumn,
  type LotColumnId,
  type LotListItem,
  type LotSortKey,
  lotCell,
} from '@/lib/domain/record/lot-columns'
import { type ListLotsInput, type LotSort, usualSort } from '@/lib/input/lot-list'
import { type CellStyle, isOpen, lotCellView } from './lot-cells'
import { lotsHref } from './lots-href'

interface Props {
  readonly asked: ListLotsInput
  readonly columns: readonly LotColumn[]
  readonly lots: readonly LotListItem[]
  readonly style: CellStyle
  /** On a phone only what tells lots apart: nobody chose the columns. */
  readonly brief: boolean
}

/** In every lot’s own page, too. */
const wideOnly = new Set<LotColumnId>(['machine', 'die', 'length', 'specimens'])

function classOf(column: LotColumn, lot: LotListItem, brief: boolean): string | undefined {
  const classes = [
    column.decimals === undefined ? '' : 'number',
    (brief && wideOnly.has(column.id)) || isOpen(lotCell(column, lot)) ? 'wide-only' : '',
  ]
  return classes.filter(Boolean).join(' ') || undefined
}

/** What the next press of a head sorts by: newest, longest and furthest first, then the other way round. */
function turned(sort: LotSort, key: LotSortKey): LotSort {
  const first: LotSort = key === 'code' || key === 'product' || key === 'state' ? `${key}-up` : `${key}-down`
  if (sort !== first) return first
  return first === `${key}-up` ? `${key}-down` : `${key}-up`
}

/** The lots of a page in the chosen columns; heads that can be sorted by are links. On a phone each lot is a block. */
export function LotTable({ asked, columns, lots, style, brief }: Props) {
  const sort = asked.sort ?? usualSort
  const head = (name: ReactNode, key: LotSortKey | undefined) => {
    if (!key) return name
    const way = sort === `${key}-up` ? '↑' : sort === `${key}-down` ? '↓' : ''
    return (
      <Link
        href={lotsHref({ ...asked, sort: turned(sort, key), page: 1 })}
        prefetch={false}
        scroll={false}
        className="lots-sort"
      >
        {name}
        {way ? <span aria-hidden="true"> {way}</span> : null}
      </Link>
    )
  }
  const sorted = (key: LotSortKey | undefined) =>
    key && sort === `${key}-up` ? 'ascending' : key && sort === `${key}-down` ? 'descending' : undefined
  return (
    <div className="table-frame lots-frame">
      <table className="table stack dense lots-table">
        <caption className="visually-hidden">Lots that fit, one a row</caption>
        <thead>
          <tr>
            <th scope="col" aria-sort={sorted('code')}>
              {head('Lot', 'code')}
            </th>
            {columns.map(({ id, name, unit, decimals, sort: key }) => (
              <th
                key={id}
                scope="col"
                aria-sort={sorted(key)}
                className={decimals === undefined ? undefined : 'number'}
              >
                {head(name, key)}
                {unit ? <span className="unit">{unit}</span> : null}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {lots.map((lot) => (
            <tr key={lot.code}>
              <th scope="row">
                <Link href={`/lots/${encodeURIComponent(lot.code)}`} prefetch={false}>
                  {lot.code}
                </Link>
              </th>
              {columns.map((column) => (
                <td
                  key={column.id}
                  className={classOf(column, lot, brief)}
                  data-head={column.unit ? `${column.name}, ${column.unit}` : column.name}
                >
                  {lotCellView(column, lot, style)}
                </td>
              ))}
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  )
}
