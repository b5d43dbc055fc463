import type { Metadata } from 'next'
import Link from 'next/link'
import { roomPage } from '@/app/_page'
import { Cautions } from '@/app/_ui/shell/Cautions'
import { PageHead } from '@/app/_ui/shell/PageHead'
import { may } from '@/lib/access/permit'
import { rigCautions } from '@/lib/domain/strings/cautions'
import { getWorks } from '@/lib/services/get-works'
import { requireRig } from '@/lib/services/keep-rig'
import { listEquipment } from '@/lib/services/list-equipment'
import { PutAway } from '../../_ui/PutAway'
import { RigForm } from '../../_ui/RigForm'
import { UsualLoad } from '../../_ui/UsualLoad'
import { updateEquipmentAction } from '../../actions'

export const metadata: Metadata = { title: 'Rig' }

export default roomPage(async (actor, { params }) => {
  const works = await getWorks(actor)
  const rig = await requireRig(actor, params.code ?? '')
  const list = await listEquipment(actor)
  const keeps = may(actor, 'equipment.keep')
  return (
    <>
      <PageHead
        over={<Link href="/equipment">Equipment</Link>}
        title={
          <>
            {rig.name} <span>{rig.code}</span>
          </>
        }
        under={`${rig.arrangement}, ${rig.endCondition === 'knife' ? 'knife edges' : rig.endCondition}${rig.active ? '' : ': put away'}`}
        actions={
          keeps ? (
            <PutAway kind="rigs" code={rig.code} version={rig.version} active={rig.active} />
          ) : undefined
        }
      />
      <Cautions title="Loaded strings and hanging weights can hurt." sentences={rigCautions} />
      <div className="columns">
        <RigForm
          key={rig.version}
          action={updateEquipmentAction.bind(null, 'rigs', rig.code)}
          works={works}
          list={list}
          rig={rig}
          keeps={keeps}
        />
        <aside>
          <UsualLoad rig={rig} weights={list.weights} works={works} />
        </aside>
      </div>
    </>
  )
})
