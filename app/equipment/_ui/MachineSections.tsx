import Link from 'next/link'
import { Table } from '@/app/_ui/tables/Table'
import { formatNumber, formatQuantity } from '@/lib/domain/units/format'
import type { DrawnByDie } from '@/lib/services/list-drawn'
import { equipmentPath } from './kinds'
import { SectionFrame, type SectionProps } from './SectionFrame'

export function MachineSection({ list: { machines }, keeps }: SectionProps) {
  return (
    <SectionFrame
      title="Machines"
      empty="No machine yet."
      count={machines.length}
      add={keeps ? { href: '/equipment/machines/new', label: 'Add a machine' } : undefined}
    >
      <Table
        dense
        caption="Machines"
        rows={machines}
        keyOf={({ code }) => code}
        leftOut={({ active }) => !active}
        columns={[
          {
            head: 'Machine',
            cell: ({ code, name }) => <Link href={equipmentPath('machines', code)}>{name}</Link>,
          },
          { head: 'Code', cell: ({ code }) => code },
          { head: 'Kind', cell: ({ kind, active }) => (active ? kind : `${kind}, put away`) },
        ]}
      />
    </SectionFrame>
  )
}

export function DieSection({
  list: { dies },
  works: { units, numberFormat: decimal },
  keeps,
  drawn,
}: SectionProps & { readonly drawn: DrawnByDie }) {
  return (
    <SectionFrame
      title="Dies"
      empty="No die yet."
      count={dies.length}
      add={keeps ? { href: '/equipment/dies/new', label: 'Add a die' } : undefined}
    >
      <Table
        dense
        caption="Dies"
        rows={dies}
        keyOf={({ code }) => code}
        leftOut={({ active }) => !active}
        columns={[
          { head: 'Die', cell: ({ code, name }) => <Link href={equipmentPath('dies', code)}>{name}</Link> },
          { head: 'Code', cell: ({ code, active }) => (active ? code : `${code}, put away`) },
          {
            head: 'Bore',
            unit: units.diameter,
            number: true,
            cell: ({ sizeMetres }) => formatQuantity(sizeMetres, units.diameter, { decimal }),
          },
          {
            head: 'Drawn',
            unit: 'm',
            number: true,
            cell: ({ id }) => {
              const own = drawn.get(id)
              if (own === undefined) return '0'
              if (own.withoutLength === own.lots) return '–'
              return `${own.withoutLength > 0 ? 'at least ' : ''}${formatNumber(own.metres, { decimals: 0, decimal })}`
            },
          },
        ]}
      />
    </SectionFrame>
  )
}
