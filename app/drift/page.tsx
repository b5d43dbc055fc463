import type { Metadata } from 'next'
import Link from 'next/link'
import type { ReactNode } from 'react'
import { roomPage } from '@/app/_page'
import { EmptyState } from '@/app/_ui/shell/EmptyState'
import { PageHead } from '@/app/_ui/shell/PageHead'
import type { Actor } from '@/lib/access/actor'
import { may } from '@/lib/access/permit'
import { chartId, parseOrder, parseStaves } from '@/lib/input/drift-view'
import { getDrift } from '@/lib/services/get-drift'
import { getMachineDrift } from '@/lib/services/get-machine-drift'
import { getWorks } from '@/lib/services/get-works'
import { type DriftMachine, listDriftMachines } from '@/lib/services/list-drift-machines'
import { listDriftProducts } from '@/lib/services/list-drift-products'
import type { SignalView } from '@/lib/services/signal-views'
import { ChartAndSignals } from './_ui/ChartAndSignals'
import { ChartLists } from './_ui/ChartLists'
import { type DriftSubject, driftHref, stavesParameter } from './_ui/drift-address'
import { LimitSets } from './_ui/LimitSets'
import { StaveChoice } from './_ui/StaveChoice'
import '@/app/_ui/charts/charts.css'
import './drift.css'

export const metadata: Metadata = { title: 'Drift' }

type Query = Readonly<Record<string, string | undefined>>

/** With a product or a machine its chart; without one the machine where most waits, and the lists of all charts. */
export default roomPage(async (actor, { query }) => {
  if (query.product) return productPage(actor, query.product, query)
  if (query.machine) return machinePage(actor, query.machine, query)
  const products = await listDriftProducts(actor)
  const machines = await listDriftMachines(actor)
  const lists = (
    <ChartLists products={products} machines={machines} timeZone={(await getWorks(actor)).timeZone} />
  )
  const machine = loudestOf(machines)
  if (machine) return machinePage(actor, machine.code, query, lists)
  const charted = products.filter((product) => product.lots > 0)
  const [only] = charted
  if (only && charted.length === 1) return productPage(actor, only.code, query)
  return (
    <>
      <PageHead title="Drift" under="Machines and products on their own charts, lot by lot." />
      {products.length === 0 ? <NothingYet /> : lists}
    </>
  )
})

const NothingYet = () => (
  <EmptyState
    title="Nothing to chart yet."
    action={
      <Link className="button primary" href="/catalogue">
        Go to the catalogue
      </Link>
    }
  >
    A product comes first, then lots of it. Each measured lot becomes a note on the chart of its machine and
    of its product.
  </EmptyState>
)

/** The machine with most unanswered signals, then the one that made a lot last. */
const loudestOf = (machines: readonly DriftMachine[]): DriftMachine | undefined =>
  machines
    .filter((machine) => machine.lots > 0)
    .sort((a, b) => b.openSignals - a.openSignals || (b.lastMadeAt ?? 0) - (a.lastMadeAt ?? 0))[0]

async function machinePage(actor: Actor, code: string, query: Query, lists?: ReactNode) {
  const charts = parseStaves(query.staves)
  const order = parseOrder(query.order)
  const staves = stavesParameter(charts)
  const { chart, machine, products, signals, works } = await getMachineDrift(actor, code, charts, { order })
  const subject: DriftSubject = { kind: 'machine', code: machine.code }
  const unjudged = products.filter((product) => !product.limits)
  return (
    <>
      <PageHead
        over={lists ? 'Drift' : <Link href="/drift">Drift</Link>}
        title={
          <>
            {machine.name} <span>over its products</span>
          </>
        }
        under={[
          `${chart.lots.length} ${chart.lots.length === 1 ? 'lot' : 'lots'}`,
          `${products.length} ${products.length === 1 ? 'product' : 'products'}`,
          'each lot in σ of its own product',
        ].join(' · ')}
      />
      <Loudest signals={signals} />
      <nav className="drift-products" aria-label="Products of this machine">
        <span>Products</span>
        {products.map((product) => (
          <Link key={product.code} href={driftHref(product.code, staves)} prefetch={false}>
            {product.name}
          </Link>
        ))}
      </nav>
      <StaveChoice subject={subject} shown={charts} order={order} />
      {chart.lots.length === 0 ? (
        <EmptyState title={`No lot of ${machine.name} on the chart yet.`}>
          A lot comes on the chart when its plan is measured.
        </EmptyState>
      ) : (
        <ChartAndSignals
          actor={actor}
          subject={subject}
          chart={chart}
          query={query}
          signals={signals}
          timeZone={works.timeZone}
        >
          {unjudged.length > 0 ? (
            <p className="small">
              Open notes: {unjudged.map((product) => product.name).join(', ')}{' '}
              {unjudged.length === 1 ? 'has' : 'have'} no limits yet and{' '}
              {unjudged.length === 1 ? 'is' : 'are'} drawn from the target, in the relative spread of this
              machine’s lots. Nothing is judged by it.
            </p>
          ) : null}
        </ChartAndSignals>
      )}
      {lists}
    </>
  )
}

async function productPage(actor: Actor, code: string, query: Query) {
  const charts = parseStaves(query.staves)
  const order = parseOrder(query.order)
  const view = await getDrift(actor, code, charts, { order })
  const { chart, product, signals, works } = view
  const shownIds = new Set(charts.map(chartId))
  const sets = view.limitSets.filter((set) => shownIds.has(chartId(set)))
  const inForce = sets.filter((set) => set.supersededAt === undefined)
  const limitsHref = `/drift/limits?product=${encodeURIComponent(product.code)}`
  const subject: DriftSubject = { kind: 'product', code: product.code }
  return (
    <>
      <PageHead
        over={<Link href="/drift">Drift</Link>}
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
      <Loudest signals={signals} />
      <StaveChoice subject={subject} shown={charts} order={order} />
      {chart.lots.length === 0 ? (
        <EmptyState title={`No lot of ${product.name} on the chart yet.`}>
          A lot comes on the chart when one of its specimens is measured. Twenty lots give the first control
          limits.
        </EmptyState>
      ) : (
        <ChartAndSignals
          actor={actor}
          subject={subject}
          chart={chart}
          query={query}
          signals={signals}
          timeZone={works.timeZone}
        >
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
        </ChartAndSignals>
      )}
    </>
  )
}

/** The newest of what is unanswered, over the chart. */
function Loudest({ signals }: { readonly signals: readonly SignalView[] }) {
  const loudest = signals.find((signal) => signal.state === 'open')
  return loudest ? <p className="drift-headline">{loudest.sentence}</p> : null
}
