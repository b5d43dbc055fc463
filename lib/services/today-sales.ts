import { listRevisionsOfToday, listSalesNeeds } from '@/lib/data/today-desks'
import { shortDate } from './short-date'
import {
  type AskedToday,
  agoOf,
  counted,
  DAY,
  type FoundToday,
  namesOf,
  SHOWN,
  totalOf,
  type WaitingItem,
} from './today-item'

/** How long a superseded revision is told of: whoever was sent it should get the new one. */
const SUPERSEDED_WITHIN_DAYS = 7

const sheetHref = (code: string): string => `/datasheets/${encodeURIComponent(code)}`
const newHref = (productCode: string): string =>
  `/datasheets/new?productCode=${encodeURIComponent(productCode)}`

type Released = Awaited<ReturnType<typeof listSalesNeeds>>['released'][number]

/** What sales has to look after: sheets that customers hold, and lots that a sheet could rest on. */
export async function salesOfToday(asked: AskedToday): Promise<FoundToday> {
  const { at, tx, works } = asked
  const { changed, changedCount, superseded } = await listRevisionsOfToday(
    tx,
    at - SUPERSEDED_WITHIN_DAYS * DAY,
    SHOWN,
  )
  const { bare, bareCount, released } = await listSalesNeeds(tx, at - DAY, SHOWN)
  const changedItems = changed.map(
    (one): WaitingItem => ({
      kind: 'datasheet-changed',
      key: `datasheet ${one.code}`,
      since: one.publishedAt,
      mark: 'beyond',
      title: `${one.code}: readings behind it have changed`,
      text: `Revision ${one.number} of ${one.productName} stays as it was sent; a new revision says what is true now.`,
      stake: `sent since ${shortDate(one.publishedAt, works.timeZone)}`,
      waiting: agoOf(one.publishedAt, at),
      href: newHref(one.productCode),
      deed: 'Revise',
    }),
  )
  const supersededItems = superseded.map(
    (one): WaitingItem => ({
      kind: 'revision-superseded',
      key: `superseded ${one.code}`,
      since: one.supersededAt,
      mark: 'waiting',
      title: `${one.code} has a newer revision than ${one.number}`,
      text: `Whoever was sent revision ${one.number} of ${one.productName} should get the newest.`,
      stake: one.productName,
      waiting: one.supersededAt === undefined ? '' : agoOf(one.supersededAt, at),
      href: sheetHref(one.code),
      deed: 'Send',
    }),
  )
  const bareItems = bare.map(
    (product): WaitingItem => ({
      kind: 'product-without-datasheet',
      key: `product ${product.code}`,
      since: undefined,
      mark: 'waiting',
      title: `${product.name} has no datasheet`,
      text: 'Without one a customer gets no tensions of what is really made.',
      stake: counted(product.lots, 'released lot', 'released lots'),
      waiting: '',
      href: newHref(product.code),
      deed: 'Build',
    }),
  )
  const fresh = releasedItems(released, asked)
  return {
    items: [...changedItems, ...supersededItems, ...bareItems, ...fresh.slice(0, SHOWN)],
    totals: [
      ...totalOf('datasheet-changed', changedCount, '/datasheets'),
      ...totalOf('product-without-datasheet', bareCount, '/datasheets'),
      ...totalOf('lots-released', fresh.length, '/lots?state=released'),
    ],
  }
}

/** Newly released lots of products that have a datasheet, one line a product. */
function releasedItems(released: readonly Released[], { at }: AskedToday): readonly WaitingItem[] {
  const known = released.filter((one) => one.datasheetCode !== undefined)
  return [...new Set(known.map((one) => one.productCode))].flatMap((code): WaitingItem[] => {
    const lots = known.filter((one) => one.productCode === code)
    const [first] = lots
    if (!first) return []
    return [
      {
        kind: 'lots-released',
        key: `released ${code}`,
        since: first.at,
        mark: 'within',
        title: `${first.productName}: ${counted(lots.length, 'lot', 'lots')} newly released`,
        text: `${namesOf(lots.map((one) => one.lotCode))}. ${first.datasheetCode} rests on older ones; a new revision would take them in.`,
        stake: `${counted(lots.length, 'lot', 'lots')} to sell`,
        waiting: agoOf(first.at, at),
        href: newHref(code),
        deed: 'Revise',
      },
    ]
  })
}
