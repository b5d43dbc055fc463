import type { ResultRow } from '@/lib/domain/record/result-row'
import type { Tx } from './database'
import { evaluationSelect } from './specimens'

/** An evaluation with its results, if they are there. */
export interface EvaluationRecord {
  readonly id: number
  readonly specimenId: number
  readonly number: number
  readonly modelVersion: string
  readonly inputHash: string
  readonly snapshotBody: string
  readonly snapshotHash: string
  readonly result: ResultRow | undefined
}

/** Every evaluation there was of the specimens of a lot, in the order they were made. */
export const listEvaluations = async (tx: Tx, lotId: number): Promise<readonly EvaluationRecord[]> =>
  (
    await tx.evaluation.findMany({
      where: { specimen: { lotId } },
      orderBy: { id: 'asc' },
      select: evaluationSelect,
    })
  ).map(({ snapshot, result, ...row }) => ({
    id: row.id,
    specimenId: row.specimenId,
    number: row.number,
    modelVersion: row.modelVersion,
    inputHash: row.inputHash,
    snapshotBody: snapshot.body,
    snapshotHash: snapshot.hash,
    result: result ?? undefined,
  }))

export const insertResults = async (
  tx: Tx,
  rows: readonly { readonly evaluationId: number; readonly result: ResultRow }[],
): Promise<void> => {
  if (rows.length > 0)
    await tx.specimenResult.createMany({
      data: rows.map(({ evaluationId, result }) => ({ evaluationId, ...result })),
    })
}

/** Ids of all lots that have specimens, by product. */
export const listMeasuredLots = async (tx: Tx): Promise<readonly { id: number; productId: number }[]> =>
  tx.lot.findMany({
    where: { specimens: { some: {} } },
    orderBy: { id: 'asc' },
    select: { id: true, productId: true },
  })
