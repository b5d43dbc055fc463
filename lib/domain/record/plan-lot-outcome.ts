import { type CharacteristicId, characteristicIds } from '../metrology/characteristics'
import { MODEL_VERSION } from '../metrology/model-version'
import { currentSheet } from './current-sheet'
import { type LotState, stateAfterEntry } from './lot-state'
import { planProgress } from './plan-progress'
import { planSignals } from './plan-signals'
import { type LotSummaries, summariseSpecimens } from './summarise-specimens'
import type { LotRowChange, SignalRows, SpecimenWritePlan, SummaryRow } from './write-plan'
import type { LotWriteState, SpecimenState } from './write-state'

export interface LotOutcome {
  readonly lot: LotRowChange
  readonly summaries: readonly SummaryRow[]
  readonly signals: readonly SignalRows[]
  readonly evidenceChanged: SpecimenWritePlan['evidenceChanged']
}

/** What a lot comes to when its specimens stand as given: state, summaries, signals, marks on older evidence. */
export function planLotOutcome(
  state: LotWriteState,
  specimens: readonly SpecimenState[],
  measuredAt: number | undefined = state.lot.measuredAt,
): LotOutcome {
  const summaries = summariseSpecimens(
    specimens.flatMap(({ number, evaluation }) =>
      evaluation ? [{ number, results: evaluation.results }] : [],
    ),
  )
  const lotState = stateOf(state, specimens)
  const changed = evaluationsDiffer(state.specimens, specimens)
  const decided = state.disposition !== undefined
  return {
    lot: {
      id: state.lot.id,
      state: lotState,
      // A lot that comes back from rework is judged anew: its old decision is no longer what it stands by.
      evidenceChanged: lotState === 'to-decide' ? false : state.lot.evidenceChanged || (decided && changed),
      version: state.lot.version + 1,
      ...(measuredAt === undefined ? {} : { measuredAt }),
    },
    summaries: summaryRows(state, summaries),
    signals: planSignals(state, { lotState, summaries, specimens, changed }),
    evidenceChanged: {
      dispositions:
        changed && state.disposition && !state.disposition.evidenceChanged ? [state.disposition.id] : [],
      datasheetRevisions: changed ? state.datasheetRevisions : [],
    },
  }
}

function stateOf(state: LotWriteState, specimens: readonly SpecimenState[]): LotState {
  const { plan } = state.facts.specification
  const progress = planProgress(
    plan,
    specimens.map(({ number, readings }) => ({ number, sheet: currentSheet(readings).sheet })),
  )
  const since = state.disposition?.decidedAt
  const anew = since === undefined ? [] : specimens.filter((one) => one.createdAt > since)
  return stateAfterEntry(state.lot.state, {
    planComplete: progress.complete,
    measuredAnew: anew.length >= plan.specimens,
  })
}

const evaluationsDiffer = (before: readonly SpecimenState[], after: readonly SpecimenState[]): boolean =>
  after.some(
    ({ number, evaluation }) =>
      before.find((one) => one.number === number)?.evaluation?.inputHash !== evaluation?.inputHash,
  )

export const summaryRows = (
  { lot }: Pick<LotWriteState, 'lot'>,
  summaries: LotSummaries,
): readonly SummaryRow[] =>
  characteristicIds.flatMap((characteristic: CharacteristicId) => {
    const summary = summaries[characteristic]
    return summary
      ? [
          {
            ...summary,
            lotId: lot.id,
            characteristic,
            modelVersion: MODEL_VERSION,
            productId: lot.productId,
            machineId: lot.machineId,
            madeAt: lot.madeAt,
          },
        ]
      : []
  })
