import type { Metadata } from 'next'
import Link from 'next/link'
import { roomPage } from '@/app/_page'
import { Cautions } from '@/app/_ui/shell/Cautions'
import { PageHead } from '@/app/_ui/shell/PageHead'
import { permit } from '@/lib/access/permit'
import { rigCautions } from '@/lib/domain/strings/cautions'
import { getWorks } from '@/lib/services/get-works'
import { listEquipment } from '@/lib/services/list-equipment'
import { RigForm } from '../../_ui/RigForm'
import { createEquipmentAction } from '../../actions'

export const metadata: Metadata = { title: 'Add a rig' }

export default roomPage(async (actor) => {
  permit(actor, 'equipment.keep')
  const works = await getWorks(actor)
  const list = await listEquipment(actor)
  return (
    <>
      <PageHead over={<Link href="/equipment">Equipment</Link>} title="Add a rig" />
      <Cautions title="Loaded strings and hanging weights can hurt." sentences={rigCautions} />
      <RigForm action={createEquipmentAction.bind(null, 'rigs')} works={works} list={list} keeps />
    </>
  )
})
