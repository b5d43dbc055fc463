import type { Metadata } from 'next'
import Link from 'next/link'
import { notFound } from 'next/navigation'
import { roomPage } from '@/app/_page'
import { ActionForm } from '@/app/_ui/forms/ActionForm'
import { Submit } from '@/app/_ui/forms/Submit'
import { PageHead } from '@/app/_ui/shell/PageHead'
import { permit } from '@/lib/access/permit'
import { type GaugeKind, gaugeKinds } from '@/lib/input/equipment'
import { getWorks } from '@/lib/services/get-works'
import { DieFields, GaugeFields, MachineFields, WeightFields } from '../../_ui/EquipmentForms'
import { equipmentKindOf, kindWords } from '../../_ui/kinds'
import { createEquipmentAction } from '../../actions'

export const metadata: Metadata = { title: 'Add equipment' }

export default roomPage(async (actor, { params, query }) => {
  permit(actor, 'equipment.keep')
  const kind = equipmentKindOf(params.kind)
  if (kind === undefined) notFound()
  const works = await getWorks(actor)
  const gaugeKind = gaugeKinds.find((one) => one === query.kind) ?? 'micrometer'
  return (
    <>
      <PageHead over={<Link href="/equipment">Equipment</Link>} title={kindWords[kind].add} />
      {kind === 'gauges' ? <GaugeKinds current={gaugeKind} /> : null}
      <ActionForm key={gaugeKind} action={createEquipmentAction.bind(null, kind)} label={kindWords[kind].add}>
        {kind === 'gauges' ? <GaugeFields works={works} row={undefined} kind={gaugeKind} /> : null}
        {kind === 'weights' ? <WeightFields works={works} row={undefined} /> : null}
        {kind === 'machines' ? <MachineFields works={works} row={undefined} /> : null}
        {kind === 'dies' ? <DieFields works={works} row={undefined} /> : null}
        <div className="actions">
          <Submit>{kindWords[kind].add}</Submit>
        </div>
      </ActionForm>
    </>
  )
})

/** The kind decides the units of the form, so it comes first. */
function GaugeKinds({ current }: { readonly current: GaugeKind }) {
  return (
    <nav className="tabs" aria-label="Kind">
      {gaugeKinds.map((kind) => (
        <Link
          key={kind}
          href={`/equipment/gauges/new?kind=${kind}`}
          prefetch={false}
          aria-current={kind === current ? 'page' : undefined}
        >
          {kind}
        </Link>
      ))}
    </nav>
  )
}
