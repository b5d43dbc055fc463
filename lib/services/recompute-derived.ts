import type { Actor } from '@/lib/access/actor'
import { permit } from '@/lib/access/permit'
import { database, type Tx } from '@/lib/data/database'
import {
  type EvaluationRecord,
  insertResults,
  listEvaluations,
  listMeasuredLots,
} from '@/lib/data/derived-rows'
import { loadEquipment } from '@/lib/data/evaluation-facts'
import { sha256 } from '@/lib/data/hash'
import { appendLedger } from '@/lib/data/ledger'
import { lockLot, lockRow } from '@/lib/data/locks'
import { getLotRow } from '@/lib/data/lots'
import { loadReadings, loadSpecimens, type StoredReading } from '@/lib/data/specimens'
import { replaceSummaries } from '@/lib/data/summaries'
import type { EvaluationContext } from '@/lib/domain/metrology/evaluation'
import { MODEL_VERSION } from '@/lib/domain/metrology/model-version'
import type { SpecimenSheet } from '@/lib/domain/metrology/sheet'
import { currentSheet } from '@/lib/domain/record/current-sheet'
import { evaluateStored, inputsOf } from '@/lib/domain/record/evaluate-stored'
import { summaryRows } from '@/lib/domain/record/plan-lot-outcome'
import { type ResultRow, resultRow, resultsOf } from '@/lib/domain/record/result-row'
import { summariseSpecimens } from '@/lib/domain/record/summarise-specimens'
import { askMachineRules, askRules } from './ask-rules'

export interface Recomputation {
  readonly lots: number
  /** Evaluations by this model that were computed again. */
  readonly evaluations: number
  /** Results that were missing and are stored again. */
  readonly restored: number
  /** Evaluations whose stored results are not what their readings come to: `lot, specimen, number`. */
  readonly differing: readonly string[]
  readonly signalsRaised: number
  readonly signalsChanged: number
}

/**
 * Computes everything derived again from readings and snapshots: results that are missing are stored, results
 * that are there are compared to the last bit, summaries are replaced, the rules are asked again. On a whole
 * database nothing changes but the ledger, which says that it was done.
 * @throws LedgerlineError not-permitted
 */
export async function recomputeDerived(
  actor: Actor | undefined,
  at: number = Date.now(),
): Promise<Recomputation> {
  permit(actor, 'backup.make')
  const lots = await listMeasuredLots(database().read)
  const counts = { evaluations: 0, restored: 0, signalsRaised: 0, signalsChanged: 0 }
  const differing: string[] = []
  // A lot a transaction, so that the bench goes on meanwhile.
  for (const { id } of lots) {
    const lot = await database().write((tx) => recomputeLot(tx, id))
    counts.evaluations += lot.evaluations
    counts.restored += lot.restored
    differing.push(...lot.differing)
  }
  for (const productId of new Set(lots.map((lot) => lot.productId))) {
    const signals = await database().write((tx) => recomputeSignals(tx, productId))
    counts.signalsRaised += signals.raised
    counts.signalsChanged += signals.changed
  }
  const outcome = { lots: lots.length, ...counts, differing }
  await database().write((tx) =>
    appendLedger(tx, {
      at,
      personId: actor.personId,
      verb: 'recompute-derived',
      subject: 'works',
      body: { ...outcome, modelVersion: MODEL_VERSION },
    }),
  )
  return outcome
}

async function recomputeLot(tx: Tx, lotId: number) {
  await lockLot(tx, lotId)
  const lot = await getLotRow(tx, lotId)
  const equipment = await loadEquipment(tx)
  const readings = await loadReadings(tx, lotId, equipment)
  const evaluations = (await listEvaluations(tx, lotId)).filter((one) => one.modelVersion === MODEL_VERSION)
  const missing: { evaluationId: number; result: ResultRow }[] = []
  const differing: string[] = []
  for (const evaluation of evaluations) {
    const specimen = readings.find((one) => one.id === evaluation.specimenId)
    const sheet = specimen && sheetOf(specimen.readings, evaluation)
    const result = sheet && resultRow(evaluateStored(sheet, evaluation.snapshotBody).results)
    if (result && evaluation.result === undefined) missing.push({ evaluationId: evaluation.id, result })
    else if (!result || !isSameRow(result, evaluation.result))
      differing.push(`${lot.code}, specimen ${specimen?.number ?? '?'}, evaluation ${evaluation.number}`)
  }
  await insertResults(tx, missing)
  const specimens = await loadSpecimens(tx, lotId, equipment)
  const summaries = summariseSpecimens(
    specimens.flatMap(({ number, evaluation }) =>
      evaluation ? [{ number, results: resultsOf(evaluation.result) }] : [],
    ),
  )
  await replaceSummaries(
    tx,
    lotId,
    MODEL_VERSION,
    summaryRows(
      { lot: { ...lot, productId: lot.product.id, machineId: lot.machine?.id ?? null } },
      summaries,
    ),
  )
  return { evaluations: evaluations.length, restored: missing.length, differing }
}

/**
 * The sheet that an evaluation was made from: readings only ever follow, so it is the sheet after as many of
 * them as give the evaluation's own hash.
 */
function sheetOf(
  readings: readonly StoredReading[],
  { snapshotBody, inputHash }: EvaluationRecord,
): SpecimenSheet | undefined {
  const context = JSON.parse(snapshotBody) as EvaluationContext
  return readings
    .map((_, index) => currentSheet(readings.slice(0, index + 1)).sheet)
    .find((sheet) => inputsOf(sheet, context, sha256).inputHash === inputHash)
}

const isSameRow = (a: ResultRow, b: ResultRow | undefined): boolean =>
  b !== undefined && (Object.keys(a) as (keyof ResultRow)[]).every((column) => a[column] === b[column])

async function recomputeSignals(tx: Tx, productId: number) {
  await lockRow(tx, 'Product', productId)
  const own = await askRules(tx, productId)
  const over = await askMachineRules(tx, productId)
  return { raised: own.raised + over.raised, changed: own.changed + over.changed }
}
