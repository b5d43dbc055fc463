import type { DispositionVerb } from '@/lib/domain/quality/propose-disposition'
import type { Tx } from './database'

export interface DispositionRow {
  readonly id: number
  readonly number: number
  readonly verb: DispositionVerb
  readonly reason: string
  readonly decidedAt: number
  readonly decidedById: number | undefined
  /** Canonical JSON. */
  readonly proposal: string
  readonly evidence: string
  readonly evidenceHash: string
  readonly evidenceChanged: boolean
  readonly current: boolean
}

const select = {
  id: true,
  number: true,
  verb: true,
  reason: true,
  decidedAt: true,
  decidedById: true,
  proposal: true,
  evidence: true,
  evidenceHash: true,
  evidenceChanged: true,
  current: true,
} as const

/** Newest first. */
export const listDispositions = async (tx: Tx, lotId: number): Promise<readonly DispositionRow[]> =>
  (await tx.disposition.findMany({ where: { lotId }, select, orderBy: { number: 'desc' } })).map(
    ({ verb, decidedAt, decidedById, ...row }) => ({
      ...row,
      // The guard of the table allows no other word.
      verb: verb as DispositionVerb,
      decidedAt: decidedAt.getTime(),
      decidedById: decidedById ?? undefined,
    }),
  )

export const findCurrentDisposition = async (tx: Tx, lotId: number): Promise<DispositionRow | undefined> =>
  (await listDispositions(tx, lotId)).find((one) => one.current)

export type NewDisposition = Omit<DispositionRow, 'id' | 'evidenceChanged' | 'current' | 'decidedById'> & {
  readonly lotId: number
  readonly decidedById: number
}

/** A further decision on a lot: it takes the place of the one before, which stays readable. */
export async function insertDisposition(
  tx: Tx,
  { decidedAt, ...disposition }: NewDisposition,
): Promise<void> {
  await tx.disposition.updateMany({
    where: { lotId: disposition.lotId, current: true },
    data: { current: false },
  })
  await tx.disposition.create({
    data: { ...disposition, decidedAt: new Date(decidedAt) },
    select: { id: true },
  })
}

export const markDispositions = async (tx: Tx, ids: readonly number[]): Promise<void> => {
  if (ids.length > 0)
    await tx.disposition.updateMany({ where: { id: { in: [...ids] } }, data: { evidenceChanged: true } })
}

/** Published revisions that rest on a lot and are not marked yet. */
export const unmarkedRevisionsOf = async (tx: Tx, lotId: number): Promise<readonly number[]> =>
  (
    await tx.datasheetLot.findMany({
      where: { lotId, revision: { evidenceChanged: false } },
      select: { revisionId: true },
      orderBy: { revisionId: 'asc' },
    })
  ).map((row) => row.revisionId)

export const markRevisions = async (tx: Tx, ids: readonly number[]): Promise<void> => {
  if (ids.length > 0)
    await tx.datasheetRevision.updateMany({
      where: { id: { in: [...ids] } },
      data: { evidenceChanged: true },
    })
}

/** Unmarked decisions in force on lots of a product made from a time on. */
export const listDecidedFrom = async (tx: Tx, productId: number, madeFrom: number) =>
  (
    await tx.disposition.findMany({
      where: {
        current: true,
        evidenceChanged: false,
        lot: { productId, madeAt: { gte: new Date(madeFrom) } },
      },
      select: { id: true, lotId: true, evidence: true, lot: { select: { madeAt: true } } },
    })
  ).map(({ lot, ...row }) => ({ ...row, madeAt: lot.madeAt.getTime() }))
