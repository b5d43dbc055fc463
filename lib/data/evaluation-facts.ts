import type { Tx } from './database'
import { type GaugeRow, gauges } from './gauges'
import { materialBodyOf } from './materials'
import { type RigRow, rigs } from './rigs'
import { specificationBodyOf } from './specifications'
import { type WeightRow, weights } from './weights'

export interface KnownEquipment {
  readonly rigs: readonly RigRow[]
  readonly weights: readonly WeightRow[]
  readonly gauges: readonly GaugeRow[]
}

/** All equipment there is or was: old readings name what is no longer in use. */
export const loadEquipment = async (tx: Tx): Promise<KnownEquipment> => ({
  rigs: await rigs.list(tx),
  weights: await weights.list(tx),
  gauges: await gauges.list(tx),
})

/** A specification revision with its material, bodies as they were issued. */
export async function loadRevision(tx: Tx, id: number) {
  const revision = await tx.specificationRevision.findUniqueOrThrow({
    where: { id },
    select: {
      number: true,
      effectiveFrom: true,
      body: true,
      material: { select: { code: true, name: true, body: true } },
    },
  })
  return {
    number: revision.number,
    effectiveFrom: revision.effectiveFrom.getTime(),
    specification: specificationBodyOf(revision),
    material: {
      code: revision.material.code,
      name: revision.material.name,
      body: materialBodyOf(revision.material),
    },
  }
}

export type LoadedRevision = Awaited<ReturnType<typeof loadRevision>>
