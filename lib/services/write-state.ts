import { loadChartHistories, loadMachineCharts } from '@/lib/data/chart-histories'
import type { Tx } from '@/lib/data/database'
import { findCurrentDisposition, unmarkedRevisionsOf } from '@/lib/data/dispositions'
import { type KnownEquipment, loadEquipment } from '@/lib/data/evaluation-facts'
import { lockRow } from '@/lib/data/locks'
import { type LotRow, lotWriteStateOf } from '@/lib/data/lots'
import { loadSpecimens, specimenStateOf } from '@/lib/data/specimens'
import type { LotWriteState } from '@/lib/domain/record/write-state'
import { loadFacts } from './evaluation-facts'

/**
 * Everything that the plan of further entries rests on, at most `toCome` of them. Call it with the lot's row locked;
 * the product's row is locked here, because two lots of one product may raise the same signal, and its machine's for
 * the same reason.
 */
export async function loadWriteState(
  tx: Tx,
  lot: LotRow,
  toCome = Number.POSITIVE_INFINITY,
): Promise<{ readonly state: LotWriteState; readonly equipment: KnownEquipment }> {
  await lockRow(tx, 'Product', lot.product.id)
  if (lot.machine) await lockRow(tx, 'Machine', lot.machine.id)
  const equipment = await loadEquipment(tx)
  const { facts } = await loadFacts(tx, lot.specificationRevisionId, equipment)
  const specimens = await loadSpecimens(tx, lot.id, equipment)
  // A lot whose plan stays incomplete comes onto no chart: there is nothing for the rules to find.
  const staysOff = lot.state === 'measuring' && specimens.length + toCome < facts.specification.plan.specimens
  const charts = staysOff ? [] : await loadChartHistories(tx, lot.product.id)
  const disposition = await findCurrentDisposition(tx, lot.id)
  return {
    equipment,
    state: {
      lot: lotWriteStateOf(lot),
      facts,
      specimens: specimens.map(specimenStateOf),
      charts,
      // Nothing is asked over products while the lot's own product has no limits.
      ...(lot.machine && charts.length > 0
        ? { machine: await loadMachineCharts(tx, lot.machine.id, lot.product.id) }
        : {}),
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
