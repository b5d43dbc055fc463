import Link from 'next/link'
import { Table } from '@/app/_ui/tables/Table'
import { formatNumber, formatQuantity } from '@/lib/domain/units/format'
import type { WorksFacts } from '@/lib/services/get-works'
import type { MaterialInItem } from '@/lib/services/list-materials-in'
import { kindNames, materialInPath } from './paths'

interface Props {
  readonly rows: readonly MaterialInItem[]
  readonly works: Pick<WorksFacts, 'numberFormat' | 'units'>
  readonly dayOf: (at: number) => string
}

/** The list of coils, spools and batches; those put away are grey. */
export function MaterialsInTable({ rows, works: { numberFormat: decimal, units }, dayOf }: Props) {
  return (
    <Table
      dense
      caption="Coils, spools and resin batches"
      rows={rows}
      keyOf={({ code }) => code}
      leftOut={({ active }) => !active}
      columns={[
        { head: 'Code', cell: ({ code }) => <Link href={materialInPath(code)}>{code}</Link> },
        {
          head: 'Kind',
          cell: ({ kind, active }) => (active ? kindNames[kind] : `${kindNames[kind]}, put away`),
        },
        { head: 'Name', cell: ({ name }) => name },
        { head: 'Material', wideOnly: true, cell: ({ material }) => material ?? '–' },
        { head: 'Heat', cell: ({ heat }) => heat || '–' },
        { head: 'Supplier', wideOnly: true, cell: ({ supplier }) => supplier || '–' },
        {
          head: 'Wound from',
          wideOnly: true,
          cell: ({ parentCode }) =>
            parentCode === undefined ? '–' : <Link href={materialInPath(parentCode)}>{parentCode}</Link>,
        },
        {
          head: 'Size',
          unit: units.diameter,
          number: true,
          wideOnly: true,
          cell: ({ sizeMetres }) => formatQuantity(sizeMetres, units.diameter, { decimal }),
        },
        {
          head: 'Length',
          unit: 'm',
          number: true,
          wideOnly: true,
          cell: ({ lengthMetres }) => formatNumber(lengthMetres, { decimals: 0, decimal }),
        },
        {
          head: 'Came in',
          wideOnly: true,
          cell: ({ receivedAt }) => (receivedAt === undefined ? '–' : dayOf(receivedAt)),
        },
        { head: 'Lots', number: true, cell: ({ lots }) => lots },
      ]}
    />
  )
}
