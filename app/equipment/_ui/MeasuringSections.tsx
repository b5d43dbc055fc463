import Link from 'next/link'
import { Table } from '@/app/_ui/tables/Table'
import { formatQuantity } from '@/lib/domain/units/format'
import { Due } from './due'
import { equipmentPath } from './kinds'
import { SectionFrame, type SectionProps } from './SectionFrame'
import { gaugeUnit, shownMass, shownSmall } from './shown'

export function RigSection({ list: { rigs }, works, keeps }: SectionProps) {
  const { numberFormat: decimal, units } = works
  return (
    <SectionFrame
      title="Rigs"
      empty="No rig yet: without one nothing can be sounded."
      count={rigs.length}
      add={keeps ? { href: '/equipment/rigs/new', label: 'Add a rig' } : undefined}
    >
      <Table
        caption="Rigs"
        rows={rigs}
        keyOf={({ code }) => code}
        leftOut={({ active }) => !active}
        columns={[
          { head: 'Rig', cell: ({ code, name }) => <Link href={equipmentPath('rigs', code)}>{name}</Link> },
          { head: 'Code', cell: ({ code }) => code },
          { head: 'Arrangement', cell: ({ arrangement }) => arrangement },
          { head: 'Ends', cell: ({ endCondition }) => endCondition },
          {
            head: 'Span',
            unit: units.length,
            number: true,
            cell: ({ spanMetres }) =>
              formatQuantity(spanMetres, units.length, { decimals: units.length === 'mm' ? 1 : 3, decimal }),
          },
          {
            head: 'Usually hangs',
            cell: ({ hangerCode, weightCodes }) =>
              [hangerCode, ...weightCodes].filter(Boolean).join(', ') || '–',
          },
          { head: 'Standing', cell: ({ active }) => (active ? 'in use' : 'put away') },
        ]}
      />
    </SectionFrame>
  )
}

export function GaugeSection({ list: { gauges }, works, keeps, now }: SectionProps) {
  const { numberFormat: decimal, timeZone } = works
  return (
    <SectionFrame
      title="Measuring equipment"
      empty="No micrometer, balance, rule or counter yet."
      count={gauges.length}
      add={keeps ? { href: '/equipment/gauges/new', label: 'Add measuring equipment' } : undefined}
    >
      <Table
        caption="Measuring equipment"
        rows={gauges}
        keyOf={({ code }) => code}
        leftOut={({ active }) => !active}
        columns={[
          {
            head: 'Name',
            cell: ({ code, name }) => <Link href={equipmentPath('gauges', code)}>{name}</Link>,
          },
          { head: 'Code', cell: ({ code }) => code },
          {
            head: 'Kind',
            cell: ({ kind, mode }) => (mode === 'against-pin' ? `${kind}, against a pin` : kind),
          },
          {
            head: 'Resolution',
            number: true,
            cell: ({ kind, resolution }) => shownSmall(resolution, gaugeUnit(kind), decimal),
          },
          {
            head: 'Standard uncertainty',
            number: true,
            cell: ({ kind, uAbsolute }) => shownSmall(uAbsolute, gaugeUnit(kind), decimal),
          },
          {
            head: 'Calibration due',
            cell: ({ active, calibrationDueAt }) =>
              active ? <Due at={calibrationDueAt} now={now} timeZone={timeZone} /> : 'put away',
          },
        ]}
      />
    </SectionFrame>
  )
}

export function WeightSection({ list: { weights }, works, keeps }: SectionProps) {
  return (
    <SectionFrame
      title="Weights, hangers and hooks"
      empty="Nothing that hangs is registered yet. Weigh the hanger and every hook: they pull, too."
      count={weights.length}
      add={keeps ? { href: '/equipment/weights/new', label: 'Add a weight or hanger' } : undefined}
    >
      <Table
        dense
        caption="Weights, hangers and hooks"
        rows={weights}
        keyOf={({ code }) => code}
        leftOut={({ active }) => !active}
        columns={[
          { head: 'Code', cell: ({ code }) => <Link href={equipmentPath('weights', code)}>{code}</Link> },
          { head: 'Kind', cell: ({ kind }) => kind },
          {
            head: 'Conventional mass',
            unit: '± k = 2',
            number: true,
            cell: ({ conventionalMass, uMass }) => shownMass(conventionalMass, uMass, works.numberFormat),
          },
          { head: 'Note', cell: ({ note }) => note || '–' },
          { head: 'Standing', cell: ({ active }) => (active ? 'in use' : 'put away') },
        ]}
      />
    </SectionFrame>
  )
}
