import type { Metadata } from 'next'
import Link from 'next/link'
import { notFound } from 'next/navigation'
import { roomPage } from '@/app/_page'
import { formatDate, formatDateTime } from '@/app/_ui/format/dates'
import { PageHead } from '@/app/_ui/shell/PageHead'
import { getWorks } from '@/lib/services/get-works'
import { listMaterials } from '@/lib/services/list-materials'
import { listPeople } from '@/lib/services/list-people'
import { requireProduct } from '@/lib/services/list-products'
import { SpecificationView } from '../../../_ui/SpecificationView'

export const metadata: Metadata = { title: 'Specification revision' }

export default roomPage(async (actor, { params }) => {
  const works = await getWorks(actor)
  const product = await requireProduct(actor, params.code ?? '')
  const revision = product.revisions.find(({ number }) => String(number) === params.number)
  if (!revision) notFound()
  const materials = await listMaterials(actor)
  const people = await listPeople(actor)
  const issuer = people.find(({ id }) => id === revision.issuedById)?.name
  return (
    <>
      <PageHead
        over={<Link href={`/catalogue/products/${encodeURIComponent(product.code)}`}>{product.name}</Link>}
        title={
          <>
            {product.name} <span>specification revision {revision.number}</span>
          </>
        }
        under={`In force from ${formatDate(revision.effectiveFrom, works.timeZone)}; issued ${formatDateTime(revision.issuedAt, works.timeZone)}${issuer ? ` by ${issuer}` : ''}. Frozen.`}
      />
      {revision.note ? <p className="lead">{revision.note}</p> : null}
      <SpecificationView
        specification={revision}
        works={works}
        material={materials.find(({ code }) => code === revision.materialCode)?.body}
      />
      <p className="small">
        SHA-256 <code>{revision.hash}</code>
      </p>
    </>
  )
})
