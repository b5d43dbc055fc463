import type { Metadata } from 'next'
import Link from 'next/link'
import { roomPage } from '@/app/_page'
import { formatDate } from '@/app/_ui/format/dates'
import { EmptyState } from '@/app/_ui/shell/EmptyState'
import { Notice } from '@/app/_ui/shell/Notice'
import { PageHead } from '@/app/_ui/shell/PageHead'
import { may } from '@/lib/access/permit'
import { type ListMaterialsInInput, listMaterialsInSchema } from '@/lib/input/material-in'
import { parseInput } from '@/lib/input/parse-input'
import { getWorks } from '@/lib/services/get-works'
import { listMaterialsIn } from '@/lib/services/list-materials-in'
import { MaterialsInFilter } from './_ui/MaterialsInFilter'
import { MaterialsInTable } from './_ui/MaterialsInTable'
import './materials-in.css'

export const metadata: Metadata = { title: 'Materials in' }

const filled = (value: string | undefined): string | undefined => (value ? value : undefined)

const addressOf = ({ search, kind, inUse }: ListMaterialsInInput, page: number): string => {
  const parameters = new URLSearchParams({
    ...(search ? { search } : {}),
    ...(kind ? { kind } : {}),
    ...(inUse ? { inUse } : {}),
    ...(page > 1 ? { page: String(page) } : {}),
  })
  return `/materials-in${parameters.size > 0 ? `?${parameters}` : ''}`
}

/** Search and filters live in the address, as in the list of lots. */
export default roomPage(async (actor, { query }) => {
  const works = await getWorks(actor)
  const parsed = parseInput(listMaterialsInSchema, {
    search: query.search ?? '',
    kind: filled(query.kind),
    inUse: filled(query.inUse),
    page: query.page ?? '1',
  })
  const asked: ListMaterialsInInput = parsed.ok ? parsed.value : { search: '', page: 1 }
  const list = await listMaterialsIn(actor, asked)
  const filtered = Boolean(asked.search || asked.kind || asked.inUse)
  const add = may(actor, 'materials-in.keep') ? (
    <Link className="button primary" href="/materials-in/new">
      Add a coil, spool or batch
    </Link>
  ) : undefined
  return (
    <>
      <PageHead
        title="Materials in"
        under="Coils from the mill, the spools wound from them, and batches of resin: what each lot is made of."
        actions={list.count > 0 || filtered ? add : undefined}
      />
      {parsed.ok ? null : <Notice tone="alarm">{parsed.problems.map((one) => one.message).join(' ')}</Notice>}
      {list.count > 0 || filtered ? <MaterialsInFilter asked={asked} filtered={filtered} /> : null}
      {list.materials.length === 0 ? (
        <EmptyState
          title={filtered ? 'Nothing fits.' : 'Nothing has come in yet.'}
          action={filtered ? undefined : add}
        >
          {filtered
            ? 'Search for a part of the code, name, heat or supplier, or take a filter away.'
            : 'Register each coil, spool and resin batch when it comes in. Lots then name it, and a change of spool shows on their charts.'}
        </EmptyState>
      ) : (
        <MaterialsInTable
          rows={list.materials}
          works={works}
          dayOf={(at) => formatDate(at, works.timeZone)}
        />
      )}
      {list.pages > 1 ? (
        <nav className="materials-in-pages" aria-label="Pages">
          {list.page > 1 ? (
            <Link href={addressOf(asked, list.page - 1)}>Earlier in the list</Link>
          ) : (
            <span className="slate">Earlier in the list</span>
          )}
          <span>
            Page {list.page} of {list.pages}
          </span>
          {list.page < list.pages ? (
            <Link href={addressOf(asked, list.page + 1)}>Further on</Link>
          ) : (
            <span className="slate">Further on</span>
          )}
        </nav>
      ) : null}
    </>
  )
})
