/**
 * Stores what an import has planned, through prepared statements: the second executor beside `store-plan.ts`.
 * Both store the same plan, row by row as it stands in it, and compute nothing.
 */
import { canonicalJson } from '@/lib/domain/record/canonical-json'
import type { RaisedSignal } from '@/lib/domain/record/reconcile-signals'
import type { SpecimenWritePlan } from '@/lib/domain/record/write-plan'
import type { KnownEquipment } from '../evaluation-facts'
import type { BulkConnection, BulkRow } from './bulk-connection'
import { bulkTables } from './bulk-tables'

/** A lot of a batch: opened by it or there already, with everything its rows write. */
export interface PlannedLot {
  /** Set for a lot that the batch opens: its row but for what the plan says. */
  readonly opens: BulkRow | undefined
  readonly materials: readonly BulkRow[]
  readonly plan: SpecimenWritePlan
  /** Ids of the specimens that are there already, by their client ids. */
  readonly specimenIds: ReadonlyMap<string, number>
  /** Ids that raised signals were given when the next lot was planned on them. */
  readonly signalIds: ReadonlyMap<RaisedSignal, number>
}

const { evaluation, lot, lotMaterial, reading, result, signal, snapshot, specimen, summary } = bulkTables

/** Stores lots with all that hangs on them. Call it inside the write transaction. */
export async function storeBatch(
  to: BulkConnection,
  lots: readonly PlannedLot[],
  equipment: KnownEquipment,
): Promise<void> {
  const plans = lots.map((one) => one.plan)
  await to.insert(
    lot,
    lots.flatMap(({ opens, plan }) => (opens ? [{ ...opens, ...stateOf(plan) }] : [])),
  )
  await to.insert(
    lotMaterial,
    lots.flatMap((one) => one.materials),
  )
  const evaluations = await withIds(
    to,
    evaluation.name,
    plans.flatMap((plan) => plan.evaluations),
  )
  const newest = new Map(evaluations.map(({ id, row }) => [row.specimenClientId, id]))
  const specimens = await withIds(
    to,
    specimen.name,
    plans.flatMap((plan) => plan.specimens),
  )
  await to.insert(
    specimen,
    specimens.map(({ id, row }) => ({ ...row, id, currentEvaluationId: newest.get(row.clientId) ?? null })),
  )
  const ids = new Map([
    ...lots.flatMap((one) => [...one.specimenIds]),
    ...specimens.map(({ id, row }): [string, number] => [row.clientId, id]),
  ])
  const fresh = new Set(specimens.map(({ row }) => row.clientId))
  for (const [clientId, evaluationId] of newest)
    if (!fresh.has(clientId))
      await to.run(
        'UPDATE "Specimen" SET "currentEvaluationId" = ? WHERE "id" = ?',
        evaluationId,
        required(ids, clientId),
      )
  await storeReadings(to, plans, ids, equipment)
  await storeEvaluations(to, plans, evaluations, ids)
  await storeSummaries(to, lots)
  await storeSignals(to, lots)
  for (const { opens, plan } of lots) await settleLot(to, plan, opens !== undefined)
}

const stateOf = ({ lot: { evidenceChanged, measuredAt, state, version } }: SpecimenWritePlan): BulkRow => ({
  state,
  version,
  evidenceChanged,
  measuredAt: measuredAt ?? null,
})

async function withIds<Row>(
  to: BulkConnection,
  table: string,
  rows: readonly Row[],
): Promise<readonly { readonly id: number; readonly row: Row }[]> {
  const ids = await to.reserveIds(table, rows.length)
  return rows.map((row, index) => ({ row, id: ids[index] ?? Number.NaN }))
}

async function storeReadings(
  to: BulkConnection,
  plans: readonly SpecimenWritePlan[],
  specimenIds: ReadonlyMap<string, number>,
  equipment: KnownEquipment,
): Promise<void> {
  const rigIds = new Map(equipment.rigs.map((rig) => [rig.code, rig.id]))
  const gaugeIds = new Map(equipment.gauges.map((gauge) => [gauge.code, gauge.id]))
  const gauge = (code: string | undefined) => (code === undefined ? null : required(gaugeIds, code))
  const rows = await withIds(
    to,
    reading.name,
    plans.flatMap((plan) => plan.readings),
  )
  await to.insert(
    reading,
    rows.map(({ id, row: { equipment: codes, specimenClientId, supersedes, ...row } }) => {
      if (supersedes !== undefined) throw new Error('an import corrects nothing by itself')
      return {
        ...row,
        id,
        specimenId: required(specimenIds, specimenClientId),
        rigId: codes.rig === undefined ? null : required(rigIds, codes.rig),
        micrometerId: gauge(codes.micrometer),
        balanceId: gauge(codes.balance),
        ruleId: gauge(codes.rule),
        counterId: gauge(codes.counter),
      }
    }),
  )
}

async function storeEvaluations(
  to: BulkConnection,
  plans: readonly SpecimenWritePlan[],
  evaluations: readonly { readonly id: number; readonly row: SpecimenWritePlan['evaluations'][number] }[],
  specimenIds: ReadonlyMap<string, number>,
): Promise<void> {
  const snapshots = new Map(plans.flatMap((plan) => plan.snapshots).map((one) => [one.hash, one]))
  await to.insert(
    snapshot,
    [...snapshots.values()].map(({ body, createdAt, hash }) => ({ body, createdAt, hash })),
  )
  const snapshotIds = new Map<string, number>()
  for (const hash of new Set(evaluations.map(({ row }) => row.snapshotHash))) {
    const [found] = await to.rows<{ readonly id: number }>(
      'SELECT "id" FROM "InputSnapshot" WHERE "hash" = ?',
      hash,
    )
    if (found) snapshotIds.set(hash, found.id)
  }
  await to.insert(
    evaluation,
    evaluations.map(({ id, row: { result: _, snapshotHash, specimenClientId, ...row } }) => ({
      ...row,
      id,
      specimenId: required(specimenIds, specimenClientId),
      snapshotId: required(snapshotIds, snapshotHash),
    })),
  )
  await to.insert(
    result,
    evaluations.map(({ id, row }) => ({ ...row.result, evaluationId: id })),
  )
}

async function storeSummaries(to: BulkConnection, lots: readonly PlannedLot[]): Promise<void> {
  for (const { opens, plan } of lots) {
    const [first] = plan.summaries
    if (opens === undefined && first)
      await to.run(
        'DELETE FROM "LotSummary" WHERE "lotId" = ? AND "modelVersion" = ?',
        plan.lot.id,
        first.modelVersion,
      )
  }
  await to.insert(
    summary,
    lots.flatMap(({ plan }) => plan.summaries.map((row) => ({ ...row }))),
  )
}

async function storeSignals(to: BulkConnection, lots: readonly PlannedLot[]): Promise<void> {
  await to.insert(
    signal,
    lots.flatMap(({ plan, signalIds }) =>
      plan.signals.flatMap(({ characteristic, machineId, productId, raised, statistic }) =>
        raised.map((one): BulkRow => {
          const { members, ...row } = one
          return {
            productId,
            ...row,
            id: required(signalIds, one),
            characteristic,
            statistic,
            machineId: machineId ?? null,
            members: canonicalJson(members),
            state: 'open',
          }
        }),
      ),
    ),
  )
  for (const change of lots.flatMap(({ plan }) => plan.signals.flatMap((rows) => rows.changed)))
    await to.run(
      'UPDATE "Signal" SET "state" = ?, "evidenceChanged" = ?, "members" = ?, "departure" = ?, "raisedAt" = ?, "version" = "version" + 1 WHERE "id" = ?',
      change.state,
      change.evidenceChanged,
      canonicalJson(change.members),
      change.departure,
      to.instant(change.raisedAt),
      change.id,
    )
}

/** Marks on what rested on older evidence, and the state of a lot that was there already. */
async function settleLot(to: BulkConnection, plan: SpecimenWritePlan, isNew: boolean): Promise<void> {
  for (const id of plan.evidenceChanged.dispositions)
    await to.run('UPDATE "Disposition" SET "evidenceChanged" = ? WHERE "id" = ?', true, id)
  for (const id of plan.evidenceChanged.datasheetRevisions)
    await to.run('UPDATE "DatasheetRevision" SET "evidenceChanged" = ? WHERE "id" = ?', true, id)
  if (isNew) return
  const { evidenceChanged, id, measuredAt, state, version } = plan.lot
  const changed = await to.run(
    'UPDATE "Lot" SET "state" = ?, "evidenceChanged" = ?, "measuredAt" = ?, "version" = ? WHERE "id" = ? AND "version" = ?',
    state,
    evidenceChanged,
    measuredAt === undefined ? null : to.instant(measuredAt),
    version,
    id,
    version - 1,
  )
  if (changed !== 1)
    throw new Error(`lot ${id} is not at version ${version - 1}: something was written beside the ledger`)
}

function required<Key>(ids: ReadonlyMap<Key, number>, key: Key): number {
  const id = ids.get(key)
  if (id === undefined) throw new Error(`the plan names ${String(key)}, which is not stored`)
  return id
}
