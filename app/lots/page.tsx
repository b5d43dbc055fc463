import type { Metadata } from 'next'
import Link from 'next/link'
import { roomPage } from '@/app/_page'
import { VerdictMark } from '@/app/_ui/charts/VerdictMark'
import { formatDateTime } from '@/app/_ui/format/dates'
import { EmptyState } from '@/app/_ui/shell/EmptyState'
import { Notice } from '@/app/_ui/shell/Notice'
import { PageHead } from '@/app/_ui/shell/PageHead'
import { Table } from '@/app/_ui/tables/Table'
import { may } from '@/lib/access/permit'
import { lotStates } from '@/lib/domain/record/lot-state'
import { formatNumber } from '@/lib/domain/units/format'
import { listLotsSchema } from '@/lib/input/lot'
import { parseInput } from '@/lib/input/parse-input'
import { getWorks } from '@/lib/services/get-works'
import { listLots } from '@/lib/services/list-lots'
import { listProducts } from '@/lib/services/list-products'
import { stateWords } from './state-words'
import './lots.css'

export const metadata: Metadata = { title: 'Lots' }

const filled = (value: string | undefined): string | undefined => (value ? value : undefined)

/** Search and filters live in the address: a list can be kept, sent on, and gone back to. */
export default roomPage(async (actor, { query }) => {
  const works = await getWorks(actor)
  const products = await listProducts(actor)
  const parsed = parseInput(listLotsSchema, {
    search: query.search ?? '',
    state: filled(query.state),
    productCode: filled(query.productCode),
    page: query.page ?? '1',
  })
  const asked = parsed.ok ? parsed.value : { search: '', page: 1, state: undefined, productCode: undefined }
  const list = await listLots(actor, asked)
  const all = may(actor, 'lots.read')
  const pageLink = (page: number): string => {
    const parameters = new URLSearchParams({
      ...(asked.search ? { search: asked.search } : {}),
      ...(asked.state ? { state: asked.state } : {}),
      ...(asked.productCode ? { productCode: asked.productCode } : {}),
      ...(page > 1 ? { page: String(page) } : {}),
    })
    return `/lots${parameters.size > 0 ? `?${parameters}` : ''}`
  }
  const filtered = Boolean(asked.search || asked.state || asked.productCode)
  return (
    <>
      <PageHead
        title="Lots"
        under={`${list.count} ${list.count === 1 ? 'lot' : 'lots'}${filtered ? ' found' : ''}${all ? '' : ', released ones only'}`}
        actions={
          may(actor, 'lots.open') ? (
            <Link className="button primary" href="/bench">
              Open a lot
            </Link>
          ) : undefined
        }
      />
      {parsed.ok ? null : <Notice tone="alarm">{parsed.problems.map((one) => one.message).join(' ')}</Notice>}
      <search>
        <form method="get" className="lots-filter">
          <div className="field">
            <label htmlFor="lots-search">Search</label>
            <input
              id="lots-search"
              name="search"
              type="search"
              className="input"
              defaultValue={asked.search}
              placeholder="LA-35, Larch"
              maxLength={80}
            />
          </div>
          {all ? (
            <div className="field">
              <label htmlFor="lots-state">State</label>
              <select id="lots-state" name="state" className="input" defaultValue={asked.state ?? ''}>
                <option value="">any</option>
                {lotStates.map((state) => (
                  <option key={state} value={state}>
                    {stateWords[state].word}
                  </option>
                ))}
              </select>
            </div>
          ) : null}
          <div className="field">
            <label htmlFor="lots-product">Product</label>
            <select
              id="lots-product"
              name="productCode"
              className="input"
              defaultValue={asked.productCode ?? ''}
            >
              <option value="">any</option>
              {products.map(({ code, name }) => (
                <option key={code} value={code}>
                  {name}
                </option>
              ))}
            </select>
          </div>
          <button type="submit" className="button">
            Show
          </button>
          {filtered ? (
            <Link className="button quiet" href="/lots">
              Show all
            </Link>
          ) : null}
        </form>
      </search>
      {list.lots.length === 0 ? (
        <EmptyState title={filtered ? 'No lot fits.' : 'No lot yet.'}>
          {filtered
            ? 'Search for a part of the code or the product, or take a filter away.'
            : 'A lot is opened at the bench when it comes off the machine.'}
        </EmptyState>
      ) : (
        <>
          <Table
            caption="Lots, newest first"
            dense
            rows={list.lots}
            keyOf={(lot) => lot.code}
            columns={[
              {
                head: 'Lot',
                cell: (lot) => <Link href={`/lots/${encodeURIComponent(lot.code)}`}>{lot.code}</Link>,
              },
              { head: 'Product', cell: (lot) => lot.productName },
              { head: 'Made', cell: (lot) => formatDateTime(lot.madeAt, works.timeZone) },
              { head: 'Machine', wideOnly: true, cell: (lot) => lot.machine ?? '–' },
              { head: 'Die', wideOnly: true, cell: (lot) => lot.die ?? '–' },
              {
                head: 'Length',
                unit: 'm',
                number: true,
                wideOnly: true,
                cell: (lot) => formatNumber(lot.lengthMetres, { decimals: 0, decimal: works.numberFormat }),
              },
              { head: 'Specimens', number: true, wideOnly: true, cell: (lot) => lot.specimens },
              {
                head: 'State',
                cell: (lot) => (
                  <span className="lots-state">
                    <VerdictMark verdict={stateWords[lot.state].mark} /> <em>{stateWords[lot.state].word}</em>
                  </span>
                ),
              },
              {
                head: 'To answer',
                cell: (lot) =>
                  [
                    lot.evidenceChanged ? 'evidence changed' : '',
                    lot.openSignals > 0
                      ? `${lot.openSignals} ${lot.openSignals === 1 ? 'signal' : 'signals'}`
                      : '',
                  ]
                    .filter(Boolean)
                    .join(', ') || '–',
              },
            ]}
          />
          {list.pages > 1 ? (
            <nav className="lots-pages" aria-label="Pages">
              {list.page > 1 ? (
                <Link href={pageLink(list.page - 1)}>Newer</Link>
              ) : (
                <span className="slate">Newer</span>
              )}
              <span>
                Page {list.page} of {list.pages}
              </span>
              {list.page < list.pages ? (
                <Link href={pageLink(list.page + 1)}>Older</Link>
              ) : (
                <span className="slate">Older</span>
              )}
            </nav>
          ) : null}
        </>
      )}
    </>
  )
})
