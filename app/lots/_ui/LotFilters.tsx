import Link from 'next/link'
import type { LotSortKey } from '@/lib/domain/record/lot-columns'
import { lotStates } from '@/lib/domain/record/lot-state'
import { isFiltered, type ListLotsInput, type LotSort, usualSort } from '@/lib/input/lot-list'
import type { LotChoices } from '@/lib/services/list-lots'
import { stateWords } from '../state-words'
import { lotsHref } from './lots-href'

interface Props {
  readonly asked: ListLotsInput
  readonly choices: LotChoices
  /** Lots in every state, and their signals. */
  readonly all: boolean
}

interface Option {
  readonly code: string
  readonly name: string
}

const sortWords: Readonly<Record<LotSortKey, readonly [down: string, up: string]>> = {
  made: ['newest first', 'oldest first'],
  measured: ['measured last first', 'measured first first'],
  code: ['code, Z to A', 'code, A to Z'],
  product: ['product, Z to A', 'product, A to Z'],
  state: ['state, decided first', 'state, measuring first'],
  length: ['longest first', 'shortest first'],
}

const sortOptions: readonly (Option & { readonly code: LotSort })[] = (
  Object.keys(sortWords) as LotSortKey[]
).flatMap((key) => [
  { code: `${key}-down` as const, name: sortWords[key][0] },
  { code: `${key}-up` as const, name: sortWords[key][1] },
])

/** Search and filters: a GET form, so that what is chosen stands in the address. */
export function LotFilters({ asked, choices, all }: Props) {
  const { products, families, machines, dies } = choices
  const more = Boolean(
    asked.family ||
      asked.machineCode ||
      asked.dieCode ||
      asked.signals ||
      asked.evidence ||
      asked.from ||
      asked.to,
  )
  return (
    <search>
      <form method="get" action="/lots" className="lots-filter">
        {asked.columns ? <input type="hidden" name="columns" value={asked.columns.join(',')} /> : null}
        <div className="lots-filter-row">
          <div className="field lots-search">
            <label htmlFor="lots-search">Search</label>
            <input
              id="lots-search"
              name="search"
              type="search"
              className="input"
              defaultValue={asked.search}
              placeholder="LA-35, Larch"
              maxLength={80}
            />
          </div>
          {all ? (
            <Choice
              name="state"
              label="State"
              value={asked.state}
              options={lotStates.map((code) => ({ code, name: stateWords[code].word }))}
            />
          ) : null}
          <Choice name="productCode" label="Product" value={asked.productCode} options={products} />
          <Choice
            name="sort"
            label="Order"
            value={asked.sort ?? usualSort}
            options={sortOptions}
            any={false}
          />
          <button type="submit" className="button">
            Show
          </button>
          {isFiltered(asked) ? (
            <Link
              className="button quiet"
              href={lotsHref({ search: '', page: 1, sort: asked.sort, columns: asked.columns })}
            >
              Show all
            </Link>
          ) : null}
        </div>
        <details className="lots-more" open={more}>
          <summary>More filters</summary>
          <div className="lots-filter-row">
            <Choice
              name="family"
              label="Family"
              value={asked.family}
              options={families.map((family) => ({ code: family, name: family }))}
            />
            {machines.length > 0 ? (
              <Choice name="machineCode" label="Machine" value={asked.machineCode} options={machines} />
            ) : null}
            {dies.length > 0 ? (
              <Choice name="dieCode" label="Die" value={asked.dieCode} options={dies} />
            ) : null}
            <Day name="from" label="Made from" value={asked.from} />
            <Day name="to" label="Made to" value={asked.to} />
            {all ? <Tick name="signals" value="open" label="with an open signal" on={asked.signals} /> : null}
            <Tick name="evidence" value="changed" label="evidence changed" on={asked.evidence} />
          </div>
        </details>
      </form>
    </search>
  )
}

function Choice({
  name,
  label,
  value,
  options,
  any = true,
}: {
  readonly name: string
  readonly label: string
  readonly value: string | undefined
  readonly options: readonly Option[]
  readonly any?: boolean
}) {
  // What the address asks for stays chosen, though nothing of that name is offered (any more).
  const known = value === undefined || options.some(({ code }) => code === value)
  return (
    <div className="field">
      <label htmlFor={`lots-${name}`}>{label}</label>
      <select key={value} id={`lots-${name}`} name={name} className="input" defaultValue={value ?? ''}>
        {any ? <option value="">any</option> : null}
        {known ? null : <option value={value}>{value}</option>}
        {options.map(({ code, name: shown }) => (
          <option key={code} value={code}>
            {shown}
          </option>
        ))}
      </select>
    </div>
  )
}

function Day({
  name,
  label,
  value,
}: {
  readonly name: string
  readonly label: string
  readonly value: string | undefined
}) {
  return (
    <div className="field">
      <label htmlFor={`lots-${name}`}>{label}</label>
      <input key={value} id={`lots-${name}`} name={name} type="date" className="input" defaultValue={value} />
    </div>
  )
}

function Tick({
  name,
  value,
  label,
  on,
}: {
  readonly name: string
  readonly value: string
  readonly label: string
  readonly on: string | undefined
}) {
  return (
    <label className="choice">
      <input key={on} type="checkbox" name={name} value={value} defaultChecked={on === value} />
      <span>{label}</span>
    </label>
  )
}
