import type { Metadata } from 'next'
import Link from 'next/link'
import { roomPage } from '@/app/_page'
import { formatDate } from '@/app/_ui/format/dates'
import { EmptyState } from '@/app/_ui/shell/EmptyState'
import { PageHead } from '@/app/_ui/shell/PageHead'
import { Table } from '@/app/_ui/tables/Table'
import type { Actor } from '@/lib/access/actor'
import { may } from '@/lib/access/permit'
import type { StaffChartInput } from '@/lib/domain/charts/staff-chart'
import { chartId, parseStaves } from '@/lib/input/drift-view'
import { getDrift } from '@/lib/services/get-drift'
import { getWorks } from '@/lib/services/get-works'
import { type DriftProduct, listDriftProducts } from '@/lib/services/list-drift-products'
import { DriftChart } from './_ui/DriftChart'
import { LimitSets } from './_ui/LimitSets'
import { SignalList } from './_ui/SignalList'
import { driftHref, StaveChoice, stavesParameter } from './_ui/StaveChoice'
import '@/app/_ui/charts/charts.css'
import './drift.css'

export const metadata: Metadata = { title: 'Drift' }

/** With a product its chart; without one the products that have charts. */
export default roomPage(async (actor, { query }) => {
  const products = await listDriftProducts(actor)
  const charted = products.filter((product) => product.lots > 0)
  const only = charted.length === 1 ? charted[0]?.code : undefined
  const code = query.product || only
  return code === undefined ? (
    <Products products={products} timeZone={(await getWorks(actor)).timeZone} />
  ) : (
    await productPage(actor, code, query, charted)
  )
})

function Products({
  products,
  timeZone,
}: {
  readonly products: readonly DriftProduct[]
  readonly timeZone: string
}) {
  return (
    <>
      <PageHead
        title="Drift"
        under="Each product on its own chart, lot by lot in the order they were made."
      />
      {products.length === 0 ? (
        <EmptyState
          title="Nothing to chart yet."
          action={
            <Link className="button primary" href="/catalogue">
              Go to the catalogue
            </Link>
          }
        >
          A product comes first, then lots of it. Each measured lot becomes a note on its product’s chart.
        </EmptyState>
      ) : (
        <Table
          caption="Products and what waits on their charts"
          rows={products}
          keyOf={(product) => product.code}
          leftOut={(product) => !product.active}
          columns={[
            {
              head: 'Product',
              cell: (product) => <Link href={driftHref(product.code)}>{product.name}</Link>,
            },
            { head: 'Family', cell: (product) => product.family || '–' },
            { head: 'Lots', number: true, cell: (product) => product.lots },
            {
              head: 'Newest',
              cell: (product) =>
                product.lastMadeAt === undefined ? '–' : formatDate(product.lastMadeAt, timeZone),
            },
            {
              head: 'Open signals',
              number: true,
              cell: (product) =>
                product.openSignals > 0 ? <b className="vermilion">{product.openSignals}</b> : '–',
            },
            { head: 'Limit sets in force', number: true, cell: (product) => product.limitSets || '–' },
          ]}
        />
      )}
    </>
  )
}

async function productPage(
  actor: Actor,
  code: string,
  query: Readonly<Record<string, string | undefined>>,
  charted: readonly DriftProduct[],
) {
  const charts = parseStaves(query.staves)
  const staves = stavesParameter(charts)
  const view = await getDrift(actor, code, charts)
  const { chart, product, signals, works } = view
  const shownIds = new Set(charts.map(chartId))
  const sets = view.limitSets.filter((set) => shownIds.has(chartId(set)))
  const inForce = sets.filter((set) => set.supersededAt === undefined)
  const [loudest] = signals.filter((signal) => signal.state === 'open')
  const limitsHref = `/drift/limits?product=${encodeURIComponent(product.code)}`
  return (
    <>
      <PageHead
        over={charted.length > 1 ? <Link href="/drift">Drift</Link> : 'Drift'}
        title={
          <>
            {product.name} <span>lot by lot</span>
          </>
        }
        under={[
          `${chart.lots.length} ${chart.lots.length === 1 ? 'lot' : 'lots'}`,
          ...(view.specification ? [`specification revision ${view.specification.number}`] : []),
          inForce.length === 0
            ? 'no limits frozen yet'
            : `${inForce.length} limit ${inForce.length === 1 ? 'set' : 'sets'} in force`,
        ].join(' · ')}
        actions={
          <Link className="button" href={limitsHref}>
            {may(actor, 'limits.freeze') ? 'Limits' : 'Look at limits'}
          </Link>
        }
      />
      {loudest ? <p className="drift-headline">{loudest.sentence}</p> : null}
      <StaveChoice productCode={product.code} shown={charts} />
      {chart.lots.length === 0 ? (
        <EmptyState title={`No lot of ${product.name} on the chart yet.`}>
          A lot comes on the chart when one of its specimens is measured. Twenty lots give the first control
          limits.
        </EmptyState>
      ) : (
        <div className="columns drift-columns">
          <div>
            {/* A chart of another product or other staves starts anew. */}
            <DriftChart
              key={`${product.code} ${staves} ${query.lot ?? ''}`}
              productCode={product.code}
              input={withWindow(chart, query.from, query.to)}
              staves={staves}
              lot={query.lot}
            />
            <section className="section">
              <h2>Limit sets</h2>
              {sets.length === 0 ? (
                <p>
                  None yet. Limits need twenty lots, and a person who freezes them.{' '}
                  <Link href={limitsHref}>Look at what the lots so far would give.</Link>
                </p>
              ) : null}
              <LimitSets sets={sets} works={works} />
            </section>
          </div>
          <aside>
            <SignalList
              signals={signals}
              timeZone={works.timeZone}
              mayAnswer={may(actor, 'signals.answer')}
              onChart={(lot) => driftHref(product.code, staves, lot)}
            />
          </aside>
        </div>
      )}
    </>
  )
}

/** Lots named in the address, where there are such lots. */
function withWindow(
  chart: StaffChartInput,
  from: string | undefined,
  to: string | undefined,
): StaffChartInput {
  const placeOf = (code: string | undefined): number => chart.lots.findIndex((lot) => lot.code === code)
  const window = { from: placeOf(from), to: placeOf(to) }
  return window.from >= 0 && window.to >= window.from ? { ...chart, window } : chart
}
