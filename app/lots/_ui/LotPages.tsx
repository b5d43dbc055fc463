import Link from 'next/link'
import { type ListLotsInput, LOTS_A_PAGE } from '@/lib/input/lot-list'
import type { LotList } from '@/lib/services/list-lots'
import { lotsHref } from './lots-href'

interface Props {
  readonly asked: ListLotsInput
  readonly list: Pick<LotList, 'count' | 'page' | 'pages'>
}

/** From page to page, with what part of the selection is shown. */
export function LotPages({ asked, list: { count, page, pages } }: Props) {
  if (pages < 2) return null
  const first = (page - 1) * LOTS_A_PAGE + 1
  const to = (name: string, target: number, there: boolean) =>
    there ? (
      <Link href={lotsHref({ ...asked, page: target })} prefetch={false}>
        {name}
      </Link>
    ) : (
      <span className="slate">{name}</span>
    )
  return (
    <nav className="lots-pages" aria-label="Pages">
      {to('First', 1, page > 1)}
      {to('Previous', page - 1, page > 1)}
      <span>
        Lots {first} to {Math.min(count, first + LOTS_A_PAGE - 1)} of {count}
      </span>
      {to('Next', page + 1, page < pages)}
      {to('Last', pages, page < pages)}
    </nav>
  )
}
