import { loadChartHistories } from '@/lib/data/chart-histories'
import type { Tx } from '@/lib/data/database'
import { findCurrentDisposition, unmarkedRevisionsOf } from '@/lib/data/dispositions'
import { type KnownEquipment, loadEquipment } from '@/lib/data/evaluation-facts'
import { lockRow } from '@/lib/data/locks'
import type { LotRow } from '@/lib/data/lots'
import { loadSpecimens, specimenStateOf } from '@/lib/data/specimens'
import type { LotWriteState } from '@/lib/domain/record/write-state'
import { loadFacts } from './evaluation-facts'

/**
 * Everything that the plan of a further entry rests on. Call it with the lot's row locked; the product's row is
 * locked here, because two lots of one product may raise the same signal.
 */
export async function loadWriteState(
  tx: Tx,
  lot: LotRow,
): Promise<{ readonly state: LotWriteState; readonly equipment: KnownEquipment }> {
  await lockRow(tx, 'Product', lot.product.id)
  const equipment = await loadEquipment(tx)
  const { facts } = await loadFacts(tx, lot.specificationRevisionId, equipment)
  const specimens = await loadSpecimens(tx, lot.id, equipment)
  const disposition = await findCurrentDisposition(tx, lot.id)
  return {
    equipment,
    state: {
      lot: {
        id: lot.id,
        code: lot.code,
        state: lot.state,
        version: lot.version,
        evidenceChanged: lot.evidenceChanged,
        productId: lot.product.id,
        machineId: lot.machine?.id ?? null,
        madeAt: lot.madeAt,
      },
      facts,
      specimens: specimens.map(specimenStateOf),
      charts: await loadChartHistories(tx, lot.product.id),
      ...(disposition === undefined
        ? {}
        : {
            disposition: {
              id: disposition.id,
              evidenceChanged: disposition.evidenceChanged,
              decidedAt: disposition.decidedAt,
            },
          }),
      datasheetRevisions: await unmarkedRevisionsOf(tx, lot.id),
    },
  }
}
