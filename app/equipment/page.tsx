import type { Metadata } from 'next'
import Link from 'next/link'
import { roomPage } from '@/app/_page'
import { EmptyState } from '@/app/_ui/shell/EmptyState'
import { PageHead } from '@/app/_ui/shell/PageHead'
import { may } from '@/lib/access/permit'
import { getWorks } from '@/lib/services/get-works'
import { listDrawn } from '@/lib/services/list-drawn'
import { listEquipment } from '@/lib/services/list-equipment'
import { DieSection, MachineSection } from './_ui/MachineSections'
import { GaugeSection, RigSection, WeightSection } from './_ui/MeasuringSections'

export const metadata: Metadata = { title: 'Equipment' }

export default roomPage(async (actor) => {
  const works = await getWorks(actor)
  const list = await listEquipment(actor)
  const drawn = await listDrawn(actor)
  const keeps = may(actor, 'equipment.keep')
  const nothing = Object.values(list).every((rows) => rows.length === 0)
  const section = { list, works, keeps, now: Date.now() }
  return (
    <>
      <PageHead
        title="Equipment"
        under="What measures and what makes. Each reading names the equipment it was taken with."
      />
      {nothing ? (
        <EmptyState
          title="Nothing is registered yet."
          action={
            keeps ? (
              <Link className="button primary" href="/equipment/gauges/new">
                Add measuring equipment
              </Link>
            ) : undefined
          }
        >
          Begin with what measures: micrometer, balance, rule and counter. Then the weights and the hanger,
          then the rig they belong to; last the machines and dies that make the wire.
        </EmptyState>
      ) : null}
      <RigSection {...section} />
      <GaugeSection {...section} />
      <WeightSection {...section} />
      <div className="columns even">
        <MachineSection {...section} />
        <DieSection {...section} drawn={drawn} />
      </div>
    </>
  )
})
