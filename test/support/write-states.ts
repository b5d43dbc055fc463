import { createHash } from 'node:crypto'
import type { ChartHistory, FrozenLimits } from '@/lib/domain/record/chart-history'
import type { EvaluationFacts } from '@/lib/domain/record/evaluation-facts'
import { planSpecimenWrite } from '@/lib/domain/record/plan-specimen-write'
import { resultsOf } from '@/lib/domain/record/result-row'
import type { SpecimenWritePlan } from '@/lib/domain/record/write-plan'
import type { LotWriteState, SpecimenEntry, SpecimenState } from '@/lib/domain/record/write-state'
import { steelEquipment, steelSheet } from './sheets'
import { steelContext } from './steel-context'

export const sha256 = (text: string): string => createHash('sha256').update(text, 'utf8').digest('hex')

/** What the works of `steelContext` knows. */
export function steelFacts(): EvaluationFacts {
  const { gravity, air, material, specification, rig, weights, micrometer, balance, rule, counter } =
    steelContext()
  return {
    gravity,
    air,
    material,
    specification,
    rigs: rig ? [rig] : [],
    weights,
    gauges: [micrometer, balance, rule, counter].flatMap((one) => one ?? []),
  }
}

export const lotState = (change: Partial<LotWriteState> = {}): LotWriteState => ({
  lot: {
    id: 354,
    code: 'LA-354',
    state: 'measuring',
    version: 1,
    evidenceChanged: false,
    productId: 7,
    machineId: 1,
    madeAt: Date.UTC(2026, 10, 25),
  },
  facts: steelFacts(),
  specimens: [],
  charts: [],
  datasheetRevisions: [],
  ...change,
})

export const entryOf = (
  number: number,
  sheet: Partial<ReturnType<typeof steelSheet>> = {},
  change: Partial<SpecimenEntry['reading']> = {},
): SpecimenEntry => ({
  specimen: { clientId: `s${number}`, number },
  reading: {
    clientId: `r${number}`,
    kind: 'sheet',
    values: steelSheet(sheet),
    equipment: steelEquipment,
    measuredAt: 1000,
    ...change,
  },
})

/** The plan, or the first refusal as an error: for tests that expect it to be taken. */
export function planned(
  state: LotWriteState,
  entries: readonly SpecimenEntry[],
  at = 5000,
): SpecimenWritePlan {
  const plan = planSpecimenWrite(state, entries, { personId: 3 }, at, sha256)
  if (!plan.ok) throw new Error(plan.problems.map((one) => one.message).join(' '))
  return plan.value
}

/** The state after a plan was stored, as the store would read it back. */
export function stored(
  state: LotWriteState,
  entries: readonly SpecimenEntry[],
  plan: SpecimenWritePlan,
): LotWriteState {
  const specimens = new Map(state.specimens.map((one): [number, SpecimenState] => [one.number, one]))
  for (const entry of entries) {
    const { number } = entry.specimen
    const before = specimens.get(number)
    const reading = plan.readings.find((one) => one.clientId === entry.reading.clientId)
    if (!reading) continue
    const evaluation = plan.evaluations.find((one) => one.specimenClientId === reading.specimenClientId)
    specimens.set(number, {
      clientId: reading.specimenClientId,
      number,
      createdAt: before?.createdAt ?? reading.recordedAt,
      readings: [
        ...(before?.readings ?? []),
        {
          clientId: reading.clientId,
          kind: reading.kind,
          values: JSON.parse(reading.body).values,
          equipment: reading.equipment,
          supersedes: reading.supersedes,
        },
      ],
      evaluation: evaluation
        ? {
            number: evaluation.number,
            at: evaluation.at,
            inputHash: evaluation.inputHash,
            context: JSON.parse(
              plan.snapshots.find((one) => one.hash === evaluation.snapshotHash)?.body ?? '',
            ),
            results: resultsOf(evaluation.result),
          }
        : before?.evaluation,
    })
  }
  const { state: next, version, evidenceChanged } = plan.lot
  return {
    ...state,
    lot: { ...state.lot, state: next, version, evidenceChanged },
    specimens: [...specimens.values()].sort((a, b) => a.number - b.number),
  }
}

export const limits = (change: Partial<FrozenLimits> = {}): FrozenLimits => ({
  id: 5,
  number: 1,
  centre: 254e-6,
  sigma: 0.6e-6,
  lower: 252.2e-6,
  upper: 255.8e-6,
  effectiveFrom: 0,
  frozenAt: 100,
  leftOut: [],
  ...change,
})

/** A diameter chart of lots 1, 2, … with these means, a day apart, the last one the day before LA-354. */
export const diameterChart = (
  means: readonly number[],
  change: Partial<ChartHistory> = {},
): ChartHistory => ({
  characteristic: 'diameter',
  statistic: 'mean',
  points: means.map((value, index) => ({
    lotId: index + 1,
    code: `LA-${index + 1}`,
    madeAt: Date.UTC(2026, 10, 25) - (means.length - index) * 86_400_000,
    value,
    evaluatedAt: 200 + index,
  })),
  limitSets: [limits()],
  signals: [],
  ...change,
})
