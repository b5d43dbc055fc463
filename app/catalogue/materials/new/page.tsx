import type { Metadata } from 'next'
import Link from 'next/link'
import { roomPage } from '@/app/_page'
import { PageHead } from '@/app/_ui/shell/PageHead'
import { permit } from '@/lib/access/permit'
import { getWorks } from '@/lib/services/get-works'
import { MaterialForm } from '../../_ui/MaterialForm'
import { createMaterialAction } from '../../actions'

export const metadata: Metadata = { title: 'Add a material' }

export default roomPage(async (actor) => {
  permit(actor, 'catalogue.keep')
  const works = await getWorks(actor)
  return (
    <>
      <PageHead over={<Link href="/catalogue/materials">Materials</Link>} title="Add a material" />
      <MaterialForm action={createMaterialAction} decimal={works.numberFormat} />
    </>
  )
})
