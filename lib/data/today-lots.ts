/** Lots that wait, for Today: each list is bounded, its count is not. */
import { MODEL_VERSION } from '@/lib/domain/metrology/model-version'
import type { SpecificationBody } from '@/lib/domain/metrology/specification'
import type { LotSummaryBody } from '@/lib/domain/quality/lot-summary'
import type { LotState } from '@/lib/domain/record/lot-state'
import type { Tx } from './database'

export interface LotOfToday {
  readonly id: number
  readonly code: string
  readonly state: string
  /** Epoch milliseconds: first reading where there is one, else when it was made. */
  readonly at: number
  readonly lengthMetres: number | undefined
  readonly evidenceChanged: boolean
  readonly productCode: string
  readonly productName: string
  readonly specificationRevisionId: number
}

const select = {
  id: true,
  code: true,
  state: true,
  madeAt: true,
  measuredAt: true,
  lengthMetres: true,
  evidenceChanged: true,
  specificationRevisionId: true,
  product: { select: { code: true, name: true } },
} as const

interface Selected {
  readonly id: number
  readonly code: string
  readonly state: string
  readonly madeAt: Date
  readonly measuredAt: Date | null
  readonly lengthMetres: number | null
  readonly evidenceChanged: boolean
  readonly specificationRevisionId: number
  readonly product: { readonly code: string; readonly name: string }
}

const lotOf = ({ madeAt, measuredAt, lengthMetres, product, ...row }: Selected): LotOfToday => ({
  id: row.id,
  code: row.code,
  state: row.state,
  evidenceChanged: row.evidenceChanged,
  specificationRevisionId: row.specificationRevisionId,
  at: (measuredAt ?? madeAt).getTime(),
  lengthMetres: lengthMetres ?? undefined,
  productCode: product.code,
  productName: product.name,
})

const oldestFirst = [{ madeAt: 'asc' as const }, { code: 'asc' as const }]

/** Current decision of a lot, if there is one. */
const decision = {
  where: { current: true },
  take: 1,
  select: { decidedAt: true, verb: true, reason: true },
} as const

export interface DecidedLot extends LotOfToday {
  readonly decidedAt: number | undefined
  readonly reason: string
}

type Decided = Selected & { readonly dispositions: readonly { decidedAt: Date; reason: string }[] }

const decidedOf = ({ dispositions: [last], ...row }: Decided): DecidedLot => ({
  ...lotOf(row),
  decidedAt: last?.decidedAt.getTime(),
  reason: last?.reason ?? '',
})

/** Lots that went out and whose evidence has changed since, oldest first. */
export async function listChangedAfterRelease(tx: Tx, take: number) {
  const where = {
    evidenceChanged: true,
    state: { in: ['released', 'concession', 'regraded'] satisfies LotState[] },
  }
  const rows = await tx.lot.findMany({
    where,
    orderBy: oldestFirst,
    take,
    select: { ...select, dispositions: decision },
  })
  return { lots: rows.map(decidedOf), count: await tx.lot.count({ where }) }
}

/**
 * Lots in a state with the decision in force, oldest first.
 * @param makerId only lots that this person made or opened
 */
export async function listDecidedInState(tx: Tx, state: LotState, take: number, makerId?: number) {
  const where = {
    state,
    ...(makerId === undefined ? {} : { OR: [{ makerId }, { makerId: null, createdById: makerId }] }),
  }
  const rows = await tx.lot.findMany({
    where,
    orderBy: oldestFirst,
    take,
    select: { ...select, dispositions: decision },
  })
  return { lots: rows.map(decidedOf), count: await tx.lot.count({ where }) }
}

/** Lots on hold since before a moment, oldest first. */
export async function listHeldBefore(tx: Tx, before: number, take: number) {
  const where = {
    state: 'held' satisfies LotState,
    dispositions: { some: { current: true, decidedAt: { lt: new Date(before) } } },
  }
  const rows = await tx.lot.findMany({
    where,
    orderBy: oldestFirst,
    take,
    select: { ...select, dispositions: decision },
  })
  return { lots: rows.map(decidedOf), count: await tx.lot.count({ where }) }
}

/** Lots to measure, oldest first: those with specimens, or those without. */
export async function listToMeasure(tx: Tx, begun: boolean, take: number) {
  const where = { state: 'measuring' satisfies LotState, specimens: begun ? { some: {} } : { none: {} } }
  const rows = await tx.lot.findMany({
    where,
    orderBy: oldestFirst,
    take,
    select: { ...select, _count: { select: { specimens: true } } },
  })
  return {
    lots: rows.map(({ _count, ...row }) => ({ ...lotOf(row), specimens: _count.specimens })),
    count: await tx.lot.count({ where }),
  }
}

export interface SummarisedLot extends LotOfToday {
  readonly summaries: Readonly<Record<string, LotSummaryBody>>
}

/** Lots to decide with their summaries, oldest first. */
export async function listToDecide(tx: Tx, take: number) {
  const where = { state: 'to-decide' satisfies LotState }
  const rows = await tx.lot.findMany({
    where,
    orderBy: oldestFirst,
    take,
    select: {
      ...select,
      summaries: {
        where: { modelVersion: MODEL_VERSION },
        select: {
          characteristic: true,
          n: true,
          mean: true,
          m2: true,
          min: true,
          max: true,
          uCommon: true,
          uMean: true,
        },
      },
    },
  })
  const lots = rows.map(
    ({ summaries, ...row }): SummarisedLot => ({
      ...lotOf(row),
      summaries: Object.fromEntries(summaries.map(({ characteristic, ...body }) => [characteristic, body])),
    }),
  )
  return { lots, count: await tx.lot.count({ where }) }
}

/** What specification revisions ask for, by id. */
export const listBodies = async (
  tx: Tx,
  ids: readonly number[],
): Promise<ReadonlyMap<number, SpecificationBody>> =>
  new Map(
    (
      await tx.specificationRevision.findMany({
        where: { id: { in: [...new Set(ids)] } },
        select: { id: true, body: true },
      })
    ).map(({ id, body }) => [
      id,
      // Only our own canonical JSON is ever written there.
      JSON.parse(body) as SpecificationBody,
    ]),
  )

/** How many lots were made, measured and decided from one moment to another. */
export async function countDay(tx: Tx, from: number, to: number) {
  const within = { gte: new Date(from), lte: new Date(to) }
  const decided = { decidedAt: within }
  return {
    made: await tx.lot.count({ where: { madeAt: within } }),
    measured: await tx.lot.count({ where: { measuredAt: within } }),
    released: await tx.disposition.count({ where: { ...decided, verb: 'release' } }),
    firstDecided: await tx.disposition.count({ where: { ...decided, number: 1 } }),
    rightFirstTime: await tx.disposition.count({ where: { ...decided, number: 1, verb: 'release' } }),
  }
}
