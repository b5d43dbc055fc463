import type { EvaluationContext } from '@/lib/domain/metrology/evaluation'
import type { EquipmentCodes, ReadingBody, ReadingFact, ReadingKind } from '@/lib/domain/record/reading'
import { type ResultRow, resultsOf } from '@/lib/domain/record/result-row'
import type { SpecimenState } from '@/lib/domain/record/write-state'
import type { Tx } from './database'
import type { KnownEquipment } from './evaluation-facts'

/** A reading as it is kept: what the fold needs, and who, when and why. */
export interface StoredReading extends ReadingFact {
  readonly id: number
  readonly hash: string
  readonly personId: number | undefined
  readonly measuredAt: number
  readonly recordedAt: number
  readonly reason: string
}

export interface StoredEvaluation {
  readonly id: number
  readonly number: number
  readonly modelVersion: string
  readonly cause: string
  readonly at: number
  readonly inputHash: string
  readonly snapshotBody: string
  readonly snapshotHash: string
  readonly result: ResultRow
}

/** A specimen with its readings in the order they were recorded, and the evaluation in force. */
export interface StoredSpecimen {
  readonly id: number
  readonly clientId: string
  readonly number: number
  readonly createdAt: number
  readonly readings: readonly StoredReading[]
  readonly evaluation: StoredEvaluation | undefined
}

const readingSelect = {
  id: true,
  clientId: true,
  kind: true,
  body: true,
  hash: true,
  personId: true,
  measuredAt: true,
  recordedAt: true,
  rigId: true,
  micrometerId: true,
  balanceId: true,
  ruleId: true,
  counterId: true,
  reason: true,
  supersedes: { select: { clientId: true } },
} as const

export const evaluationSelect = {
  id: true,
  specimenId: true,
  number: true,
  modelVersion: true,
  cause: true,
  at: true,
  inputHash: true,
  snapshot: { select: { body: true, hash: true } },
  result: { omit: { evaluationId: true } },
} as const

/** All specimens of a lot by their numbers. Throws when an evaluation in force has lost its results. */
export async function loadSpecimens(
  tx: Tx,
  lotId: number,
  equipment: KnownEquipment,
): Promise<readonly StoredSpecimen[]> {
  const rows = await loadReadings(tx, lotId, equipment)
  const ids = rows.flatMap((row) => row.currentEvaluationId ?? [])
  const evaluations =
    ids.length === 0
      ? []
      : await tx.evaluation.findMany({ where: { id: { in: ids } }, select: evaluationSelect })
  const current = new Map(evaluations.map((row) => [row.specimenId, storedEvaluation(row)]))
  return rows.map(({ currentEvaluationId: _, ...row }) => ({ ...row, evaluation: current.get(row.id) }))
}

/** The specimens of a lot with their readings alone. */
export async function loadReadings(
  tx: Tx,
  lotId: number,
  equipment: KnownEquipment,
): Promise<
  readonly (Omit<StoredSpecimen, 'evaluation'> & { readonly currentEvaluationId: number | null })[]
> {
  const rows = await tx.specimen.findMany({
    where: { lotId },
    orderBy: { number: 'asc' },
    select: {
      id: true,
      clientId: true,
      number: true,
      createdAt: true,
      currentEvaluationId: true,
      readings: { select: readingSelect, orderBy: { id: 'asc' } },
    },
  })
  const codes = codesOf(equipment)
  return rows.map(({ createdAt, readings, ...row }) => ({
    ...row,
    createdAt: createdAt.getTime(),
    readings: readings.map(
      ({
        body,
        kind,
        personId,
        measuredAt,
        recordedAt,
        supersedes,
        rigId,
        micrometerId,
        balanceId,
        ruleId,
        counterId,
        ...reading
      }): StoredReading => ({
        ...reading,
        // The guard of the table allows no other word.
        kind: kind as ReadingKind,
        values: (JSON.parse(body) as ReadingBody).values,
        personId: personId ?? undefined,
        measuredAt: measuredAt.getTime(),
        recordedAt: recordedAt.getTime(),
        equipment: defined({
          rig: codes.rig(rigId),
          micrometer: codes.gauge(micrometerId),
          balance: codes.gauge(balanceId),
          rule: codes.gauge(ruleId),
          counter: codes.gauge(counterId),
        }),
        ...(supersedes === null ? {} : { supersedes: supersedes.clientId }),
      }),
    ),
  }))
}

interface SelectedEvaluation {
  readonly id: number
  readonly number: number
  readonly modelVersion: string
  readonly cause: string
  readonly at: Date
  readonly inputHash: string
  readonly snapshot: { readonly body: string; readonly hash: string }
  readonly result: ResultRow | null
}

function storedEvaluation(row: SelectedEvaluation): StoredEvaluation {
  if (row.result === null) throw new Error(`evaluation ${row.id} has lost its results; recompute them`)
  return {
    id: row.id,
    number: row.number,
    modelVersion: row.modelVersion,
    cause: row.cause,
    at: row.at.getTime(),
    inputHash: row.inputHash,
    snapshotBody: row.snapshot.body,
    snapshotHash: row.snapshot.hash,
    result: row.result,
  }
}

/** What the plan of a further entry needs of a stored specimen. */
export const specimenStateOf = ({
  clientId,
  number,
  createdAt,
  readings,
  evaluation,
}: StoredSpecimen): SpecimenState => ({
  clientId,
  number,
  createdAt,
  readings,
  evaluation: evaluation && {
    number: evaluation.number,
    at: evaluation.at,
    inputHash: evaluation.inputHash,
    context: JSON.parse(evaluation.snapshotBody) as EvaluationContext,
    results: resultsOf(evaluation.result),
  },
})

function codesOf(equipment: KnownEquipment) {
  const rigCodes = new Map(equipment.rigs.map((rig) => [rig.id, rig.code]))
  const gaugeCodes = new Map(equipment.gauges.map((gauge) => [gauge.id, gauge.code]))
  return {
    rig: (id: number | null) => (id === null ? undefined : rigCodes.get(id)),
    gauge: (id: number | null) => (id === null ? undefined : gaugeCodes.get(id)),
  }
}

const defined = (codes: EquipmentCodes): EquipmentCodes =>
  Object.fromEntries(Object.entries(codes).filter(([, code]) => code !== undefined))

/** The specimen and lot that a reading belongs to, by the reading's client id. */
export const findReadingPlace = async (tx: Tx, clientId: string) => {
  const row = await tx.reading.findUnique({
    where: { clientId },
    select: {
      personId: true,
      specimen: { select: { clientId: true, number: true, lot: { select: { id: true, code: true } } } },
    },
  })
  return row
    ? {
        personId: row.personId ?? undefined,
        specimen: { clientId: row.specimen.clientId, number: row.specimen.number },
        lot: row.specimen.lot,
      }
    : undefined
}
