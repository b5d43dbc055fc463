import Link from 'next/link'
import { Fragment, type ReactNode } from 'react'
import { formatDate } from '@/app/_ui/format/dates'
import { formatNumber, formatQuantity } from '@/lib/domain/units/format'
import type { MaterialInView } from '@/lib/services/get-material-in'
import type { WorksFacts } from '@/lib/services/get-works'
import { materialInPath } from './paths'

interface Props {
  readonly row: MaterialInView['row']
  readonly works: WorksFacts
}

/** What is known of it; what nobody said is left out. */
export function MaterialInFacts({ row, works: { numberFormat: decimal, timeZone, units } }: Props) {
  const facts: readonly { readonly head: string; readonly fact: ReactNode }[] = [
    {
      head: 'Material',
      fact: row.material ? (
        <Link href={`/catalogue/materials/${encodeURIComponent(row.material.code)}`}>
          {row.material.name}
        </Link>
      ) : undefined,
    },
    { head: 'Heat', fact: row.heat },
    { head: 'Supplier', fact: row.supplier },
    {
      head: 'Wound from',
      fact: row.parent ? <Link href={materialInPath(row.parent.code)}>{row.parent.code}</Link> : undefined,
    },
    {
      head: 'Came in',
      fact: row.receivedAt === undefined ? undefined : formatDate(row.receivedAt, timeZone),
    },
    {
      head: 'Size',
      fact:
        row.sizeMetres === undefined
          ? undefined
          : formatQuantity(row.sizeMetres, units.diameter, { decimal, withUnit: true }),
    },
    {
      head: 'Length',
      fact:
        row.lengthMetres === undefined
          ? undefined
          : `${formatNumber(row.lengthMetres, { decimals: 0, decimal })} m`,
    },
    {
      head: 'Mass',
      fact:
        row.massKilograms === undefined
          ? undefined
          : formatQuantity(row.massKilograms, 'kg', { decimal, decimals: 2, withUnit: true }),
    },
    { head: 'Note', fact: row.note },
  ]
  const known = facts.filter(({ fact }) => fact !== undefined && fact !== '')
  return (
    <section className="section">
      <h2>What is known of it</h2>
      {known.length === 0 ? (
        <p className="slate">Nothing but its name so far.</p>
      ) : (
        <dl className="facts">
          {known.map(({ head, fact }) => (
            <Fragment key={head}>
              <dt>{head}</dt>
              <dd>{fact}</dd>
            </Fragment>
          ))}
        </dl>
      )}
    </section>
  )
}
