import type { Metadata } from 'next'
import Link from 'next/link'
import { roomPage } from '@/app/_page'
import { formatDate } from '@/app/_ui/format/dates'
import { ConfirmForm } from '@/app/_ui/forms/ConfirmForm'
import { EmptyState } from '@/app/_ui/shell/EmptyState'
import { Notice } from '@/app/_ui/shell/Notice'
import { PageHead } from '@/app/_ui/shell/PageHead'
import { Table } from '@/app/_ui/tables/Table'
import { may } from '@/lib/access/permit'
import { getWorks } from '@/lib/services/get-works'
import { listMaterials } from '@/lib/services/list-materials'
import { listPeople } from '@/lib/services/list-people'
import { requireProduct } from '@/lib/services/list-products'
import { SpecificationView } from '../../_ui/SpecificationView'
import { setProductActiveAction } from '../../actions'

export const metadata: Metadata = { title: 'Product' }

export default roomPage(async (actor, { params }) => {
  const works = await getWorks(actor)
  const product = await requireProduct(actor, params.code ?? '')
  const materials = await listMaterials(actor)
  const people = await listPeople(actor)
  const { inForce, revisions } = product
  const path = `/catalogue/products/${encodeURIComponent(product.code)}`
  const keeps = may(actor, 'catalogue.keep')
  const issue = keeps ? (
    <Link className="button primary" href={`${path}/issue`}>
      {revisions.length === 0 ? 'Issue the specification' : 'Issue the next revision'}
    </Link>
  ) : undefined
  const who = (id: number | undefined) => people.find((person) => person.id === id)?.name ?? '–'
  return (
    <>
      <PageHead
        over={<Link href="/catalogue">Catalogue</Link>}
        title={
          <>
            {product.name} <span>{product.code}</span>
          </>
        }
        under={`${product.family}, ${product.construction}${product.active ? '' : ': no longer made'}`}
        actions={
          keeps ? (
            <>
              <ConfirmForm
                action={setProductActiveAction.bind(null, product.code, !product.active)}
                label={product.active ? 'Take out of the range' : 'Back into the range'}
                title={product.active ? `No longer make ${product.name}?` : `Make ${product.name} again?`}
                confirm={product.active ? `Take ${product.name} out` : `Make ${product.name} again`}
                tone={product.active ? 'alarm' : 'primary'}
              >
                <p>
                  {product.active
                    ? 'No new lot of it can be opened. Its lots, charts and datasheets stay as they are.'
                    : 'New lots of it can be opened again.'}
                </p>
              </ConfirmForm>
              {issue}
            </>
          ) : undefined
        }
      />
      {inForce ? (
        <>
          <p className="small">
            Revision {inForce.number}, in force since {formatDate(inForce.effectiveFrom, works.timeZone)}
          </p>
          <SpecificationView
            specification={inForce}
            works={works}
            material={materials.find(({ code }) => code === inForce.materialCode)?.body}
          />
        </>
      ) : revisions.length > 0 ? (
        <Notice tone="question">No revision is in force yet; the first one takes force later.</Notice>
      ) : (
        <EmptyState title="No specification yet." action={issue}>
          A lot is judged by the revision in force when it was made. Issue the first one to let the bench
          begin.
        </EmptyState>
      )}
      {revisions.length > 0 ? (
        <section className="section">
          <h2>Revisions</h2>
          <Table
            caption="Specification revisions, newest first"
            rows={revisions}
            keyOf={({ number }) => number}
            columns={[
              {
                head: 'Revision',
                cell: ({ number }) => <Link href={`${path}/${number}`}>Revision {number}</Link>,
              },
              {
                head: 'In force from',
                cell: ({ effectiveFrom }) => formatDate(effectiveFrom, works.timeZone),
              },
              { head: 'What changed', cell: ({ note }) => note || '–' },
              { head: 'Issued', cell: ({ issuedAt }) => formatDate(issuedAt, works.timeZone) },
              { head: 'By', cell: ({ issuedById }) => who(issuedById) },
            ]}
          />
        </section>
      ) : null}
    </>
  )
})
