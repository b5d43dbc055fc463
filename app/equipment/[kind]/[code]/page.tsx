import type { Metadata } from 'next'
import Link from 'next/link'
import { notFound } from 'next/navigation'
import type { ReactNode } from 'react'
import { roomPage } from '@/app/_page'
import { ActionForm } from '@/app/_ui/forms/ActionForm'
import { Submit } from '@/app/_ui/forms/Submit'
import { PageHead } from '@/app/_ui/shell/PageHead'
import type { Actor } from '@/lib/access/actor'
import { may } from '@/lib/access/permit'
import { gaugeKinds } from '@/lib/input/equipment'
import { getDie } from '@/lib/services/get-die'
import { getMachine } from '@/lib/services/get-machine'
import { getWorks, type WorksFacts } from '@/lib/services/get-works'
import { requireGauge } from '@/lib/services/keep-gauge'
import { requireWeight } from '@/lib/services/keep-weight'
import { DieFields, GaugeFields, MachineFields, WeightFields } from '../../_ui/EquipmentForms'
import { type EquipmentKind, equipmentKindOf, kindWords } from '../../_ui/kinds'
import { DrawnThroughDie, MadeOnMachine } from '../../_ui/MadeWith'
import { PutAway } from '../../_ui/PutAway'
import { updateEquipmentAction } from '../../actions'

export const metadata: Metadata = { title: 'Equipment' }

interface Found {
  readonly row: {
    readonly code: string
    readonly version: number
    readonly active: boolean
    readonly name?: string
  }
  readonly fields: ReactNode
  /** What was made with it. */
  readonly made?: ReactNode
}

const find = async (kind: EquipmentKind, code: string, actor: Actor, works: WorksFacts): Promise<Found> => {
  switch (kind) {
    case 'gauges': {
      const row = await requireGauge(actor, code)
      const gaugeKind = gaugeKinds.find((one) => one === row.kind) ?? 'micrometer'
      return { row, fields: <GaugeFields works={works} row={row} kind={gaugeKind} /> }
    }
    case 'weights': {
      const row = await requireWeight(actor, code)
      return { row, fields: <WeightFields works={works} row={row} /> }
    }
    case 'machines': {
      const view = await getMachine(actor, code)
      return {
        row: view.row,
        fields: <MachineFields works={works} row={view.row} />,
        made: <MadeOnMachine view={view} works={works} maySeeDrift={may(actor, 'drift.read')} />,
      }
    }
    case 'dies': {
      const view = await getDie(actor, code)
      return {
        row: view.row,
        fields: <DieFields works={works} row={view.row} />,
        made: <DrawnThroughDie view={view} works={works} maySeeDrift={may(actor, 'drift.read')} />,
      }
    }
  }
}

export default roomPage(async (actor, { params }) => {
  const kind = equipmentKindOf(params.kind)
  if (kind === undefined) notFound()
  const works = await getWorks(actor)
  const { row, fields, made } = await find(kind, params.code ?? '', actor, works)
  const keeps = may(actor, 'equipment.keep')
  const form = (
    <ActionForm action={updateEquipmentAction.bind(null, kind, row.code)} label={row.code}>
      <fieldset disabled={!keeps}>{fields}</fieldset>
      {keeps ? (
        <div className="actions">
          <Submit>Save {row.code}</Submit>
          <span className="small">Results already computed keep what they rest on.</span>
        </div>
      ) : (
        <p className="small">Quality keeps the equipment list.</p>
      )}
    </ActionForm>
  )
  return (
    <>
      <PageHead
        over={<Link href="/equipment">Equipment</Link>}
        title={
          row.name ? (
            <>
              {row.name} <span>{row.code}</span>
            </>
          ) : (
            row.code
          )
        }
        under={row.active ? kindWords[kind].one : `${kindWords[kind].one}, put away`}
        actions={
          keeps ? (
            <PutAway kind={kind} code={row.code} version={row.version} active={row.active} />
          ) : undefined
        }
      />
      {made}
      {made ? (
        <section className="section">
          <h2>What is known of it</h2>
          {form}
        </section>
      ) : (
        form
      )}
    </>
  )
})
