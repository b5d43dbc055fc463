/**
 * Which lots a list is about, in which order, and what they come to together. Asked in SQL: only there can lots be
 * sorted by where they stand in their life, and signals be looked into for the lots they name. What differs between
 * the engines is at the top.
 */
import type { LotSortKey } from '@/lib/domain/record/lot-columns'
import { type LotState, lotStates } from '@/lib/domain/record/lot-state'
import type { Engine, Tx } from './database'
import { engineOf } from './guarded-client'

export interface LotSelection {
  /** Lower-cased; a lot has to hold each of them. */
  readonly words: readonly string[]
  readonly states: readonly LotState[] | undefined
  readonly productCode: string | undefined
  readonly family: string | undefined
  readonly machineCode: string | undefined
  readonly dieCode: string | undefined
  /** Epoch milliseconds, both belong to it. */
  readonly madeFrom: number | undefined
  readonly madeTo: number | undefined
  readonly withOpenSignal: boolean
  readonly evidenceChanged: boolean
}

export interface LotOrder {
  readonly key: LotSortKey
  readonly descending: boolean
}

/** Lots in one state. */
export interface StateTotal {
  readonly state: LotState
  readonly lots: number
  /** Of the lots whose length is known. */
  readonly metres: number
  readonly lotsWithLength: number
}

type Value = string | number
/** Puts a value among the parameters; gives the mark that stands for it in the text. */
type Mark = (value: Value) => string

interface Dialect {
  readonly mark: (place: number) => string
  readonly instant: (mark: string) => string
  /** Texts in the order of their code points, on either engine. */
  readonly collate: string
  /** The JSON list of `s."members"` as rows, and the id that a row of it holds. */
  readonly members: string
  readonly member: string
}

const dialects: Readonly<Record<Engine, Dialect>> = {
  sqlite: {
    mark: () => '?',
    instant: (mark) => mark,
    collate: '',
    members: 'json_each(s."members") j',
    member: 'j.value',
  },
  postgresql: {
    mark: (place) => `$${place}`,
    instant: (mark) => `to_timestamp(CAST(${mark} AS DOUBLE PRECISION) / 1000) AT TIME ZONE 'UTC'`,
    collate: ' COLLATE "C"',
    members: 'jsonb_array_elements_text(CAST(s."members" AS JSONB)) AS j(value)',
    member: 'CAST(j.value AS INTEGER)',
  },
}

const parameters = (dialect: Dialect): { readonly values: Value[]; readonly mark: Mark } => {
  const values: Value[] = []
  return { values, mark: (value) => dialect.mark(values.push(value)) }
}

/** Signs that LIKE reads as “anything” stand for themselves in what a person types. */
const literally = (word: string): string => `%${word.replace(/[\\%_]/g, '\\$&')}%`

function conditionOf(selection: LotSelection, dialect: Dialect, mark: Mark): string {
  const idOf = (table: string, code: string) =>
    `(SELECT t."id" FROM "${table}" t WHERE t."code" = ${mark(code)})`
  const { states, productCode, family, machineCode, dieCode, madeFrom, madeTo } = selection
  const conditions = [
    ...selection.words.map((word) => `l."searchKey" LIKE ${mark(literally(word))} ESCAPE '\\'`),
    ...(states ? [states.length > 0 ? `l."state" IN (${states.map(mark).join(', ')})` : 'FALSE'] : []),
    ...(productCode ? [`l."productId" = ${idOf('Product', productCode)}`] : []),
    ...(family ? [`p."family" = ${mark(family)}`] : []),
    ...(machineCode ? [`l."machineId" = ${idOf('Machine', machineCode)}`] : []),
    ...(dieCode ? [`l."dieId" = ${idOf('Die', dieCode)}`] : []),
    ...(madeFrom === undefined ? [] : [`l."madeAt" >= ${dialect.instant(mark(madeFrom))}`]),
    ...(madeTo === undefined ? [] : [`l."madeAt" <= ${dialect.instant(mark(madeTo))}`]),
    ...(selection.withOpenSignal
      ? [`l."id" IN (SELECT ${dialect.member} FROM "Signal" s, ${dialect.members} WHERE s."state" = 'open')`]
      : []),
    ...(selection.evidenceChanged ? ['l."evidenceChanged" = TRUE'] : []),
  ]
  return conditions.length > 0 ? conditions.join(' AND ') : 'TRUE'
}

/** Where a state comes in a lot's life. */
const stage = `CASE l."state" ${lotStates.map((state, index) => `WHEN '${state}' THEN ${index}`).join(' ')} END`

/** Lots that have no such value stand last either way; equal ones newest first. */
function orderOf({ key, descending }: LotOrder, { collate }: Dialect): string {
  const way = descending ? 'DESC' : 'ASC'
  const newest = `l."madeAt" DESC, l."code"${collate} DESC`
  const by: Readonly<Record<LotSortKey, string>> = {
    made: `l."madeAt" ${way}, l."code"${collate} ${way}`,
    measured: `l."measuredAt" ${way} NULLS LAST, ${newest}`,
    code: `l."code"${collate} ${way}`,
    product: `p."name"${collate} ${way}, ${newest}`,
    state: `${stage} ${way}, ${newest}`,
    length: `l."lengthMetres" ${way} NULLS LAST, ${newest}`,
  }
  return by[key]
}

const from = '"Lot" l JOIN "Product" p ON p."id" = l."productId"'

/** Ids of the selected lots in this order; without `part` all of them. */
export async function listSelectedIds(
  tx: Tx,
  selection: LotSelection,
  order: LotOrder,
  part?: { readonly skip: number; readonly take: number },
): Promise<readonly number[]> {
  const dialect = dialects[engineOf(tx)]
  const { values, mark } = parameters(dialect)
  const condition = conditionOf(selection, dialect, mark)
  const limit = part ? ` LIMIT ${mark(part.take)} OFFSET ${mark(part.skip)}` : ''
  const rows = await tx.$queryRawUnsafe<{ id: number | bigint }[]>(
    `SELECT l."id" AS "id" FROM ${from} WHERE ${condition} ORDER BY ${orderOf(order, dialect)}${limit}`,
    ...values,
  )
  return rows.map(({ id }) => Number(id))
}

interface TotalRow {
  readonly state: string
  readonly lots: number | bigint
  readonly metres: number | bigint | null
  readonly withLength: number | bigint
}

/** What the selected lots come to, state by state in the order of a lot's life; states of no lot are left out. */
export async function totalSelection(tx: Tx, selection: LotSelection): Promise<readonly StateTotal[]> {
  const dialect = dialects[engineOf(tx)]
  const { values, mark } = parameters(dialect)
  const rows = await tx.$queryRawUnsafe<TotalRow[]>(
    `SELECT l."state" AS "state", COUNT(*) AS "lots", SUM(l."lengthMetres") AS "metres",
            COUNT(l."lengthMetres") AS "withLength"
     FROM ${from} WHERE ${conditionOf(selection, dialect, mark)} GROUP BY l."state"`,
    ...values,
  )
  return lotStates.flatMap((state) =>
    rows
      .filter((row) => row.state === state)
      .map(({ lots, metres, withLength }) => ({
        state,
        lots: Number(lots),
        metres: Number(metres ?? 0),
        lotsWithLength: Number(withLength),
      })),
  )
}

/** How many unanswered signals name each of these lots; lots of none are left out. */
export async function countOpenSignals(
  tx: Tx,
  lotIds: readonly number[],
): Promise<ReadonlyMap<number, number>> {
  if (lotIds.length === 0) return new Map()
  const dialect = dialects[engineOf(tx)]
  const { values, mark } = parameters(dialect)
  const rows = await tx.$queryRawUnsafe<{ id: number | bigint; signals: number | bigint }[]>(
    `SELECT ${dialect.member} AS "id", COUNT(*) AS "signals" FROM "Signal" s, ${dialect.members}
     WHERE s."state" = 'open' AND ${dialect.member} IN (${lotIds.map(mark).join(', ')}) GROUP BY 1`,
    ...values,
  )
  return new Map(rows.map(({ id, signals }) => [Number(id), Number(signals)]))
}
