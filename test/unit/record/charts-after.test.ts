import { describe, expect, it } from 'vitest'
import type { ChartHistory, StoredSignal } from '@/lib/domain/record/chart-history'
import { chartsAfter, machineSignalsAfter } from '@/lib/domain/record/charts-after'
import type { RaisedSignal } from '@/lib/domain/record/reconcile-signals'
import type { SpecimenWritePlan } from '@/lib/domain/record/write-plan'
import type { LotWriteState } from '@/lib/domain/record/write-state'
import { deepFreeze } from '../../support/deep-freeze'
import { diameterAt } from '../../support/sheets'
import { diameterChart, entryOf, lotState, planned } from '../../support/write-states'

const fiveOf = (typed: string) =>
  [1, 2, 3, 4, 5].map((number) =>
    entryOf(number, {
      diameters: [1, 2, 3].flatMap((position) => [
        diameterAt(position, 'a', typed),
        diameterAt(position, 'b', typed),
      ]),
    }),
  )

const calm = [254.1e-6, 253.9e-6, 254.2e-6]

/** Ids 900, 901, … in the order in which they are asked for the first time. */
const ids = () => {
  const known = new Map<RaisedSignal, number>()
  return (raised: RaisedSignal): number => {
    const id = known.get(raised) ?? 900 + known.size
    known.set(raised, id)
    return id
  }
}

const chartAfter = (state: LotWriteState, plan: SpecimenWritePlan): ChartHistory => {
  const [chart] = chartsAfter(deepFreeze(state), deepFreeze(plan), ids())
  if (!chart) throw new Error('there is no chart')
  return chart
}

describe('chartsAfter', () => {
  const state = lotState({ charts: [diameterChart(calm)] })

  it('puts the lot on the chart as the store would give it back', () => {
    const plan = planned(state, fiveOf('0.2541'))
    const chart = chartAfter(state, plan)
    expect(chart.points).toHaveLength(4)
    expect(chart.points.at(-1)).toMatchObject({
      lotId: 354,
      code: 'LA-354',
      madeAt: state.lot.madeAt,
      machineId: 1,
      evaluatedAt: 5000,
      value: plan.summaries.find((one) => one.characteristic === 'diameter')?.mean,
    })
    expect(chart.signals).toEqual([])
  })

  it('leaves a lot that is not charted yet where it was: off', () => {
    expect(chartAfter(state, planned(state, fiveOf('0.2541').slice(0, 2))).points).toHaveLength(3)
  })

  it('gives what is raised its id, open and unanswered', () => {
    const plan = planned(state, fiveOf('0.2570'))
    expect(plan.signals.flatMap(({ raised }) => raised).length).toBeGreaterThan(0)
    const { signals } = chartAfter(state, plan)
    expect(signals[0]).toMatchObject({
      id: 900,
      rule: 'beyond-the-limits',
      lotId: 354,
      state: 'open',
      answered: false,
      evidenceChanged: false,
    })
  })

  it('planned on again, with nothing new, raises and changes nothing', () => {
    const plan = planned(state, fiveOf('0.2570'))
    const next: LotWriteState = lotState({
      lot: { ...state.lot, id: 355, code: 'LA-355', madeAt: state.lot.madeAt + 86_400_000 },
      charts: [chartAfter(state, plan)],
    })
    const calmAgain = planned(next, fiveOf('0.2541'))
    expect(calmAgain.signals.flatMap(({ changed, raised }) => [...changed, ...raised])).toEqual([])
  })

  it('lets a signal follow what the plan made of it, and keeps the others as they were', () => {
    const other: StoredSignal = {
      id: 70,
      limitSetId: 5,
      rule: 'beyond-the-limits',
      side: 'above',
      lotId: 354,
      members: [354],
      departure: 2e-6,
      state: 'open',
      answered: false,
      evidenceChanged: false,
      raisedAt: 3000,
    }
    const untouched: StoredSignal = { ...other, id: 71, lotId: 2, members: [2], state: 'no-longer-holds' }
    const held = lotState({ charts: [diameterChart(calm, { signals: [other, untouched] })] })
    const plan = planned(held, fiveOf('0.2541'))
    expect(plan.signals.flatMap(({ changed }) => changed)).toMatchObject([
      { id: 70, state: 'no-longer-holds' },
    ])
    expect(chartAfter(held, plan).signals).toEqual([{ ...other, state: 'no-longer-holds' }, untouched])
  })

  it('does not mistake a signal of the machine’s chart for the product’s', () => {
    const plan = planned(state, fiveOf('0.2570'))
    const ofMachine = {
      ...plan,
      signals: plan.signals.map((rows) => ({ ...rows, machineId: 1 })),
    }
    expect(chartAfter(state, ofMachine).signals).toEqual([])
  })
})

describe('machineSignalsAfter', () => {
  const raised: RaisedSignal = {
    limitSetId: 5,
    rule: 'nine-on-one-side',
    side: 'above',
    lotId: 9,
    members: [1, 2, 3, 4, 5, 6, 7, 8, 9],
    departure: 1.1,
    raisedAt: 1000,
  }
  const base = planned(lotState(), fiveOf('0.2541'))
  const rows = {
    productId: 7,
    characteristic: 'diameter',
    statistic: 'mean',
    raised: [raised],
    changed: [],
  } as const

  it('takes a first signal of a chart, and only those of this machine', () => {
    const plan = { ...base, signals: [{ ...rows, machineId: 1 }, { ...rows, machineId: 2 }, rows] }
    expect(machineSignalsAfter({ id: 1, products: [], signals: [] }, plan, ids())).toEqual([
      {
        characteristic: 'diameter',
        statistic: 'mean',
        signals: [{ ...raised, id: 900, state: 'open', answered: false, evidenceChanged: false }],
      },
    ])
  })

  it('adds to what the chart has, and leaves other charts alone', () => {
    const kept = { ...raised, id: 3, state: 'open', answered: false, evidenceChanged: false } as const
    const charts = [
      { characteristic: 'diameter', statistic: 'mean', signals: [kept] },
      { characteristic: 'diameter', statistic: 'within-lot-sd', signals: [kept] },
    ] as const
    const plan = { ...base, signals: [{ ...rows, machineId: 1, raised: [{ ...raised, lotId: 10 }] }] }
    const next = machineSignalsAfter({ id: 1, products: [], signals: charts }, plan, ids())
    expect(next.map(({ signals }) => signals.map(({ id }) => id))).toEqual([[3, 900], [3]])
  })
})
