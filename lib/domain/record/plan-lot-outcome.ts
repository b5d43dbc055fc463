import { type CharacteristicId, characteristicIds } from '../metrology/characteristics'
import { MODEL_VERSION } from '../metrology/model-version'
import { chartDepartures } from './chart-departures'
import type { ChartHistory, ChartPoint } from './chart-history'
import { chartValue } from './chart-value'
import { currentSheet } from './current-sheet'
import { isCharted, type LotState, stateAfterEntry } from './lot-state'
import { planProgress } from './plan-progress'
import { reconcileSignals } from './reconcile-signals'
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
export function planLotOutcome(state: LotWriteState, specimens: readonly SpecimenState[]): LotOutcome {
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
    },
    summaries: summaryRows(state, summaries),
    signals: state.charts.flatMap((chart) =>
      signalsOf(state, chart, lotState, summaries, specimens, changed),
    ),
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

function signalsOf(
  { lot }: LotWriteState,
  chart: ChartHistory,
  lotState: LotState,
  summaries: LotSummaries,
  specimens: readonly SpecimenState[],
  changed: boolean,
): readonly SignalRows[] {
  const others = chart.points.filter((point) => point.lotId !== lot.id)
  const value = chartValue(chart.statistic, summaries[chart.characteristic])
  const point: ChartPoint | undefined =
    value === undefined || !isCharted(lotState)
      ? undefined
      : {
          lotId: lot.id,
          code: lot.code,
          madeAt: lot.madeAt,
          value,
          evaluatedAt: Math.max(...specimens.map((one) => one.evaluation?.at ?? 0)),
        }
  const found = chartDepartures({ ...chart, points: point ? [...others, point] : others })
  const { raised, changed: changes } = reconcileSignals(found, chart.signals, changed ? lot.id : undefined)
  if (raised.length === 0 && changes.length === 0) return []
  return [
    {
      productId: lot.productId,
      characteristic: chart.characteristic,
      statistic: chart.statistic,
      raised,
      changed: changes,
    },
  ]
}
