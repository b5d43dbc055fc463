import Link from 'next/link'
import { formatDate } from '@/app/_ui/format/dates'
import { Table } from '@/app/_ui/tables/Table'
import type { DriftMachine } from '@/lib/services/list-drift-machines'
import type { DriftProduct } from '@/lib/services/list-drift-products'
import { driftAddress, driftHref } from './drift-address'

interface Props {
  readonly machines: readonly DriftMachine[]
  readonly products: readonly DriftProduct[]
  readonly timeZone: string
}

const waiting = (count: number) => (count > 0 ? <b className="vermilion">{count}</b> : '–')

/** Every chart there is, machines first: what is on it, and what waits there. */
export function ChartLists({ machines, products, timeZone }: Props) {
  const day = (at: number | undefined): string => (at === undefined ? '–' : formatDate(at, timeZone))
  return (
    <>
      {machines.length === 0 ? null : (
        <section className="section">
          <h2>Machines</h2>
          <Table
            caption="Machines and what waits on their charts"
            rows={machines}
            keyOf={(machine) => machine.code}
            leftOut={(machine) => !machine.active}
            columns={[
              {
                head: 'Machine',
                cell: (machine) => (
                  <Link href={driftAddress({ kind: 'machine', code: machine.code })}>{machine.name}</Link>
                ),
              },
              { head: 'Lots', number: true, cell: (machine) => machine.lots },
              { head: 'Newest', wideOnly: true, cell: (machine) => day(machine.lastMadeAt) },
              { head: 'Open signals', number: true, cell: (machine) => waiting(machine.openSignals) },
            ]}
          />
        </section>
      )}
      <section className="section">
        <h2>Products</h2>
        <Table
          caption="Products and what waits on their charts"
          rows={products}
          keyOf={(product) => product.code}
          leftOut={(product) => !product.active}
          columns={[
            {
              head: 'Product',
              cell: (product) => <Link href={driftHref(product.code)}>{product.name}</Link>,
            },
            { head: 'Family', wideOnly: true, cell: (product) => product.family || '–' },
            { head: 'Lots', number: true, cell: (product) => product.lots },
            { head: 'Newest', wideOnly: true, cell: (product) => day(product.lastMadeAt) },
            { head: 'Open signals', number: true, cell: (product) => waiting(product.openSignals) },
            {
              head: 'Limit sets in force',
              number: true,
              wideOnly: true,
              cell: (product) => product.limitSets || '–',
            },
          ]}
        />
      </section>
    </>
  )
}
