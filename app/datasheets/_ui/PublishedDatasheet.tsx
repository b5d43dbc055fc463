import Link from 'next/link'
import type { ReactNode } from 'react'
import { formatDateTime } from '@/app/_ui/format/dates'
import { Notice } from '@/app/_ui/shell/Notice'
import type { DatasheetView } from '@/lib/services/get-datasheet'
import { DatasheetPaper } from './DatasheetPaper'

interface Props {
  readonly view: DatasheetView
  readonly decimal: 'point' | 'comma'
  readonly timeZone: string
  /** Whether the reader may open the lots. */
  readonly mayOpenLots: boolean
}

/** More lots than this stand behind a fold. */
const MANY_LOTS = 24

const LotList = ({ children, folded }: { readonly children: ReactNode; readonly folded: boolean }) =>
  folded ? (
    <details>
      <summary>Which ones</summary>
      <p>{children}</p>
    </details>
  ) : (
    <p>{children}</p>
  )

/** A published revision on its paper, with the ways to take it along beside it. */
export function PublishedDatasheet({ view, decimal, timeZone, mayOpenLots }: Props) {
  const newest = view.revisions[0]?.number ?? view.number
  const files = `/api/v1/datasheets/${encodeURIComponent(view.code)}/${view.number}`
  return (
    <div className="datasheet-desk">
      <DatasheetPaper
        body={view.body}
        decimal={decimal}
        timeZone={timeZone}
        published={{
          code: view.code,
          number: view.number,
          at: view.publishedAt,
          by: view.publishedBy,
          hash: view.hash,
          revisions: view.revisions,
        }}
      />
      <aside className="no-print">
        <section className="section">
          <h2>
            {view.code}, revision {view.number}
          </h2>
          {view.number < newest ? (
            <Notice tone="question">
              Superseded by <Link href={`/datasheets/${view.code}`}>revision {newest}</Link>
              {view.supersededAt ? ` on ${formatDateTime(view.supersededAt, timeZone)}` : ''}. It stays as it
              was sent.
            </Notice>
          ) : (
            <p>Published {formatDateTime(view.publishedAt, timeZone)}. The newest revision.</p>
          )}
          {view.evidenceChanged ? (
            <Notice tone="alarm">
              Evidence changed: a reading or a decision that this revision rests on is no longer the same.
            </Notice>
          ) : null}
        </section>
        <section className="section">
          <h2>Take it along</h2>
          <div className="actions">
            <a className="button primary" href={`${files}/pdf`} download>
              PDF
            </a>
            <a className="button" href={`${files}/csv`} download>
              CSV
            </a>
          </div>
        </section>
        <section className="section">
          <h2>
            Stands on <small>{view.body.spread.lots} lots</small>
          </h2>
          <LotList folded={view.body.lots.length > MANY_LOTS}>
            {view.body.lots.map((lot, index) => (
              <span key={lot.code} className="nowrap">
                {index > 0 ? ', ' : ''}
                {mayOpenLots ? (
                  <Link href={`/lots/${encodeURIComponent(lot.code)}`}>{lot.code}</Link>
                ) : (
                  lot.code
                )}
              </span>
            ))}
          </LotList>
        </section>
        <section className="section">
          <h2>Revisions</h2>
          <ul className="rows">
            {view.revisions.map((one) => (
              <li key={one.number}>
                <Link href={`/datasheets/${view.code}/${one.number}`}>Revision {one.number}</Link>
                <span>{formatDateTime(one.publishedAt, timeZone)}</span>
              </li>
            ))}
          </ul>
          <Link href={`/datasheets/new?productCode=${encodeURIComponent(view.productCode)}`}>
            Build the next revision
          </Link>
        </section>
      </aside>
    </div>
  )
}
