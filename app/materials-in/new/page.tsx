import type { Metadata } from 'next'
import Link from 'next/link'
import { roomPage } from '@/app/_page'
import { PageHead } from '@/app/_ui/shell/PageHead'
import { permit } from '@/lib/access/permit'
import { materialInKinds } from '@/lib/domain/record/material-in'
import { getWorks } from '@/lib/services/get-works'
import { listMaterials } from '@/lib/services/list-materials'
import { listMaterialsInUse } from '@/lib/services/list-materials-in'
import { MaterialInForm } from '../_ui/MaterialInForm'
import { createMaterialInAction } from '../actions'

export const metadata: Metadata = { title: 'Add a coil, spool or batch' }

export default roomPage(async (actor, { query }) => {
  permit(actor, 'materials-in.keep')
  const works = await getWorks(actor)
  const materials = await listMaterials(actor)
  const coils = (await listMaterialsInUse(actor)).filter(({ kind }) => kind === 'coil')
  return (
    <>
      <PageHead over={<Link href="/materials-in">Materials in</Link>} title="Add a coil, spool or batch" />
      <MaterialInForm
        action={createMaterialInAction}
        works={works}
        materials={materials}
        coils={coils}
        kind={materialInKinds.find((kind) => kind === query.kind)}
        parentCode={query.parentCode}
      />
    </>
  )
})
