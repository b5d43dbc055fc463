import type { ReactNode } from 'react'

export interface Column<Row> {
  readonly head: string
  readonly unit?: string
  readonly number?: boolean
  /** Left out on a phone, where each row is a block: what is on the row's own page, too. */
  readonly wideOnly?: boolean
  readonly cell: (row: Row) => ReactNode
}

interface TableProps<Row> {
  /** For screen readers: what the table lists. */
  readonly caption: string
  readonly columns: readonly Column<Row>[]
  readonly rows: readonly Row[]
  readonly keyOf: (row: Row) => string | number
  /** Greyed: no longer in use. */
  readonly leftOut?: (row: Row) => boolean
  readonly dense?: boolean
}

/** A plain table: the first column heads its row; on a phone each row becomes a block. */
export function Table<Row>({ caption, columns, rows, keyOf, leftOut, dense }: TableProps<Row>) {
  return (
    <div className="table-frame">
      <table className={dense ? 'table stack dense' : 'table stack'}>
        <caption className="visually-hidden">{caption}</caption>
        <thead>
          <tr>
            {columns.map(({ head, unit, number }) => (
              <th key={head} scope="col" className={number ? 'number' : undefined}>
                {head}
                {unit ? <span className="unit">{unit}</span> : null}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <tr key={keyOf(row)} data-left-out={leftOut?.(row) || undefined}>
              {columns.map(({ head, unit, number, cell, wideOnly }, index) =>
                index === 0 ? (
                  <th key={head} scope="row" className={number ? 'number' : undefined}>
                    {cell(row)}
                  </th>
                ) : (
                  <td
                    key={head}
                    className={
                      [number ? 'number' : '', wideOnly ? 'wide-only' : ''].join(' ').trim() || undefined
                    }
                    data-head={unit ? `${head}, ${unit}` : head}
                  >
                    {cell(row)}
                  </td>
                ),
              )}
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  )
}
