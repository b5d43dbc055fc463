import type { Metadata } from 'next'
import { cookies } from 'next/headers'
import Link from 'next/link'
import { roomPage } from '@/app/_page'
import { EmptyState } from '@/app/_ui/shell/EmptyState'
import { Notice } from '@/app/_ui/shell/Notice'
import { PageHead } from '@/app/_ui/shell/PageHead'
import { may } from '@/lib/access/permit'
import { lotColumn, lotColumnIds } from '@/lib/domain/record/lot-columns'
import { isFiltered, lotParameters, parseColumns, readLotAddress, usualColumns } from '@/lib/input/lot-list'
import { getWorks } from '@/lib/services/get-works'
import { listLotChoices, listLots } from '@/lib/services/list-lots'
import { columnsCookie } from './_ui/columns-cookie'
import { LotColumns } from './_ui/LotColumns'
import { LotFilters } from './_ui/LotFilters'
import { LotPages } from './_ui/LotPages'
import { LotTable } from './_ui/LotTable'
import { LotTotals } from './_ui/LotTotals'
import './lots.css'

export const metadata: Metadata = { title: 'Lots' }

/** Search, filters, order, columns and page live in the address: a list can be kept, sent on, and gone back to. */
export default roomPage(async (actor, { query }) => {
  const works = await getWorks(actor)
  const { input: asked, problems } = readLotAddress(query)
  const list = await listLots(actor, asked)
  const choices = await listLotChoices(actor)
  const all = may(actor, 'lots.read')
  const seen = lotColumnIds.filter((id) => id !== 'materials' || may(actor, 'materials-in.read'))
  const remembered = parseColumns((await cookies()).get(columnsCookie)?.value)
  const shown = (asked.columns ?? remembered ?? usualColumns).filter((id) => seen.includes(id))
  const columns = shown.map((id) => lotColumn(id, works.units))
  const filtered = isFiltered(asked)
  const file = String(lotParameters({ ...asked, columns: shown, page: 1 }))
  return (
    <>
      <PageHead
        title="Lots"
        under={all ? undefined : 'Released ones only: what a datasheet may rest on.'}
        actions={
          <>
            {may(actor, 'imports.read') ? (
              <Link className="button" href="/lots/import">
                Import
              </Link>
            ) : null}
            {may(actor, 'lots.open') ? (
              <Link className="button primary" href="/bench">
                Open a lot
              </Link>
            ) : null}
          </>
        }
      />
      {problems.length > 0 ? (
        <Notice tone="alarm">
          {problems.map(({ message }) => message).join(' ')} The list does without it.
        </Notice>
      ) : null}
      <LotFilters asked={asked} choices={choices} all={all} />
      {list.count === 0 ? (
        <EmptyState title={filtered ? 'No lot fits.' : 'No lot yet.'}>
          {filtered
            ? 'Search for a part of the code or the product, or take a filter away.'
            : 'A lot is opened at the bench when it comes off the machine.'}
        </EmptyState>
      ) : (
        <>
          <div className="lots-over">
            <LotTotals asked={asked} list={list} all={all} />
            <div className="actions no-print">
              <LotColumns
                asked={asked}
                offered={seen.map((id) => lotColumn(id, works.units))}
                shown={shown}
              />
              <a className="button quiet" href={`/api/v1/lots/csv?${file}`} download>
                CSV
              </a>
              <a className="button quiet" href={`/api/v1/lots/xlsx?${file}`} download>
                Excel
              </a>
            </div>
          </div>
          <LotTable
            asked={asked}
            columns={columns}
            lots={list.lots}
            style={works}
            brief={shown.join() === usualColumns.join()}
          />
          <LotPages asked={asked} list={list} />
        </>
      )}
    </>
  )
})
