import { sha256 } from '@/lib/data/hash'
import type { CharacteristicId } from '@/lib/domain/metrology/characteristics'
import type {
  BudgetLine,
  Correction,
  EvaluationContext,
  SpecimenEvaluation,
} from '@/lib/domain/metrology/evaluation'
import { MODEL_VERSION } from '@/lib/domain/metrology/model-version'
import type { SpecimenSheet } from '@/lib/domain/metrology/sheet'
import type { SpecimenAssessment } from '@/lib/domain/record/assess-lot'
import { evaluateStored, inputsOf } from '@/lib/domain/record/evaluate-stored'
import type { Act, EquipmentCodes, ReadingKind, SheetPart } from '@/lib/domain/record/reading'
import { resultRow, resultsOf } from '@/lib/domain/record/result-row'
import type { MeasuredSpecimen } from './lot-assessment'

export interface ReadingView {
  readonly clientId: string
  readonly kind: ReadingKind
  readonly values: SheetPart
  readonly equipment: EquipmentCodes
  readonly person: string | undefined
  readonly personId: number | undefined
  readonly measuredAt: number
  readonly recordedAt: number
  /** Client id of the reading this one corrects, with the reason. */
  readonly supersedes: string | undefined
  readonly reason: string
  /** Client id of the reading that corrects this one. */
  readonly supersededBy: string | undefined
}

export interface SpecimenView {
  readonly number: number
  readonly sheet: SpecimenSheet
  readonly equipment: EquipmentCodes
  /** Client id of the reading that each act comes from. */
  readonly sources: Readonly<Partial<Record<Act, string>>>
  /** By act: the newest reading of its chain, the one that a correction has to name. */
  readonly correctable: Readonly<Partial<Record<Act, string>>>
  readonly readings: readonly ReadingView[]
  readonly results: SpecimenEvaluation['results']
  readonly budgets: Readonly<Partial<Record<CharacteristicId, readonly BudgetLine[]>>>
  readonly corrections: readonly Correction[]
  readonly steps: Readonly<Record<string, number>>
  readonly missing: readonly string[]
  readonly assessment: SpecimenAssessment | undefined
  readonly evaluation:
    | {
        readonly number: number
        readonly cause: string
        readonly at: number
        readonly modelVersion: string
        readonly inputHash: string
        /**
         * Computed again just now from the stored texts: inputs and results equal to the last bit. Undefined
         * for an evaluation by an older model, which this one can't compute.
         */
        readonly verified: boolean | undefined
        /** What it rests on besides the sheet. */
        readonly context: EvaluationContext
      }
    | undefined
}

/** A specimen with its readings, and its evaluation in force computed again from what is stored. */
export function specimenView(
  { number, readings, current, evaluation }: MeasuredSpecimen,
  assessment: SpecimenAssessment | undefined,
  nameOf: (id: number | undefined) => string | undefined,
): SpecimenView {
  const computed = evaluation && evaluateStored(current.sheet, evaluation.snapshotBody)
  const newerOf = new Map(
    readings.flatMap((one) => (one.supersedes ? [[one.supersedes, one.clientId]] : [])) as [string, string][],
  )
  return {
    number,
    sheet: current.sheet,
    equipment: current.equipment,
    sources: current.sources,
    correctable: Object.fromEntries(
      Object.entries(current.sources).map(([act, source]) => [act, newestOf(source, newerOf)]),
    ),
    readings: readings.map((one) => ({
      clientId: one.clientId,
      kind: one.kind,
      values: one.values,
      equipment: one.equipment,
      person: nameOf(one.personId),
      personId: one.personId,
      measuredAt: one.measuredAt,
      recordedAt: one.recordedAt,
      supersedes: one.supersedes,
      reason: one.reason,
      supersededBy: newerOf.get(one.clientId),
    })),
    results: evaluation ? resultsOf(evaluation.result) : {},
    budgets: computed?.budgets ?? {},
    corrections: computed?.corrections ?? [],
    steps: computed?.steps ?? {},
    missing: computed?.missing ?? [],
    assessment,
    evaluation: evaluation && {
      number: evaluation.number,
      cause: evaluation.cause,
      at: evaluation.at,
      modelVersion: evaluation.modelVersion,
      inputHash: evaluation.inputHash,
      verified:
        computed === undefined || evaluation.modelVersion !== MODEL_VERSION
          ? undefined
          : isVerified({ current, evaluation }, computed),
      context: JSON.parse(evaluation.snapshotBody) as EvaluationContext,
    },
  }
}

/** Follows corrections of corrections to the newest one. */
function newestOf(clientId: string, newerOf: ReadonlyMap<string, string>): string {
  const newer = newerOf.get(clientId)
  return newer === undefined ? clientId : newestOf(newer, newerOf)
}

function isVerified(
  {
    current,
    evaluation,
  }: Pick<MeasuredSpecimen, 'current'> & {
    readonly evaluation: NonNullable<MeasuredSpecimen['evaluation']>
  },
  computed: SpecimenEvaluation,
): boolean {
  const context = JSON.parse(evaluation.snapshotBody) as EvaluationContext
  const inputs = inputsOf(current.sheet, context, sha256)
  const again = resultRow(computed.results)
  return (
    inputs.inputHash === evaluation.inputHash &&
    inputs.snapshot.hash === evaluation.snapshotHash &&
    (Object.keys(again) as (keyof typeof again)[]).every(
      (column) => again[column] === evaluation.result[column],
    )
  )
}
