import type { Metadata } from 'next'
import Link from 'next/link'
import { roomPage } from '@/app/_page'
import { formatDate } from '@/app/_ui/format/dates'
import { EmptyState } from '@/app/_ui/shell/EmptyState'
import { PageHead } from '@/app/_ui/shell/PageHead'
import { type Column, Table } from '@/app/_ui/tables/Table'
import { may } from '@/lib/access/permit'
import { noteName } from '@/lib/domain/strings/pitch'
import { formatQuantity } from '@/lib/domain/units/format'
import { getWorks, type WorksFacts } from '@/lib/services/get-works'
import { type ListedProduct, listProducts } from '@/lib/services/list-products'
import { CatalogueTabs } from './_ui/CatalogueTabs'
import { diameterDecimals } from './_ui/shown'

export const metadata: Metadata = { title: 'Catalogue' }

export default roomPage(async (actor) => {
  const works = await getWorks(actor)
  const products = await listProducts(actor)
  const add = may(actor, 'catalogue.keep') ? (
    <Link className="button primary" href="/catalogue/products/new">
      Add a product
    </Link>
  ) : undefined
  return (
    <>
      <PageHead title="Catalogue" under="What the works makes, and what each has to be." actions={add} />
      <CatalogueTabs current="/catalogue" />
      {products.length === 0 ? (
        <EmptyState title="No product yet." action={add}>
          Add the first one, then issue its specification: diameter, mass per metre, tension at a note, and
          how a lot is inspected. After that the bench can open a lot of it.
        </EmptyState>
      ) : (
        <section className="section">
          <Table
            caption="Products with the specification in force"
            rows={products}
            keyOf={({ code }) => code}
            leftOut={({ active }) => !active}
            columns={columns(works)}
          />
        </section>
      )}
    </>
  )
})

function columns({ units, numberFormat: decimal, timeZone }: WorksFacts): readonly Column<ListedProduct>[] {
  return [
    {
      head: 'Product',
      cell: ({ code, name }) => <Link href={`/catalogue/products/${encodeURIComponent(code)}`}>{name}</Link>,
    },
    { head: 'Code', cell: ({ code }) => code },
    { head: 'Family', cell: ({ family }) => family },
    {
      head: 'Diameter',
      unit: units.diameter,
      number: true,
      cell: ({ inForce }) =>
        formatQuantity(inForce?.body.diameter.target, units.diameter, {
          decimals: diameterDecimals(units.diameter),
          decimal,
        }),
    },
    {
      head: 'Mass per metre',
      unit: 'mg/m',
      number: true,
      cell: ({ inForce }) => formatQuantity(inForce?.body.massPerMetre.target, 'mg/m', { decimal }),
    },
    {
      head: 'Tension',
      unit: units.force,
      number: true,
      cell: ({ inForce }) => formatQuantity(inForce?.body.tension.target, units.force, { decimal }),
    },
    { head: 'At', cell: ({ inForce }) => (inForce ? noteName(inForce.body.reference.midi) : '–') },
    {
      head: 'Specification',
      cell: ({ active, inForce }) =>
        !active ? (
          'no longer made'
        ) : inForce ? (
          `revision ${inForce.number}, ${formatDate(inForce.effectiveFrom, timeZone)}`
        ) : (
          <span className="brass">none in force</span>
        ),
    },
  ]
}
