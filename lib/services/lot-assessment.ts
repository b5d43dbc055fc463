import type { Tx } from '@/lib/data/database'
import { type KnownEquipment, type LoadedRevision, loadEquipment } from '@/lib/data/evaluation-facts'
import type { LotRow } from '@/lib/data/lots'
import { listMachineSignals, listProductSignals } from '@/lib/data/signals'
import { loadSpecimens, type StoredSpecimen } from '@/lib/data/specimens'
import { assessLot, type LotAssessment } from '@/lib/domain/record/assess-lot'
import { type CurrentSheet, currentSheet } from '@/lib/domain/record/current-sheet'
import type { EvaluationFacts } from '@/lib/domain/record/evaluation-facts'
import type { Act } from '@/lib/domain/record/reading'
import { resultsOf } from '@/lib/domain/record/result-row'
import { loadFacts } from './evaluation-facts'
import { type WorksFacts, worksFactsOf } from './get-works'
import { type SignalView, signalViews } from './signal-views'

export interface MeasuredSpecimen extends StoredSpecimen {
  readonly current: CurrentSheet
}

export interface LoadedLot {
  readonly works: WorksFacts
  readonly revision: LoadedRevision
  readonly facts: EvaluationFacts
  readonly equipment: KnownEquipment
  readonly specimens: readonly MeasuredSpecimen[]
  /** Signals whose pattern this lot belongs to, newest first. */
  readonly signals: readonly SignalView[]
  readonly assessment: LotAssessment
}

const equipmentOfAct = {
  section: ['micrometer'],
  weighing: ['balance', 'rule'],
  sounding: ['counter'],
} as const satisfies Record<Act, readonly string[]>

/** A lot with everything it is judged by, and the judgement as it stands now. */
export async function loadLot(tx: Tx, lot: LotRow): Promise<LoadedLot> {
  const equipment = await loadEquipment(tx)
  const { works: worksRow, revision, facts } = await loadFacts(tx, lot.specificationRevisionId, equipment)
  const works = worksFactsOf(worksRow)
  const specimens = (await loadSpecimens(tx, lot.id, equipment)).map((one) => ({
    ...one,
    current: currentSheet(one.readings),
  }))
  const rows = [
    ...(await listProductSignals(tx, lot.product.id)),
    ...(lot.machine ? await listMachineSignals(tx, lot.machine.id) : []),
  ]
    .filter((row) => row.members.includes(lot.id))
    .sort((a, b) => b.raisedAt - a.raisedAt || b.id - a.id)
  const signals = await signalViews(tx, rows, works)
  return {
    works,
    revision,
    facts,
    equipment,
    specimens,
    signals,
    assessment: assessLot({
      specification: facts.specification,
      specimens: specimens.flatMap(({ number, current, evaluation }) =>
        evaluation ? [{ number, sheet: current.sheet, results: resultsOf(evaluation.result) }] : [],
      ),
      openSignals: signals
        .filter((signal) => signal.state === 'open')
        .map(({ id, sentence }) => ({ id, sentence })),
      overdueEquipment: overdueCodes(specimens, equipment),
    }),
  }
}

/** Gauges whose calibration was overdue when they were used on these specimens. */
function overdueCodes(
  specimens: readonly MeasuredSpecimen[],
  { gauges }: Pick<KnownEquipment, 'gauges'>,
): readonly string[] {
  const dueAt = new Map(gauges.map((gauge) => [gauge.code, gauge.calibrationDueAt]))
  const overdue = specimens.flatMap(({ current, readings }) =>
    Object.entries(equipmentOfAct).flatMap(([act, kinds]) => {
      const source = current.sources[act as Act]
      const measuredAt = readings.find((one) => one.clientId === source)?.measuredAt
      return kinds.flatMap((kind) => {
        const code = current.equipment[kind]
        const due = code === undefined ? undefined : dueAt.get(code)
        return code !== undefined && due !== undefined && measuredAt !== undefined && due < measuredAt
          ? [code]
          : []
      })
    }),
  )
  return [...new Set(overdue)].sort()
}
