import { listLimitNeeds } from '@/lib/data/today-desks'
import { FEWEST_BASELINE_LOTS, PROVISIONAL_BELOW } from '@/lib/domain/control/propose-limits'
import { shortDate } from './short-date'
import { type AskedToday, counted, type FoundToday, SHOWN, totalOf, type WaitingItem } from './today-item'

const hrefOf = (code: string): string => `/drift/limits?product=${encodeURIComponent(code)}`

/** Products whose lots are enough for control limits, or for limits that are no longer provisional. */
export async function limitsOfToday({ tx, works }: AskedToday): Promise<FoundToday> {
  const { bare, provisional } = await listLimitNeeds(tx)
  const ready = bare.filter((product) => product.lots >= FEWEST_BASELINE_LOTS)
  // One line a product: its oldest provisional set stands for all, and the rows come oldest first.
  const outgrown = [
    ...new Map(
      provisional
        .filter((set) => set.lots >= PROVISIONAL_BELOW)
        .reverse()
        .map((set) => [set.code, set]),
    ).values(),
  ].reverse()
  const items = [
    ...outgrown.slice(0, SHOWN).map(
      (set): WaitingItem => ({
        kind: 'limits-provisional',
        key: `limits ${set.code}`,
        since: set.frozenAt,
        mark: 'waiting',
        title: `The limits of ${set.name} rest on ${set.restsOn} lots`,
        text: `${set.lots} are there now. Limits from more lots raise fewer false alarms.`,
        stake: 'fewer false alarms',
        waiting: `frozen ${shortDate(set.frozenAt, works.timeZone)}`,
        href: hrefOf(set.code),
        deed: 'Compare',
      }),
    ),
    ...ready.slice(0, SHOWN).map(
      (product): WaitingItem => ({
        kind: 'product-without-limits',
        key: `limits ${product.code}`,
        since: undefined,
        mark: 'waiting',
        title: `${product.name} has no control limits`,
        text: `${counted(product.lots, 'lot is', 'lots are')} measured, and ${FEWEST_BASELINE_LOTS} are enough. Until then its drift is not watched.`,
        stake: counted(product.lots, 'lot', 'lots'),
        waiting: '',
        href: hrefOf(product.code),
        deed: 'Propose',
      }),
    ),
  ]
  return {
    items,
    totals: [
      ...totalOf('limits-provisional', outgrown.length, '/drift'),
      ...totalOf('product-without-limits', ready.length, '/drift'),
    ],
  }
}
