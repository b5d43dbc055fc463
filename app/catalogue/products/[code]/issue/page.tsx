import type { Metadata } from 'next'
import Link from 'next/link'
import { roomPage } from '@/app/_page'
import { EmptyState } from '@/app/_ui/shell/EmptyState'
import { PageHead } from '@/app/_ui/shell/PageHead'
import { permit } from '@/lib/access/permit'
import { getWorks } from '@/lib/services/get-works'
import { listEquipment } from '@/lib/services/list-equipment'
import { listMaterials } from '@/lib/services/list-materials'
import { requireProduct } from '@/lib/services/list-products'
import { SpecificationForm } from '../../../_ui/SpecificationForm'

export const metadata: Metadata = { title: 'Issue a specification' }

export default roomPage(async (actor, { params }) => {
  permit(actor, 'catalogue.keep')
  const works = await getWorks(actor)
  const product = await requireProduct(actor, params.code ?? '')
  const materials = await listMaterials(actor)
  const { rigs } = await listEquipment(actor)
  const [newest] = product.revisions
  return (
    <>
      <PageHead
        over={<Link href={`/catalogue/products/${encodeURIComponent(product.code)}`}>{product.name}</Link>}
        title={
          <>
            {product.name} <span>specification revision {(newest?.number ?? 0) + 1}</span>
          </>
        }
        under="Frozen once issued. A lot keeps the revision that was in force when it was made."
      />
      {rigs.some(({ active }) => active) ? (
        <SpecificationForm
          product={product}
          works={works}
          materials={materials}
          rigs={rigs}
          today={Date.now()}
        />
      ) : (
        <EmptyState
          title="There is no rig yet."
          action={
            <Link className="button primary" href="/equipment/rigs/new">
              Add a rig
            </Link>
          }
        >
          A specification says on which rig its specimens are sounded. Add one under Equipment first.
        </EmptyState>
      )}
    </>
  )
})
