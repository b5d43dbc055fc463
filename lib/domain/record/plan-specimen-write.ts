import { MODEL_VERSION } from '../metrology/model-version'
import { ok, type Result, refused } from '../result'
import { type Admission, admitEntry } from './admit-entry'
import { canonicalJson } from './canonical-json'
import { currentSheet } from './current-sheet'
import { evaluateStored, inputsOf, type Sha256 } from './evaluate-stored'
import { contextFor } from './evaluation-facts'
import { type LotOutcome, planLotOutcome } from './plan-lot-outcome'
import type { ReadingBody, ReadingFact } from './reading'
import { resultRow, resultsOf } from './result-row'
import type {
  EvaluationRow,
  LedgerDraft,
  ReadingRow,
  SnapshotRow,
  SpecimenRow,
  SpecimenWritePlan,
} from './write-plan'
import type { LotWriteState, SpecimenEntry, SpecimenState } from './write-state'

export interface EntryActor {
  readonly personId: number
}

/** What one admitted entry adds to its specimen. */
interface Touched {
  readonly entry: SpecimenEntry
  readonly isNew: boolean
  readonly before: SpecimenState | undefined
  readonly after: SpecimenState
  readonly rows: {
    readonly reading: ReadingRow
    readonly snapshot: SnapshotRow | undefined
    readonly evaluation: EvaluationRow | undefined
  }
}

/**
 * Plans everything that entries for one lot write: readings, evaluations with their snapshots and results,
 * pointers, the lot's summaries and state, the signals of its charts, marks on what rested on older evidence,
 * and the ledger draft. Pure: two executors store the rows, and the same rows come from the same state.
 *
 * `at` is the time of storing, epoch milliseconds. Refused with the problems of every entry that can't be
 * taken; then nothing of the request is stored.
 */
export function planSpecimenWrite(
  state: LotWriteState,
  entries: readonly SpecimenEntry[],
  actor: EntryActor,
  at: number,
  sha256: Sha256,
): Result<SpecimenWritePlan> {
  const admissions = entries.map((entry) => ({ entry, admission: admitEntry(state, entry) }))
  const problems = admissions.flatMap(({ admission }) => (admission.ok ? [] : admission.problems))
  if (problems.length > 0) return refused(...problems)

  const admitted = admissions.flatMap(({ entry, admission }) =>
    admission.ok ? [{ entry, admission: admission.value }] : [],
  )
  const touched = admitted.flatMap(({ entry, admission }) =>
    admission.kind === 'already-there' ? [] : [touch(state, entry, admission, actor, at, sha256)],
  )
  const alreadyThere = admitted.flatMap(({ entry, admission }) =>
    admission.kind === 'already-there' ? [entry.specimen.number] : [],
  )
  const outcome = planLotOutcome(state, afterEntries(state, touched), firstMeasured(state, touched))
  return ok({
    lot: outcome.lot,
    specimens: touched.flatMap(({ isNew, after }) => (isNew ? [specimenRow(state, after, at)] : [])),
    readings: touched.map(({ rows }) => rows.reading),
    snapshots: distinct(touched.flatMap(({ rows }) => rows.snapshot ?? [])),
    evaluations: touched.flatMap(({ rows }) => rows.evaluation ?? []),
    summaries: outcome.summaries,
    signals: outcome.signals,
    evidenceChanged: outcome.evidenceChanged,
    ledger: touched.length === 0 ? undefined : ledgerDraft(state, touched, outcome, actor, at),
    alreadyThere,
  })
}

function touch(
  state: LotWriteState,
  entry: SpecimenEntry,
  admission: Exclude<Admission, { kind: 'already-there' }>,
  actor: EntryActor,
  at: number,
  sha256: Sha256,
): Touched {
  const { specimen, reading } = entry
  const before = admission.kind === 'further' ? admission.specimen : undefined
  const clientId = before?.clientId ?? specimen.clientId
  const fact: ReadingFact = {
    clientId: reading.clientId,
    kind: reading.kind,
    values: reading.values,
    equipment: reading.equipment,
    ...(reading.supersedes === undefined ? {} : { supersedes: reading.supersedes }),
  }
  const readings = [...(before?.readings ?? []), fact]
  const current = currentSheet(readings)
  const context = contextFor(state.facts, current, before?.evaluation?.context)
  const inputs = inputsOf(current.sheet, context, sha256)
  const changed = inputs.inputHash !== before?.evaluation?.inputHash
  const evaluation: EvaluationRow | undefined = changed
    ? {
        specimenClientId: clientId,
        number: (before?.evaluation?.number ?? 0) + 1,
        modelVersion: MODEL_VERSION,
        snapshotHash: inputs.snapshot.hash,
        inputHash: inputs.inputHash,
        cause: before?.evaluation === undefined ? 'first' : 'superseded',
        at,
        result: resultRow(evaluateStored(current.sheet, inputs.snapshot.body).results),
      }
    : undefined
  const body = canonicalJson({ format: 1, values: reading.values } satisfies ReadingBody)
  return {
    entry,
    isNew: before === undefined,
    before,
    after: {
      clientId,
      number: specimen.number,
      createdAt: before?.createdAt ?? at,
      readings,
      evaluation: evaluation
        ? {
            number: evaluation.number,
            at,
            inputHash: evaluation.inputHash,
            context,
            results: resultsOf(evaluation.result),
          }
        : before?.evaluation,
    },
    rows: {
      reading: {
        clientId: reading.clientId,
        specimenClientId: clientId,
        kind: reading.kind,
        body,
        hash: sha256(body),
        personId: reading.personId ?? actor.personId,
        measuredAt: reading.measuredAt,
        recordedAt: at,
        equipment: reading.equipment,
        ...(reading.supersedes === undefined ? {} : { supersedes: reading.supersedes }),
        reason: reading.reason ?? '',
      },
      snapshot: changed ? { ...inputs.snapshot, createdAt: at } : undefined,
      evaluation,
    },
  }
}

/** When the first reading of the lot was taken, as far as anything has been read. */
function firstMeasured(state: LotWriteState, touched: readonly Touched[]): number | undefined {
  const times = [state.lot.measuredAt, ...touched.map(({ entry }) => entry.reading.measuredAt)]
  const known = times.flatMap((at) => at ?? [])
  return known.length === 0 ? undefined : Math.min(...known)
}

/** The specimens of the lot as they stand after the entries. */
function afterEntries(state: LotWriteState, touched: readonly Touched[]): readonly SpecimenState[] {
  const after = new Map(touched.map((one) => [one.after.number, one.after]))
  const kept = state.specimens.map((one) => after.get(one.number) ?? one)
  const fresh = touched.flatMap((one) => (one.isNew ? [one.after] : []))
  return [...kept, ...fresh].sort((a, b) => a.number - b.number)
}

/** Where the specimen was taken, as the traveller says it: `head`, `tail`, or metres. */
function specimenRow(state: LotWriteState, specimen: SpecimenState, at: number): SpecimenRow {
  const { takenAt } = currentSheet(specimen.readings).sheet
  const place = takenAt === undefined ? '' : 'end' in takenAt ? takenAt.end : String(takenAt.metres)
  return {
    clientId: specimen.clientId,
    lotId: state.lot.id,
    number: specimen.number,
    takenAt: place,
    createdAt: at,
  }
}

const distinct = (snapshots: readonly SnapshotRow[]): readonly SnapshotRow[] => [
  ...new Map(snapshots.map((one) => [one.hash, one])).values(),
]

function ledgerDraft(
  state: LotWriteState,
  touched: readonly Touched[],
  outcome: LotOutcome,
  actor: EntryActor,
  at: number,
): LedgerDraft {
  const corrected = touched.some(({ entry }) => entry.reading.supersedes !== undefined)
  return {
    at,
    personId: actor.personId,
    verb: corrected ? 'supersede-reading' : 'record-specimens',
    subject: `lot ${state.lot.code}`,
    body: {
      lot: state.lot.code,
      state: { from: state.lot.state, to: outcome.lot.state },
      specimens: touched.map(({ entry, after, rows }) => ({
        number: after.number,
        specimen: after.clientId,
        reading: entry.reading.clientId,
        kind: entry.reading.kind,
        hash: rows.reading.hash,
        supersedes: entry.reading.supersedes,
        reason: entry.reading.reason,
        evaluation: rows.evaluation && {
          number: rows.evaluation.number,
          inputHash: rows.evaluation.inputHash,
          cause: rows.evaluation.cause,
        },
      })),
      signals: outcome.signals.flatMap((chart) => [
        ...chart.raised.map((one) => ({
          characteristic: chart.characteristic,
          statistic: chart.statistic,
          rule: one.rule,
          side: one.side,
          lotId: one.lotId,
          state: 'raised',
        })),
        ...chart.changed.map((one) => ({ id: one.id, state: one.state })),
      ]),
      evidenceChanged: outcome.evidenceChanged,
    },
  }
}
