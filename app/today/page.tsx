import type { Metadata } from 'next'
import Link from 'next/link'
import type { ReactNode } from 'react'
import { roomPage } from '@/app/_page'
import { type VerdictKind, VerdictMark } from '@/app/_ui/charts/VerdictMark'
import { formatDate, formatLongDate } from '@/app/_ui/format/dates'
import { EmptyState } from '@/app/_ui/shell/EmptyState'
import { PageHead } from '@/app/_ui/shell/PageHead'
import { may } from '@/lib/access/permit'
import { getToday, type TodayFacts } from '@/lib/services/get-today'
import { getWorks } from '@/lib/services/get-works'
import './today.css'

export const metadata: Metadata = { title: 'Today' }

interface Item {
  readonly key: string
  readonly mark: VerdictKind
  readonly title: string
  readonly text: string
  readonly stake: ReactNode
  readonly since: string
  readonly href: string
  readonly deed: string
  readonly primary: boolean
}

const days = (from: number, to: number): string => {
  const whole = Math.floor((to - from) / 86_400_000)
  if (whole < 1) return 'today'
  return whole === 1 ? '1 day' : `${whole} days`
}

function itemsOf(today: TodayFacts, at: number, timeZone: string) {
  const signals = today.signals.map(
    (signal): Item => ({
      key: `signal-${signal.id}`,
      mark: signal.rule === 'nine-on-one-side' ? 'run' : 'beyond',
      title: `${signal.productName}: ${signal.chartName.charAt(0).toLowerCase()}${signal.chartName.slice(1)}`,
      text: `${signal.sentence} It rejects no lot by itself, and has to be answered before release.`,
      stake: `${signal.memberCodes.length} ${signal.memberCodes.length === 1 ? 'lot' : 'lots'}, ${signal.memberCodes.at(-1)} the last`,
      since: days(signal.raisedAt, at),
      href: `/drift?product=${encodeURIComponent(signal.productCode)}#signal-${signal.id}`,
      deed: 'Answer',
      primary: true,
    }),
  )
  const lotItem = (
    lot: TodayFacts['toDecide']['lots'][number],
    words: Pick<Item, 'mark' | 'title' | 'text' | 'deed' | 'href' | 'primary'>,
  ): Item => ({
    key: lot.code,
    stake: `${lot.productName}${lot.machine ? `, ${lot.machine}` : ''}`,
    since: days(lot.madeAt, at),
    ...words,
  })
  const decide = today.toDecide.lots.map((lot) =>
    lotItem(lot, {
      mark: lot.signals > 0 ? 'run' : 'waiting',
      title: `${lot.code} ${lot.evidenceChanged ? 'asks for another look' : 'waits for a decision'}`,
      text: [
        `${lot.specimens} specimens, made ${formatDate(lot.madeAt, timeZone)}.`,
        ...(lot.signals > 0
          ? [`Belongs to ${lot.signals} unanswered ${lot.signals === 1 ? 'signal' : 'signals'}.`]
          : []),
        ...(lot.evidenceChanged ? ['A reading it was decided on has changed.'] : []),
      ].join(' '),
      deed: 'Decide',
      href: `/lots/${encodeURIComponent(lot.code)}/release`,
      primary: false,
    }),
  )
  const held = today.held.lots.map((lot) =>
    lotItem(lot, {
      mark: 'near',
      title: `${lot.code} is on hold`,
      text: `Made ${formatDate(lot.madeAt, timeZone)}. It stays where it is until somebody decides.`,
      deed: 'Look',
      href: `/lots/${encodeURIComponent(lot.code)}`,
      primary: false,
    }),
  )
  const measure = today.toMeasure.lots.map((lot) =>
    lotItem(lot, {
      mark: 'waiting',
      title: `Measure ${lot.code}`,
      text:
        lot.specimens === 0
          ? 'Nothing measured yet.'
          : `${lot.specimens} ${lot.specimens === 1 ? 'specimen' : 'specimens'} stored so far.`,
      deed: 'Measure',
      href: `/bench/${encodeURIComponent(lot.code)}`,
      primary: false,
    }),
  )
  return { signals, decide, held, measure }
}

function Section({
  title,
  items,
  more,
  mayAct,
}: {
  readonly title: string
  readonly items: readonly Item[]
  readonly more?: ReactNode
  readonly mayAct: boolean
}) {
  if (items.length === 0) return null
  return (
    <section>
      <div className="today-head">
        <h2>{title}</h2>
        <span>concerns</span>
        <span>waiting</span>
      </div>
      <ul className="today-list">
        {items.map((item, index) => (
          <li key={item.key} className={index === 0 ? 'today-item first' : 'today-item'}>
            <VerdictMark verdict={item.mark} />
            <div>
              <h3>{item.title}</h3>
              <p>{item.text}</p>
            </div>
            <div className="stake">{item.stake}</div>
            <div className="since">{item.since}</div>
            <Link className={item.primary && mayAct ? 'button primary' : 'button'} href={item.href}>
              {mayAct ? item.deed : 'Look'} <span className="visually-hidden">: {item.title}</span>
            </Link>
          </li>
        ))}
      </ul>
      {more}
    </section>
  )
}

/** In order of consequence: what has left its limits, what waits for a decision, what is to be measured. */
export default roomPage(async (actor) => {
  const at = Date.now()
  const works = await getWorks(actor)
  const today = await getToday(actor, at)
  const { decide, held, measure, signals } = itemsOf(today, at, works.timeZone)
  const quality = may(actor, 'lots.decide')
  const bench = may(actor, 'readings.record')
  const counts = [
    [today.signals.length, 'signal', 'signals', 'to answer'],
    [today.toDecide.count, 'lot', 'lots', 'to decide'],
    [today.toMeasure.count, 'lot', 'lots', 'to measure'],
  ] as const
  const parts = counts.flatMap(([count, one, several, deed]) =>
    count > 0 ? [`${count} ${count === 1 ? one : several} ${deed}`] : [],
  )
  const headline = parts.length > 0 ? `${parts.join(', ')}.` : 'Nothing waits.'
  const moreThan = (shown: readonly Item[], count: number, state: string) =>
    count > shown.length ? (
      <p>
        <Link href={`/lots?state=${state}`}>All {count}</Link>
      </p>
    ) : undefined
  const sections = [
    <Section key="signals" title="Before anything more is drawn or sent" items={signals} mayAct={quality} />,
    <Section
      key="decide"
      title="To decide"
      items={decide}
      mayAct={quality}
      more={moreThan(decide, today.toDecide.count, 'to-decide')}
    />,
    <Section
      key="held"
      title="On hold"
      items={held}
      mayAct={quality}
      more={moreThan(held, today.held.count, 'held')}
    />,
    <Section
      key="measure"
      title="To measure"
      items={measure}
      mayAct={bench}
      more={moreThan(measure, today.toMeasure.count, 'measuring')}
    />,
  ]
  const onlyBench = bench && !quality
  const ordered = onlyBench ? [sections[3], sections[0], sections[1], sections[2]] : sections
  return (
    <>
      <PageHead over={formatLongDate(at, works.timeZone)} title={headline} />
      <div className="columns">
        <div>
          {parts.length === 0 && held.length === 0 ? (
            <EmptyState
              title="Nothing waits for you."
              action={
                bench ? (
                  <Link className="button primary" href="/bench">
                    Open a lot
                  </Link>
                ) : undefined
              }
            >
              {may(actor, 'lots.read')
                ? 'Lots appear here when they are opened, measured, or leave their control limits.'
                : `${today.released} ${today.released === 1 ? 'lot is' : 'lots are'} released; datasheets are built from them.`}
            </EmptyState>
          ) : (
            ordered
          )}
        </div>
        <aside>
          {today.equipmentDue.length > 0 ? (
            <section className="section">
              <h2>Equipment due</h2>
              <ul className="rows">
                {today.equipmentDue.map((gauge) => (
                  <li key={gauge.code}>
                    <span>
                      {gauge.name} {gauge.code}
                    </span>
                    <b className={gauge.overdue ? 'vermilion' : 'brass'}>
                      {gauge.overdue ? 'overdue since ' : ''}
                      {formatDate(gauge.dueAt, works.timeZone)}
                    </b>
                  </li>
                ))}
              </ul>
            </section>
          ) : null}
          <section className="section">
            <h2>Released</h2>
            <p>
              {today.released} {today.released === 1 ? 'lot' : 'lots'} that datasheets may rest on.
            </p>
          </section>
        </aside>
      </div>
    </>
  )
})
