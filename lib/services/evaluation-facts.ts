import type { Tx } from '@/lib/data/database'
import { type KnownEquipment, type LoadedRevision, loadRevision } from '@/lib/data/evaluation-facts'
import { gaugeFactsOf } from '@/lib/data/gauges'
import { rigFactsOf } from '@/lib/data/rigs'
import { weightFactsOf } from '@/lib/data/weights'
import { getWorks, type WorksRow } from '@/lib/data/works'
import { problem } from '@/lib/domain/errors'
import type { EvaluationFacts } from '@/lib/domain/record/evaluation-facts'
import { gravityOf } from './works-gravity'

export interface LoadedFacts {
  readonly works: WorksRow
  readonly revision: LoadedRevision
  readonly facts: EvaluationFacts
}

/** What the works knows now and an evaluation under a specification revision may draw on. */
export async function loadFacts(
  tx: Tx,
  specificationRevisionId: number,
  equipment: KnownEquipment,
): Promise<LoadedFacts> {
  const works = await getWorks(tx)
  if (!works)
    throw problem('not-ready', 'The works has not been set up yet.', {
      mend: 'Enter its place in Settings: gravity follows from it.',
    })
  const revision = await loadRevision(tx, specificationRevisionId)
  const { value, u } = gravityOf(works)
  return {
    works,
    revision,
    facts: {
      gravity: { value, u },
      air: {
        celsius: works.airTemperatureCelsius,
        pascals: works.airPressurePascals,
        humidity: works.airHumidity,
      },
      material: revision.material.body,
      specification: revision.specification,
      rigs: equipment.rigs.map(rigFactsOf),
      weights: equipment.weights.map(weightFactsOf),
      gauges: equipment.gauges.map(gaugeFactsOf),
    },
  }
}
