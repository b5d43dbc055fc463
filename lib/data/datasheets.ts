import type { Tx } from './database'

export interface DatasheetRevisionRow {
  readonly id: number
  readonly datasheetCode: string
  readonly number: number
  readonly basis: string
  readonly body: string
  readonly hash: string
  readonly publishedAt: number
  readonly publishedById: number | undefined
  readonly supersededAt: number | undefined
  readonly evidenceChanged: boolean
}

const select = {
  id: true,
  number: true,
  basis: true,
  body: true,
  hash: true,
  publishedAt: true,
  publishedById: true,
  supersededAt: true,
  evidenceChanged: true,
  datasheet: { select: { code: true } },
} as const

interface Selected {
  id: number
  number: number
  basis: string
  body: string
  hash: string
  publishedAt: Date
  publishedById: number | null
  supersededAt: Date | null
  evidenceChanged: boolean
  datasheet: { code: string }
}

const rowOf = ({
  datasheet,
  publishedAt,
  publishedById,
  supersededAt,
  ...rest
}: Selected): DatasheetRevisionRow => ({
  ...rest,
  datasheetCode: datasheet.code,
  publishedAt: publishedAt.getTime(),
  publishedById: publishedById ?? undefined,
  supersededAt: supersededAt?.getTime(),
})

export const findDatasheetOfProduct = (tx: Tx, productId: number) =>
  tx.datasheet.findFirst({ where: { productId }, select: { id: true, code: true } })

export const findDatasheetByCode = (tx: Tx, code: string) =>
  tx.datasheet.findUnique({
    where: { code },
    select: { id: true, code: true, product: { select: { code: true, name: true } } },
  })

/** Newest first. */
export const listRevisions = async (tx: Tx, datasheetId: number): Promise<readonly DatasheetRevisionRow[]> =>
  (await tx.datasheetRevision.findMany({ where: { datasheetId }, select, orderBy: { number: 'desc' } })).map(
    rowOf,
  )

export const getRevision = async (
  tx: Tx,
  datasheetId: number,
  number: number,
): Promise<DatasheetRevisionRow | undefined> => {
  const row = await tx.datasheetRevision.findUnique({
    where: { datasheetId_number: { datasheetId, number } },
    select,
  })
  return row ? rowOf(row) : undefined
}

export interface DatasheetListRow {
  readonly code: string
  readonly productCode: string
  readonly productName: string
  readonly newest:
    | Pick<DatasheetRevisionRow, 'number' | 'basis' | 'publishedAt' | 'evidenceChanged'>
    | undefined
}

export const listDatasheets = async (tx: Tx): Promise<readonly DatasheetListRow[]> => {
  const rows = await tx.datasheet.findMany({
    orderBy: { code: 'asc' },
    select: {
      code: true,
      product: { select: { code: true, name: true } },
      revisions: {
        orderBy: { number: 'desc' },
        take: 1,
        select: { number: true, basis: true, publishedAt: true, evidenceChanged: true },
      },
    },
  })
  return rows.map(({ code, product, revisions: [newest] }) => ({
    code,
    productCode: product.code,
    productName: product.name,
    newest: newest ? { ...newest, publishedAt: newest.publishedAt.getTime() } : undefined,
  }))
}

/** The number of datasheets there are: the next one's code follows from it. */
export const countDatasheets = (tx: Tx): Promise<number> => tx.datasheet.count()

export const insertDatasheet = (tx: Tx, code: string, productId: number, at: number) =>
  tx.datasheet.create({
    data: { code, productId, createdAt: new Date(at) },
    select: { id: true, code: true },
  })

export interface NewRevision {
  readonly datasheetId: number
  readonly number: number
  readonly basis: string
  readonly modelVersion: string
  readonly body: string
  readonly hash: string
  readonly ledgerCount: number
  readonly ledgerHash: string
  readonly at: number
  readonly publishedById: number
  readonly lotIds: readonly number[]
}

export async function insertRevision(tx: Tx, revision: NewRevision): Promise<number> {
  const { at, lotIds, ...data } = revision
  await tx.datasheetRevision.updateMany({
    where: { datasheetId: revision.datasheetId, supersededAt: null },
    data: { supersededAt: new Date(at) },
  })
  const { id } = await tx.datasheetRevision.create({
    data: { ...data, publishedAt: new Date(at) },
    select: { id: true },
  })
  await tx.datasheetLot.createMany({ data: lotIds.map((lotId) => ({ revisionId: id, lotId })) })
  return id
}

/** Released lots of a product with what a datasheet is built from, in chart order. */
export async function listReleasedLots(tx: Tx, productId: number, modelVersion: string) {
  const rows = await tx.lot.findMany({
    where: { productId, state: 'released' },
    orderBy: [{ madeAt: 'asc' }, { code: 'asc' }],
    select: {
      id: true,
      code: true,
      madeAt: true,
      summaries: {
        where: {
          modelVersion,
          characteristic: { in: ['massPerMetreWeighed', 'diameter', 'effectiveDensity'] },
        },
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
  return rows.map(({ madeAt, ...rest }) => ({ ...rest, madeAt: madeAt.getTime() }))
}
