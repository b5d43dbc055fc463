import { MODEL_VERSION } from '@/lib/domain/metrology/model-version'
import type { SpecimenWritePlan } from '@/lib/domain/record/write-plan'
import type { Tx } from './database'
import { markDispositions, markRevisions } from './dispositions'
import type { KnownEquipment } from './evaluation-facts'
import { engineOf } from './guarded-client'
import { updateLotState } from './lots'
import { storeSignals } from './signals'
import { replaceSummaries } from './summaries'

/**
 * Stores a plan through the client, row by row as it stands in it, all but its ledger draft: that one is the
 * last write of the transaction and is left to the caller. The lot's row is locked before the plan's state
 * is read.
 *
 * Throws when the lot has another version than the plan was made for.
 */
export async function storePlan(tx: Tx, plan: SpecimenWritePlan, equipment: KnownEquipment): Promise<void> {
  if (plan.ledger === undefined) return
  const specimenIds = await storeSpecimens(tx, plan)
  await storeReadings(tx, plan, specimenIds, equipment)
  await storeEvaluations(tx, plan, specimenIds)
  await replaceSummaries(tx, plan.lot.id, MODEL_VERSION, plan.summaries)
  await storeSignals(tx, plan.signals)
  await markDispositions(tx, plan.evidenceChanged.dispositions)
  await markRevisions(tx, plan.evidenceChanged.datasheetRevisions)
  const { id, version, ...change } = plan.lot
  if (!(await updateLotState(tx, { id, version: version - 1 }, change)))
    throw new Error(`lot ${id} is not at version ${version - 1}: its row was not locked before the plan`)
}

async function storeSpecimens(tx: Tx, plan: SpecimenWritePlan): Promise<ReadonlyMap<string, number>> {
  if (plan.specimens.length > 0)
    await tx.specimen.createMany({
      data: plan.specimens.map(({ createdAt, ...row }) => ({ ...row, createdAt: new Date(createdAt) })),
    })
  const clientIds = [...new Set(plan.readings.map((one) => one.specimenClientId))]
  const rows = await tx.specimen.findMany({
    where: { clientId: { in: clientIds } },
    select: { id: true, clientId: true },
  })
  return new Map(rows.map((row) => [row.clientId, row.id]))
}

async function storeReadings(
  tx: Tx,
  plan: SpecimenWritePlan,
  specimenIds: ReadonlyMap<string, number>,
  equipment: KnownEquipment,
): Promise<void> {
  const rigIds = new Map(equipment.rigs.map((rig) => [rig.code, rig.id]))
  const gaugeIds = new Map(equipment.gauges.map((gauge) => [gauge.code, gauge.id]))
  const gauge = (code: string | undefined) => (code === undefined ? null : required(gaugeIds, code))
  const superseded = plan.readings.flatMap((one) => one.supersedes ?? [])
  const supersededIds = new Map(
    superseded.length === 0
      ? []
      : (
          await tx.reading.findMany({
            where: { clientId: { in: superseded } },
            select: { id: true, clientId: true },
          })
        ).map((row) => [row.clientId, row.id]),
  )
  await tx.reading.createMany({
    data: plan.readings.map(
      ({ specimenClientId, equipment: codes, supersedes, measuredAt, recordedAt, ...row }) => ({
        ...row,
        specimenId: required(specimenIds, specimenClientId),
        measuredAt: new Date(measuredAt),
        recordedAt: new Date(recordedAt),
        rigId: codes.rig === undefined ? null : required(rigIds, codes.rig),
        micrometerId: gauge(codes.micrometer),
        balanceId: gauge(codes.balance),
        ruleId: gauge(codes.rule),
        counterId: gauge(codes.counter),
        supersedesId: supersedes === undefined ? null : required(supersededIds, supersedes),
      }),
    ),
  })
}

async function storeEvaluations(
  tx: Tx,
  plan: SpecimenWritePlan,
  specimenIds: ReadonlyMap<string, number>,
): Promise<void> {
  if (plan.evaluations.length === 0) return
  const snapshotIds = await storeSnapshots(tx, plan)
  const stored = await tx.evaluation.createManyAndReturn({
    data: plan.evaluations.map(({ specimenClientId, snapshotHash, at, result: _, ...row }) => ({
      ...row,
      specimenId: required(specimenIds, specimenClientId),
      snapshotId: required(snapshotIds, snapshotHash),
      at: new Date(at),
    })),
    select: { id: true, specimenId: true },
  })
  const evaluationIds = new Map(stored.map((row) => [row.specimenId, row.id]))
  const rows = plan.evaluations.map(({ specimenClientId, result }) => {
    const specimenId = required(specimenIds, specimenClientId)
    return { specimenId, evaluationId: required(evaluationIds, specimenId), result }
  })
  await tx.specimenResult.createMany({
    data: rows.map(({ evaluationId, result }) => ({ evaluationId, ...result })),
  })
  for (const { specimenId, evaluationId } of rows)
    await tx.specimen.update({
      where: { id: specimenId },
      data: { currentEvaluationId: evaluationId },
      select: { id: true },
    })
}

/** Snapshots are kept once per distinct content, whoever stored it first. */
async function storeSnapshots(tx: Tx, plan: SpecimenWritePlan): Promise<ReadonlyMap<string, number>> {
  const hashes = plan.snapshots.map((one) => one.hash)
  const find = async () =>
    new Map(
      (
        await tx.inputSnapshot.findMany({ where: { hash: { in: hashes } }, select: { id: true, hash: true } })
      ).map((row) => [row.hash, row.id]),
    )
  const there = await find()
  const fresh = plan.snapshots.filter((one) => !there.has(one.hash))
  if (fresh.length === 0) return there
  const rows = { data: fresh.map(({ createdAt, ...row }) => ({ ...row, createdAt: new Date(createdAt) })) }
  // On PostgreSQL another lot's transaction may store the same content at this moment, and a broken unique
  // constraint would end this one. SQLite's client has no such option and, under its lock, no such moment.
  const others: object = engineOf(tx) === 'postgresql' ? { skipDuplicates: true } : {}
  await tx.inputSnapshot.createMany(Object.assign(rows, others))
  return find()
}

function required<Key>(ids: ReadonlyMap<Key, number>, key: Key): number {
  const id = ids.get(key)
  if (id === undefined) throw new Error(`the plan names ${String(key)}, which is not stored`)
  return id
}
