import type { LotColumn, LotColumnId } from '@/lib/domain/record/lot-columns'
import { type ListLotsInput, lotParameters } from '@/lib/input/lot-list'
import { chooseColumns } from './choose-columns'

interface Props {
  readonly asked: ListLotsInput
  /** All that may be chosen. */
  readonly offered: readonly LotColumn[]
  readonly shown: readonly LotColumnId[]
}

/** Which columns the list has. Remembered for this browser, and put into the address, so that a link shows the same. */
export function LotColumns({ asked, offered, shown }: Props) {
  return (
    <details className="lots-columns">
      <summary>Columns</summary>
      {/* Ticks follow what is shown: the form is made anew when that changes. */}
      <form action={chooseColumns} key={shown.join()}>
        <input type="hidden" name="address" value={String(lotParameters({ ...asked, columns: undefined }))} />
        <fieldset>
          <legend className="visually-hidden">Columns of the list</legend>
          {offered.map(({ id, name }) => (
            <label key={id} className="choice">
              <input type="checkbox" name="columns" value={id} defaultChecked={shown.includes(id)} />
              <span>{name}</span>
            </label>
          ))}
        </fieldset>
        <div className="actions">
          <button type="submit" className="button">
            Show these columns
          </button>
          <button type="submit" className="button quiet" name="usual" value="yes">
            The usual columns
          </button>
        </div>
      </form>
    </details>
  )
}
