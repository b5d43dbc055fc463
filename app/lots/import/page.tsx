import type { Metadata } from 'next'
import Link from 'next/link'
import { roomPage } from '@/app/_page'
import { formatDateTime } from '@/app/_ui/format/dates'
import { PageHead } from '@/app/_ui/shell/PageHead'
import { Table } from '@/app/_ui/tables/Table'
import { may } from '@/lib/access/permit'
import { getWorks } from '@/lib/services/get-works'
import { listImports } from '@/lib/services/list-imports'
import { FileFormat } from './_ui/FileFormat'
import { importStateWords } from './_ui/import-words'
import { SendFile } from './_ui/SendFile'
import './import.css'

export const metadata: Metadata = { title: 'Import' }

/** Old data come in from files, one row a specimen. */
export default roomPage(async (actor) => {
  const imports = await listImports(actor)
  const { timeZone } = await getWorks(actor)
  return (
    <>
      <PageHead
        over={<Link href="/lots">Lots</Link>}
        title="Import"
        under="Lots and readings from a file, one row a specimen."
      />
      {may(actor, 'imports.run') ? <SendFile /> : null}
      <FileFormat />
      <section className="section">
        <h2>Imports so far</h2>
        {imports.length === 0 ? (
          <p>None yet. The first file you send stands here, with what became of each row.</p>
        ) : (
          <Table
            caption="Imports, newest first"
            rows={imports}
            keyOf={(one) => one.id}
            columns={[
              { head: 'File', cell: (one) => <Link href={`/lots/import/${one.id}`}>{one.fileName}</Link> },
              { head: 'Sent', cell: (one) => formatDateTime(one.createdAt, timeZone) },
              { head: 'By', cell: (one) => one.by ?? '–' },
              { head: 'State', cell: (one) => importStateWords[one.state] },
              { head: 'Rows', number: true, cell: (one) => one.rowCount ?? '–' },
              { head: 'Stored', number: true, cell: (one) => one.stored || '–' },
              { head: 'Already there', number: true, wideOnly: true, cell: (one) => one.alreadyThere || '–' },
              {
                head: 'Differ',
                number: true,
                cell: (one) => (one.differing > 0 ? <b className="brass">{one.differing}</b> : '–'),
              },
              {
                head: 'Refused',
                number: true,
                cell: (one) => (one.refused > 0 ? <b className="vermilion">{one.refused}</b> : '–'),
              },
            ]}
          />
        )}
      </section>
    </>
  )
})
