import Link from 'next/link'
import { formatDate } from '@/app/_ui/format/dates'
import { Table } from '@/app/_ui/tables/Table'
import { formatNumber } from '@/lib/domain/units/format'
import type { MaterialInView } from '@/lib/services/get-material-in'
import type { WorksFacts } from '@/lib/services/get-works'
import { materialInPath } from './paths'

interface Props {
  readonly spools: MaterialInView['spools']
  readonly works: Pick<WorksFacts, 'numberFormat' | 'timeZone'>
}

/** Spools wound from a coil. */
export function SpoolsWound({ spools, works: { numberFormat: decimal, timeZone } }: Props) {
  return (
    <section className="section">
      <h2>Spools wound from it</h2>
      {spools.length === 0 ? (
        <p className="slate">No spool names it.</p>
      ) : (
        <Table
          dense
          caption="Spools wound from this coil"
          rows={spools}
          keyOf={({ code }) => code}
          leftOut={({ active }) => !active}
          columns={[
            { head: 'Spool', cell: ({ code }) => <Link href={materialInPath(code)}>{code}</Link> },
            { head: 'Name', cell: ({ name, active }) => (active ? name : `${name}, put away`) },
            {
              head: 'Length',
              unit: 'm',
              number: true,
              cell: ({ lengthMetres }) => formatNumber(lengthMetres, { decimals: 0, decimal }),
            },
            {
              head: 'Wound',
              cell: ({ receivedAt }) => (receivedAt === undefined ? '–' : formatDate(receivedAt, timeZone)),
            },
          ]}
        />
      )}
    </section>
  )
}
