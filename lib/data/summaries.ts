import type { SummaryRow } from '@/lib/domain/record/write-plan'
import type { Tx } from './database'

/** Replaces the summaries of a lot under one model version: they are always recomputed as a whole. */
export async function replaceSummaries(
  tx: Tx,
  lotId: number,
  modelVersion: string,
  rows: readonly SummaryRow[],
): Promise<void> {
  await tx.lotSummary.deleteMany({ where: { lotId, modelVersion } })
  if (rows.length > 0)
    await tx.lotSummary.createMany({
      data: rows.map(({ madeAt, ...row }) => ({ ...row, madeAt: new Date(madeAt) })),
    })
}
