import { z } from 'zod'
import type { Problem } from '@/lib/domain/errors'
import { type LotColumnId, lotColumnIds, lotSortKeys } from '@/lib/domain/record/lot-columns'
import { lotStates } from '@/lib/domain/record/lot-state'
import { parseInput } from './parse-input'
import { codeText, plainText } from './plain-text'

/** Lots on one page of the list. */
export const LOTS_A_PAGE = 50

/** What each column can be sorted by, with its direction: `made-down` is newest first. */
export const lotSorts = lotSortKeys.flatMap((key) => [`${key}-down`, `${key}-up`] as const)
export type LotSort = (typeof lotSorts)[number]
export const usualSort: LotSort = 'made-down'

/** The columns of the list unless a person chooses others. */
export const usualColumns: readonly LotColumnId[] = [
  'product',
  'made',
  'machine',
  'die',
  'length',
  'specimens',
  'diameter',
  'massWeighed',
  'closure',
  'state',
  'signals',
]

/**
 * Columns from an address or a cookie, `made,product,state`: each once, in the order given. Names that are not
 * known are passed over; undefined when nothing is left.
 */
export function parseColumns(text: string | undefined): readonly LotColumnId[] | undefined {
  const asked = (text ?? '').split(',').map((one) => one.trim())
  const known = [...new Set(asked)].flatMap((id) => lotColumnIds.find((one) => one === id) ?? [])
  return known.length > 0 ? known : undefined
}

/** A form sends its empty fields, too: nothing was asked for there. */
const blank = <Schema extends z.ZodType>(schema: Schema) =>
  z.preprocess((value) => (value === '' ? undefined : value), schema.optional())

const dayOf = (name: string) =>
  z.iso
    .date({ error: `${name}: that is no day of the calendar, such as 2026-11-27.`, abort: true })
    .refine((day) => day >= '1900-01-01' && day < '2200-01-01', {
      error: `${name} lies outside the years 1900 to 2200.`,
    })

const fields = {
  search: plainText('Search', { min: 0, max: 80 }).default(''),
  state: blank(z.enum(lotStates, { error: 'State is not one that a lot can have.' })),
  productCode: blank(codeText('Product')),
  family: blank(plainText('Family')),
  machineCode: blank(codeText('Machine')),
  dieCode: blank(codeText('Die')),
  /** Days on which the lot was made, in the works' time zone; both belong to the selection. */
  from: blank(dayOf('Made from')),
  to: blank(dayOf('Made to')),
  signals: blank(z.literal('open', { error: 'Signals can be asked for as “open” only.' })),
  evidence: blank(z.literal('changed', { error: 'Evidence can be asked for as “changed” only.' })),
  sort: blank(z.enum(lotSorts, { error: 'The list can’t be sorted by that.' })),
  columns: blank(
    z.string().max(400, { error: 'Columns: that is more than there are.' }).transform(parseColumns),
  ),
  page: blank(
    z.coerce
      .number({ error: 'Page is a number.' })
      .int({ error: 'Page is a whole number.' })
      .min(1, { error: 'Pages are counted from 1.' })
      .max(100_000, { error: 'There are no more than 100 000 pages.' }),
  ).transform((page) => page ?? 1),
}

/** Which lots, in which order, and which columns of them. */
export const listLotsSchema = z
  .strictObject(fields)
  .refine(({ from, to }) => from === undefined || to === undefined || from <= to, {
    path: ['to'],
    error: 'Made to lies before made from: no lot can be made between them.',
  })

export type ListLotsInput = z.output<typeof listLotsSchema>

/**
 * The list that an address asks for. What can't be understood is left out and named; the rest counts. Parameters
 * of no meaning here are passed over.
 */
export function readLotAddress(query: Readonly<Record<string, string | undefined>>): {
  readonly input: ListLotsInput
  readonly problems: readonly Problem[]
} {
  const known = Object.keys(fields).flatMap((name) =>
    query[name] === undefined ? [] : [[name, query[name]]],
  )
  const parsed = parseInput(listLotsSchema, Object.fromEntries(known))
  if (parsed.ok) return { input: parsed.value, problems: [] }
  const wrong = new Set(parsed.problems.map(({ where }) => where))
  const rest = readLotAddress(Object.fromEntries(known.filter(([name]) => !wrong.has(name))))
  return { input: rest.input, problems: [...parsed.problems, ...rest.problems] }
}

/** What the address of a list holds, its usual ways unnamed. */
export function lotParameters({ columns, page, sort, ...filter }: ListLotsInput): URLSearchParams {
  const given = Object.entries(filter).flatMap(([name, value]) => (value ? [[name, value]] : []))
  return new URLSearchParams([
    ...given,
    ...(sort && sort !== usualSort ? [['sort', sort]] : []),
    ...(columns ? [['columns', columns.join(',')]] : []),
    ...(page > 1 ? [['page', String(page)]] : []),
  ])
}

/** Whether anything narrows the list. */
export const isFiltered = ({ columns: _, page: __, sort: ___, ...filter }: ListLotsInput): boolean =>
  Object.values(filter).some(Boolean)
