import Link from 'next/link'
import { Table } from '@/app/_ui/tables/Table'
import { formatQuantity } from '@/lib/domain/units/format'
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

export function DieSection({ list: { dies }, works: { units, numberFormat: decimal }, keeps }: SectionProps) {
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
        ]}
      />
    </SectionFrame>
  )
}
