import Link from 'next/link'
import { VerdictMark } from '@/app/_ui/charts/VerdictMark'
import type { ListLotsInput } from '@/lib/input/lot-list'
import type { LotList } from '@/lib/services/list-lots'
import { stateWords } from '../state-words'
import { lotsHref } from './lots-href'

interface Props {
  readonly asked: ListLotsInput
  readonly list: Pick<LotList, 'states' | 'metres' | 'count' | 'lotsWithLength'>
  /** Whether lots can be chosen by their state. */
  readonly all: boolean
}

/** Metres in groups of three digits, as long numbers are read: `1 482 300`. */
const grouped = (metres: number): string => String(Math.round(metres)).replace(/\B(?=(?:\d{3})+$)/g, '\u202f')

/** What the whole selection comes to: lots, metres, lots by state. */
export function LotTotals({ asked, list, all }: Props) {
  const { states, metres, count, lotsWithLength } = list
  return (
    <ul className="lots-totals" aria-label="The whole selection">
      <li>
        <b>{grouped(count)}</b> {count === 1 ? 'lot' : 'lots'}
      </li>
      {lotsWithLength > 0 ? (
        <li>
          <b>{grouped(metres)}</b> m
          {lotsWithLength < count ? <small> in {lotsWithLength} of them</small> : null}
        </li>
      ) : null}
      {states.map(({ state, lots }) => {
        const { mark, word } = stateWords[state]
        return (
          <li key={state}>
            <VerdictMark verdict={mark} /> <b>{grouped(lots)}</b>{' '}
            {all && asked.state === undefined ? (
              <Link href={lotsHref({ ...asked, state, page: 1 })} prefetch={false}>
                {word}
              </Link>
            ) : (
              word
            )}
          </li>
        )
      })}
    </ul>
  )
}
