import type { DecidedLot } from '@/lib/data/today-lots'
import { agoOf, counted, namesOf, SHOWN, type WaitingItem } from './today-item'

/** Address of a lot. */
export const lotHref = (code: string): string => `/lots/${encodeURIComponent(code)}`

/** What of a lot is at stake: product, and metres where they are known. */
export const stakeOf = ({
  lengthMetres,
  productName,
}: Pick<DecidedLot, 'lengthMetres' | 'productName'>): string =>
  lengthMetres === undefined ? productName : `${Math.round(lengthMetres)} m of ${productName}`

/**
 * Lots on hold, one line a reason: what waits for the same answer is one thing to do.
 * @param lots oldest first
 */
export function heldItems(
  lots: readonly DecidedLot[],
  kind: 'lot-held' | 'own-lot-held',
  at: number,
): readonly WaitingItem[] {
  const reasons = [...new Set(lots.map((lot) => lot.reason))]
  return reasons
    .map((reason) =>
      heldItem(
        reason,
        lots.filter((lot) => lot.reason === reason),
        kind,
        at,
      ),
    )
    .slice(0, SHOWN)
}

function heldItem(
  reason: string,
  lots: readonly DecidedLot[],
  kind: 'lot-held' | 'own-lot-held',
  at: number,
): WaitingItem {
  const own = kind === 'own-lot-held'
  const since = Math.min(...lots.map((lot) => lot.decidedAt ?? lot.at))
  const names = namesOf(lots.map((lot) => lot.code))
  const [only] = lots.length === 1 ? lots : []
  const products = namesOf([...new Set(lots.map((lot) => lot.productName))], 2)
  return {
    kind,
    key: `held ${reason}`,
    since,
    mark: 'near',
    title: own
      ? `Your ${only ? 'lot' : 'lots'} ${names} ${only ? 'is' : 'are'} on hold`
      : `${names} ${only ? 'has' : 'have'} been on hold for more than a week`,
    text: reason === '' ? 'A shelf is taken until somebody decides.' : `Held because: ${reason}`,
    stake: only ? stakeOf(only) : `${counted(lots.length, 'lot', 'lots')} of ${products}`,
    waiting: agoOf(since, at),
    href: only ? `${lotHref(only.code)}${own ? '' : '/release'}` : '/lots?state=held',
    deed: own ? 'Look' : only ? 'Decide' : `Decide ${lots.length}`,
  }
}
