import Link from 'next/link'
import { VerdictMark } from '@/app/_ui/charts/VerdictMark'
import { formatAlong } from '@/app/_ui/format/along'
import { formatDateTime } from '@/app/_ui/format/dates'
import { Table } from '@/app/_ui/tables/Table'
import { stateWords } from '@/app/lots/state-words'
import { lotMaterialWords } from '@/lib/domain/record/material-in'
import { formatNumber } from '@/lib/domain/units/format'
import type { MaterialInView } from '@/lib/services/get-material-in'
import type { WorksFacts } from '@/lib/services/get-works'
import { materialInPath } from './paths'
import '@/app/_ui/charts/charts.css'

interface Props {
  readonly view: MaterialInView
  readonly works: WorksFacts
  readonly maySeeDrift: boolean
}

/** Lots made of a coil, spool or batch, with the way to their charts. */
export function MadeOf({ view, works: { numberFormat: decimal, timeZone }, maySeeDrift }: Props) {
  const { madeOf, links, row } = view
  const products = new Map(madeOf.map((one) => [one.productCode, one]))
  const throughSpools = view.spools.length > 0
  return (
    <section className="section">
      <header>
        <h2>
          Lots made of it{' '}
          {madeOf.length < links ? (
            <small>
              the newest {madeOf.length} of {links}
            </small>
          ) : null}
        </h2>
        <span className="actions">
          {maySeeDrift
            ? [...products.values()].map((one) => (
                <Link
                  key={one.productCode}
                  className="button quiet"
                  href={`/drift?product=${encodeURIComponent(one.productCode)}&lot=${encodeURIComponent(one.lotCode)}`}
                >
                  {one.productName} on the staff chart
                </Link>
              ))
            : null}
        </span>
      </header>
      {madeOf.length === 0 ? (
        <p className="slate">No lot names it. Lots say what they are made of when they are opened.</p>
      ) : (
        <Table
          dense
          caption="Lots made of it, newest first"
          rows={madeOf}
          keyOf={(one) => `${one.lotCode} ${one.role} ${one.place}`}
          columns={[
            {
              head: 'Lot',
              cell: ({ lotCode }) => <Link href={`/lots/${encodeURIComponent(lotCode)}`}>{lotCode}</Link>,
            },
            { head: 'Product', cell: ({ productName }) => productName },
            { head: 'Made', cell: ({ madeAt }) => formatDateTime(madeAt, timeZone) },
            { head: 'As', wideOnly: true, cell: ({ role }) => lotMaterialWords[role] },
            ...(throughSpools
              ? [
                  {
                    head: 'From spool',
                    cell: ({ code }: (typeof madeOf)[number]) =>
                      code === row.code ? '–' : <Link href={materialInPath(code)}>{code}</Link>,
                  },
                ]
              : []),
            {
              head: 'Along the lot',
              unit: 'm',
              number: true,
              cell: ({ fromMetre, toMetre }) => formatAlong(fromMetre, toMetre, decimal),
            },
            {
              head: 'Lot length',
              unit: 'm',
              number: true,
              wideOnly: true,
              cell: ({ lengthMetres }) => formatNumber(lengthMetres, { decimals: 0, decimal }),
            },
            {
              head: 'State',
              cell: ({ state }) => (
                <span className="materials-in-state">
                  <VerdictMark verdict={stateWords[state].mark} /> <em>{stateWords[state].word}</em>
                </span>
              ),
            },
          ]}
        />
      )}
    </section>
  )
}
