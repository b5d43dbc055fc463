import type { Metadata } from 'next'
import Link from 'next/link'
import { roomPage } from '@/app/_page'
import { formatDate } from '@/app/_ui/format/dates'
import { EmptyState } from '@/app/_ui/shell/EmptyState'
import { PageHead } from '@/app/_ui/shell/PageHead'
import { Table } from '@/app/_ui/tables/Table'
import { may } from '@/lib/access/permit'
import { basisNames } from '@/lib/domain/datasheets/tension-by-basis'
import { getWorks } from '@/lib/services/get-works'
import { listDatasheets } from '@/lib/services/list-datasheets'

export const metadata: Metadata = { title: 'Datasheets' }

export default roomPage(async (actor) => {
  const [datasheets, works] = [await listDatasheets(actor), await getWorks(actor)]
  const build = may(actor, 'datasheets.build') ? (
    <Link className="button primary" href="/datasheets/new">
      Build a datasheet
    </Link>
  ) : null
  return (
    <>
      <PageHead
        title="Datasheets"
        under="Tension tables made of released lots; every revision stays readable."
        actions={build}
      />
      {datasheets.length === 0 ? (
        <EmptyState title="No datasheet is published yet." action={build}>
          A datasheet rests on released lots. When a lot is released, build a tension table from it and
          publish it as revision 1.
        </EmptyState>
      ) : (
        <Table
          caption="Datasheets with their newest revision"
          keyOf={(row) => row.code}
          rows={datasheets}
          columns={[
            { head: 'Datasheet', cell: (row) => <Link href={`/datasheets/${row.code}`}>{row.code}</Link> },
            { head: 'Product', cell: (row) => row.productName },
            { head: 'Revision', number: true, cell: (row) => row.newest?.number ?? '–' },
            {
              head: 'Issued',
              cell: (row) => (row.newest ? formatDate(row.newest.publishedAt, works.timeZone) : '–'),
            },
            {
              head: 'Basis',
              cell: (row) => basisNames[row.newest?.basis as keyof typeof basisNames] ?? '–',
            },
            {
              head: 'Evidence',
              cell: (row) =>
                row.newest?.evidenceChanged ? (
                  <em className="vermilion">evidence changed</em>
                ) : (
                  <em>as published</em>
                ),
            },
          ]}
        />
      )}
    </>
  )
})
