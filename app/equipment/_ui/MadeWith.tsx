import Link from 'next/link'
import { VerdictMark } from '@/app/_ui/charts/VerdictMark'
import { formatDate, formatDateTime } from '@/app/_ui/format/dates'
import { Table } from '@/app/_ui/tables/Table'
import { stateWords } from '@/app/lots/state-words'
import { formatNumber } from '@/lib/domain/units/format'
import type { DieView } from '@/lib/services/get-die'
import type { MachineView } from '@/lib/services/get-machine'
import type { WorksFacts } from '@/lib/services/get-works'
import '@/app/_ui/charts/charts.css'
import '@/app/lots/lots.css'

interface Props<View> {
  readonly view: View
  readonly works: WorksFacts
  readonly maySeeDrift: boolean
}

type Made = MachineView['total']

const metresIn = (metres: number, { numberFormat: decimal }: WorksFacts): string =>
  formatNumber(metres, { decimals: 0, decimal })

const lotsIn = (count: number): string => `${count} ${count === 1 ? 'lot' : 'lots'}`

/** "12 300 m in 11 lots since 3 Mar 2026, the last on 27 Nov 2026. 2 lots give no length: it is more than that." */
export function madeSentence({ total }: { readonly total: Made }, works: WorksFacts): string {
  if (total.firstMadeAt === undefined || total.lastMadeAt === undefined) return ''
  const known = total.lots - total.withoutLength
  const days = `since ${formatDate(total.firstMadeAt, works.timeZone)}, the last on ${formatDate(total.lastMadeAt, works.timeZone)}`
  if (known === 0) return `${lotsIn(total.lots)} ${days}; none of them gives its length.`
  const more =
    total.withoutLength === 0
      ? ''
      : ` ${lotsIn(total.withoutLength)} of them ${total.withoutLength === 1 ? 'gives' : 'give'} no length, so it is more than that.`
  return `${metresIn(total.metres, works)} m in ${lotsIn(total.lots)} ${days}.${more}`
}

/** Lots by product, with the way to their charts. */
function Products({ view, works, maySeeDrift }: Props<Pick<MachineView, 'products'>>) {
  return (
    <Table
      dense
      caption="Lots by product"
      rows={view.products}
      keyOf={({ code }) => code}
      columns={[
        {
          head: 'Product',
          cell: ({ code, name }) =>
            maySeeDrift ? <Link href={`/drift?product=${encodeURIComponent(code)}`}>{name}</Link> : name,
        },
        { head: 'Lots', number: true, cell: ({ lots }) => lots },
        { head: 'Made', unit: 'm', number: true, cell: (one) => made(one, works) },
        {
          head: 'Last lot',
          cell: ({ lastMadeAt }) => (lastMadeAt === undefined ? '–' : formatDate(lastMadeAt, works.timeZone)),
        },
      ]}
    />
  )
}

/** A dash where no lot gives its length, "at least" where some do not. */
const made = ({ lots, metres, withoutLength }: Made, works: WorksFacts): string =>
  withoutLength === lots ? '–' : `${withoutLength > 0 ? 'at least ' : ''}${metresIn(metres, works)}`

function NewestLots({
  view,
  works,
  all,
}: Pick<Props<MachineView | DieView>, 'view' | 'works'> & { readonly all: string }) {
  return (
    <section className="section">
      <header>
        <h2>Newest lots</h2>
        <Link className="button quiet" href={all}>
          All its lots
        </Link>
      </header>
      <Table
        dense
        caption="Newest lots"
        rows={view.newest}
        keyOf={({ code }) => code}
        columns={[
          { head: 'Lot', cell: ({ code }) => <Link href={`/lots/${encodeURIComponent(code)}`}>{code}</Link> },
          { head: 'Product', cell: ({ productName }) => productName },
          { head: 'Made', cell: ({ madeAt }) => formatDateTime(madeAt, works.timeZone) },
          {
            head: 'Length',
            unit: 'm',
            number: true,
            wideOnly: true,
            cell: ({ lengthMetres }) =>
              formatNumber(lengthMetres, { decimals: 0, decimal: works.numberFormat }),
          },
          {
            head: 'State',
            cell: ({ state }) => (
              <span className="lots-state">
                <VerdictMark verdict={stateWords[state].mark} /> <em>{stateWords[state].word}</em>
              </span>
            ),
          },
        ]}
      />
    </section>
  )
}

const nothing = (what: string) => (
  <section className="section">
    <h2>Lots</h2>
    <p className="slate">No lot names this {what} yet. Lots say it when they are opened.</p>
  </section>
)

/** What a machine made. */
export function MadeOnMachine({ view, works, maySeeDrift }: Props<MachineView>) {
  if (view.total.lots === 0) return nothing('machine')
  const code = encodeURIComponent(view.row.code)
  return (
    <>
      <section className="section">
        <header>
          <h2>Products made on it</h2>
          {maySeeDrift ? (
            <Link className="button quiet" href={`/drift?machine=${code}`}>
              Its staff chart over all products
            </Link>
          ) : null}
        </header>
        <p>{madeSentence(view, works)}</p>
        <Products view={view} works={works} maySeeDrift={maySeeDrift} />
      </section>
      <NewestLots view={view} works={works} all={`/lots?machineCode=${code}`} />
    </>
  )
}

const monthName = (month: string): string => formatMonth.format(new Date(`${month}-01T00:00:00Z`))
const formatMonth = new Intl.DateTimeFormat('en-GB', { month: 'long', year: 'numeric', timeZone: 'UTC' })

/** What was drawn through a die. */
export function DrawnThroughDie({ view, works, maySeeDrift }: Props<DieView>) {
  if (view.total.lots === 0) return nothing('die')
  return (
    <>
      <section className="section">
        <h2>Drawn through it</h2>
        <p>{madeSentence(view, works)}</p>
        <div className="columns even">
          <Products view={view} works={works} maySeeDrift={maySeeDrift} />
          <Table
            dense
            caption="Metres drawn by month, newest first"
            rows={view.months}
            keyOf={({ month }) => month}
            columns={[
              { head: 'Month', cell: ({ month }) => monthName(month) },
              { head: 'Lots', number: true, cell: ({ lots }) => lots },
              { head: 'Drawn', unit: 'm', number: true, cell: (month) => made(month, works) },
              {
                head: 'So far',
                unit: 'm',
                number: true,
                cell: ({ metresSoFar }) => metresIn(metresSoFar, works),
              },
            ]}
          />
        </div>
      </section>
      <NewestLots view={view} works={works} all={`/lots?dieCode=${encodeURIComponent(view.row.code)}`} />
    </>
  )
}
