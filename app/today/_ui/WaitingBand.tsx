import Link from 'next/link'
import { VerdictMark } from '@/app/_ui/charts/VerdictMark'
import type { Urgency, WaitingKind } from '@/lib/domain/quality/what-waits'
import type { Today, WaitingItem } from '@/lib/services/get-today'

const titles: Readonly<Record<Urgency, string>> = {
  now: 'Before anything more is drawn or sent',
  shift: 'Before the shift ends',
  week: 'This week',
}

/** What waits by one time, in order of consequence. */
export function WaitingBand({ items, more, urgency }: Today['bands'][number]) {
  return (
    <section className="today-band" data-urgency={urgency} aria-labelledby={`today-${urgency}`}>
      <div className="today-head">
        <h2 id={`today-${urgency}`}>{titles[urgency]}</h2>
        <span>at stake</span>
        <span>waiting</span>
      </div>
      <ol className="today-list">
        {items.map((item) => (
          <Item key={item.key} item={item} primary={urgency === 'now'} />
        ))}
      </ol>
      {more.length > 0 ? (
        <p className="today-more">
          {more.map(({ count, href, kind }) => (
            <Link key={kind} href={href}>
              All {count} {moreWords[kind] ?? 'of them'}
            </Link>
          ))}
        </p>
      ) : null}
    </section>
  )
}

/** What there is more of, after a number. */
const moreWords: Readonly<Partial<Record<WaitingKind, string>>> = {
  'released-changed': 'released lots',
  'lot-outside': 'lots outside tolerance',
  'lot-open-closure': 'lots that do not close',
  'lot-doubtful': 'lots in doubt',
  signal: 'signals',
  'lot-half-measured': 'half-measured lots',
  'lot-to-measure': 'lots to measure',
  'lot-rework': 'lots in rework',
  'lot-held': 'lots on hold',
  'own-lot-held': 'lots on hold',
  'import-rows': 'imports with open rows',
  'own-import-rows': 'imports with open rows',
  'product-without-limits': 'products without limits',
  'product-without-datasheet': 'products without a datasheet',
}

function Item({ item, primary }: { readonly item: WaitingItem; readonly primary: boolean }) {
  return (
    <li className="today-item" data-kind={item.kind}>
      <VerdictMark verdict={item.mark} />
      <div>
        <h3>{item.title}</h3>
        <p>{item.text}</p>
      </div>
      <div className="stake">{item.stake}</div>
      <div className="since">{item.waiting}</div>
      <Link className={primary ? 'button primary' : 'button'} href={item.href}>
        {item.deed}
        <span className="visually-hidden">: {item.title}</span>
      </Link>
    </li>
  )
}
