import type { SpecificationBody } from '@/lib/domain/metrology/specification'
import type { Tx } from './database'

export interface SpecificationRow {
  readonly id: number
  readonly productId: number
  readonly number: number
  readonly effectiveFrom: number
  readonly materialCode: string
  readonly materialName: string
  /** Canonical JSON of SpecificationBody. */
  readonly body: string
  readonly hash: string
  readonly note: string
  readonly issuedAt: number
  readonly issuedById: number | undefined
}

const select = {
  id: true,
  productId: true,
  number: true,
  effectiveFrom: true,
  body: true,
  hash: true,
  note: true,
  issuedAt: true,
  issuedById: true,
  material: { select: { code: true, name: true } },
} as const

interface Selected {
  id: number
  productId: number
  number: number
  effectiveFrom: Date
  body: string
  hash: string
  note: string
  issuedAt: Date
  issuedById: number | null
  material: { code: string; name: string }
}

const rowOf = ({ effectiveFrom, issuedAt, issuedById, material, ...row }: Selected): SpecificationRow => ({
  ...row,
  effectiveFrom: effectiveFrom.getTime(),
  issuedAt: issuedAt.getTime(),
  issuedById: issuedById ?? undefined,
  materialCode: material.code,
  materialName: material.name,
})

/** What each revision of a product asks for, by the revision’s id. */
export const listSpecificationBodies = async (
  tx: Tx,
  productId: number,
): Promise<ReadonlyMap<number, SpecificationBody>> =>
  new Map(
    (await tx.specificationRevision.findMany({ where: { productId }, select: { id: true, body: true } })).map(
      (row) => [row.id, specificationBodyOf(row)],
    ),
  )

/** All revisions of a product, newest first. */
export const listSpecificationRows = async (
  tx: Tx,
  productId: number,
): Promise<readonly SpecificationRow[]> =>
  (
    await tx.specificationRevision.findMany({ where: { productId }, select, orderBy: { number: 'desc' } })
  ).map(rowOf)

export const findSpecification = async (
  tx: Tx,
  productId: number,
  number: number,
): Promise<SpecificationRow | undefined> => {
  const row = await tx.specificationRevision.findUnique({
    where: { productId_number: { productId, number } },
    select,
  })
  return row ? rowOf(row) : undefined
}

/** The revision in force at a moment: the last one that was effective by then; of equal dates the later number. */
export const findSpecificationInForce = async (
  tx: Tx,
  productId: number,
  at: number,
): Promise<SpecificationRow | undefined> => {
  const row = await tx.specificationRevision.findFirst({
    where: { productId, effectiveFrom: { lte: new Date(at) } },
    select,
    orderBy: [{ effectiveFrom: 'desc' }, { number: 'desc' }],
  })
  return row ? rowOf(row) : undefined
}

interface NewSpecification {
  readonly productId: number
  readonly number: number
  readonly effectiveFrom: number
  readonly materialId: number
  readonly body: string
  readonly hash: string
  readonly note: string
  readonly issuedAt: number
  readonly issuedById: number
}

/** Issues a revision; it is never changed afterwards. */
export const insertSpecification = async (
  tx: Tx,
  { effectiveFrom, issuedAt, ...values }: NewSpecification,
): Promise<SpecificationRow> =>
  rowOf(
    await tx.specificationRevision.create({
      data: { ...values, effectiveFrom: new Date(effectiveFrom), issuedAt: new Date(issuedAt) },
      select,
    }),
  )

/** The body as it was issued; only our own canonical JSON is ever written there. */
export const specificationBodyOf = ({ body }: Pick<SpecificationRow, 'body'>): SpecificationBody =>
  JSON.parse(body) as SpecificationBody
