import { describe, expect, it } from 'vitest'
import { driftBarLines } from '@/lib/domain/record/drift-bar-lines'
import { type MachineDriftChart, machineChartInput } from '@/lib/domain/record/machine-chart-input'
import type { DriftLimits, DriftLot } from '@/lib/domain/record/staff-chart-input'
import { limits } from '../../support/write-states'

const DAY = 86_400_000

const lot = (lotId: number, productId: number, mean: number, more: Partial<DriftLot> = {}): DriftLot => ({
  lotId,
  code: `L-${lotId}`,
  madeAt: lotId * DAY,
  label: `day ${lotId}`,
  productId,
  productName: `Product ${productId}`,
  targets: { 'diameter mean': productId * 1e-4 },
  materials: {},
  die: 'Die 7',
  machine: 'Machine 1',
  setting: '',
  specificationNumber: 1,
  summaries: { diameter: { n: 5, mean, m2: 0, min: mean, max: mean, uCommon: 0, uMean: 0 } },
  detail: `day ${lotId}, S. Imrie`,
  ...more,
})

const set = (productId: number, change: Partial<DriftLimits> = {}): DriftLimits => ({
  ...limits({ id: productId, centre: productId * 1e-4, sigma: productId * 1e-7 }),
  productId,
  provisional: false,
  detail: 'frozen',
  ...change,
})

const chart = (change: Partial<MachineDriftChart> = {}): MachineDriftChart => ({
  characteristic: 'diameter',
  statistic: 'mean',
  limitSets: [set(2), set(3)],
  signals: [],
  machineSignals: [],
  ...change,
})

const staveOf = (lots: readonly DriftLot[], one: MachineDriftChart = chart()) => {
  const [stave] = machineChartInput({ title: 'Machine 1', decimal: 'point', lots, charts: [one] }).staves
  if (!stave) throw new Error('no stave')
  return stave
}

describe('machineChartInput(facts)', () => {
  it('puts each lot where its own product’s centre and σ put it', () => {
    const stave = staveOf([lot(1, 2, 2e-4 + 1e-7), lot(2, 3, 3e-4 - 6e-7), lot(3, 2, 2e-4)])
    expect(stave.values.map((value) => value?.toFixed(9))).toEqual([
      '0.500000000',
      '-2.000000000',
      '0.000000000',
    ])
    expect(stave.limitSets).toMatchObject([{ fromIndex: 0, toIndex: 2, centre: 0, sigma: 1 }])
  })

  it('moves the centre along with a target that a specification moved', () => {
    const moved = lot(2, 2, 2.1e-4, { targets: { 'diameter mean': 2.1e-4 } })
    const stave = staveOf([lot(1, 2, 2e-4), moved], chart({ limitSets: [set(2, { target: 2e-4 })] }))
    expect(stave.values[1]).toBeCloseTo(0, 9)
  })

  it('draws a product without limits as open notes in the relative spread of the lots, once there are enough', () => {
    const wobble = (index: number) => (index % 2 === 0 ? 1 : -1) * 1e-3
    const many = Array.from({ length: 20 }, (_, index) => lot(index + 1, 2, 2e-4 * (1 + wobble(index))))
    const fresh = lot(21, 5, 5e-4 * 1.001)
    const stave = staveOf([...many, fresh])
    // Neighbours are 0.2 % apart: σ = 0.2 % / d2(2).
    expect(stave.values[20]).toBeCloseTo(0.001 / (0.002 / (2 / Math.sqrt(Math.PI))), 9)
    expect(stave.leftOut).toEqual([20])
    expect(staveOf([...many.slice(0, 5), fresh]).values[5]).toBeUndefined()
  })

  it('draws no limits while no product has any', () => {
    expect(staveOf([lot(1, 2, 2e-4)], chart({ limitSets: [] })).limitSets).toEqual([])
  })

  it('shows lots beyond their limits, the machine’s runs, and runs of one product while they are open', () => {
    const signal = { id: 1, side: 'above', state: 'open', sentence: '', members: [1, 99] } as const
    const stave = staveOf(
      [lot(1, 2, 2e-4), lot(2, 3, 3e-4)],
      chart({
        signals: [
          { ...signal, rule: 'beyond-the-limits' },
          { ...signal, id: 2, rule: 'nine-on-one-side', state: 'answered' },
          { ...signal, id: 4, rule: 'nine-on-one-side' },
        ],
        machineSignals: [{ ...signal, id: 3, rule: 'nine-on-one-side', members: [2, 1] }],
      }),
    )
    expect(stave.signals.map(({ id, members }) => [id, members])).toEqual([
      [1, [0]],
      [4, [0]],
      [3, [0, 1]],
    ])
  })

  it('names the product before what changed, only where there are several', () => {
    const lots = [lot(1, 2, 2e-4), lot(2, 3, 3e-4), lot(3, 2, 2e-4, { die: 'Die 8' })]
    const reasons = (some: readonly DriftLot[]) =>
      machineChartInput({ title: '', decimal: 'point', lots: some, charts: [chart()] }).barLines.map(
        ({ atIndex, kind, reason }) => [atIndex, kind, reason],
      )
    expect(reasons(lots)).toEqual([[2, 'die', 'Product 2: Die 8 in']])
    expect(reasons([lots[0], lots[2]].flatMap((one) => one ?? []))).toEqual([[1, 'die', 'Die 8 in']])
  })
})

describe('driftBarLines(lots, charts)', () => {
  it('compares a lot with the one before of its product: spools, coils, resin, settings, revisions, limits', () => {
    const lots = [
      lot(1, 2, 2e-4, { materials: { core: 'C-1', 'wrap-1': 'S-1' } }),
      lot(2, 3, 3e-4, { materials: { core: 'C-9' } }),
      lot(3, 2, 2e-4, { materials: { core: 'C-1', 'wrap-1': 'S-2' }, setting: 'slow' }),
      lot(4, 2, 2e-4, { materials: { core: 'C-1' }, specificationNumber: 2 }),
    ]
    const late = set(2, { effectiveFrom: 4 * DAY, number: 3, detail: 'day 9, M. Orrin' })
    expect(driftBarLines(lots, [{ limitSets: [late] }])).toEqual([
      { atIndex: 2, kind: 'spool', reason: 'S-2 in', detail: 'day 3, S. Imrie' },
      { atIndex: 2, kind: 'setting', reason: 'slow', detail: 'day 3, S. Imrie' },
      { atIndex: 3, kind: 'spool', reason: 'no spool named', detail: 'day 4, S. Imrie' },
      { atIndex: 3, kind: 'setting', reason: 'usual setting', detail: 'day 4, S. Imrie' },
      { atIndex: 3, kind: 'specification', reason: 'specification revision 2', detail: 'day 4, S. Imrie' },
      { atIndex: 3, kind: 'limit-set', reason: 'limit set 3', detail: 'day 9, M. Orrin' },
    ])
  })
})
