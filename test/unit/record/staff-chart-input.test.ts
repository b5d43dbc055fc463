import { describe, expect, it } from 'vitest'
import {
  type DriftChart,
  type DriftFacts,
  type DriftLimits,
  type DriftLot,
  staffChartInput,
} from '@/lib/domain/record/staff-chart-input'
import { deepFreeze } from '@/test/support/deep-freeze'
import { steelContext } from '@/test/support/steel-context'

const day = (index: number): number => Date.UTC(2026, 6, 1 + index, 8)

const lot = (index: number, more: Partial<DriftLot> = {}): DriftLot => ({
  lotId: 900 + index,
  code: `LA-${301 + index}`,
  madeAt: day(index),
  label: `${1 + index} Jul`,
  productId: 7,
  productName: 'Larch 254',
  targets: {},
  materials: {},
  die: 'Die 7',
  machine: 'Machine 1',
  setting: '',
  specificationNumber: 1,
  summaries: {
    diameter: { n: 5, mean: 254e-6 + index * 1e-9, m2: 4e-14, min: 0, max: 0, uCommon: 0, uMean: 0 },
    closure: { n: 1, mean: 0.0004, m2: 0, min: 0, max: 0, uCommon: 0, uMean: 0 },
  },
  detail: `${1 + index} Jul, T. Aldous`,
  ...more,
})

const limits = (more: Partial<DriftLimits> = {}): DriftLimits => ({
  id: 11,
  number: 1,
  centre: 254e-6,
  sigma: 0.4e-6,
  lower: 252.8e-6,
  upper: 255.2e-6,
  effectiveFrom: day(2),
  frozenAt: day(30),
  leftOut: [],
  provisional: false,
  detail: '2 Sep, M. Orrin',
  ...more,
})

const diameter = (more: Partial<DriftChart> = {}): DriftChart => ({
  characteristic: 'diameter',
  statistic: 'mean',
  limitSets: [],
  signals: [],
  ...more,
})

const facts = (more: Partial<DriftFacts> = {}): DriftFacts => ({
  title: 'Larch 254',
  lots: Array.from({ length: 8 }, (_, index) => lot(index)),
  charts: [diameter()],
  specification: undefined,
  units: { diameter: 'mm', force: 'N', mass: 'mg' },
  decimal: 'point',
  ...more,
})

describe('staffChartInput', () => {
  it('shows lot means in display units, a gap where a lot has no value, a spread of two specimens or more', () => {
    const input = staffChartInput(
      deepFreeze(
        facts({
          lots: [lot(0), lot(1, { summaries: {} }), lot(2)],
          charts: [
            diameter(),
            diameter({ statistic: 'within-lot-sd' }),
            diameter({ characteristic: 'closure' }),
            diameter({ characteristic: 'closure', statistic: 'within-lot-sd' }),
          ],
        }),
      ),
    )
    const [mean, spread, closure, closureSpread] = input.staves
    expect(mean).toMatchObject({
      key: 'diameter mean',
      label: 'Diameter',
      unitLabel: 'µm, lot means',
      oneSided: false,
    })
    expect(mean?.values[0]).toBeNear(254, { absolute: 1e-9 })
    expect(mean?.values[1]).toBeUndefined()
    // √(4·10⁻¹⁴ / 4) m = 0.1 µm.
    expect(spread?.values[0]).toBeNear(0.1, { absolute: 1e-9 })
    expect(spread).toMatchObject({ oneSided: true, decimals: 3, unitLabel: 'µm, standard deviation' })
    expect(closure).toMatchObject({ signed: true })
    expect(closure?.values[0]).toBeNear(0.04, { absolute: 1e-9 })
    expect(closureSpread?.values).toEqual([undefined, undefined, undefined])
  })

  it('draws each limit set over the lots it judges, in display units', () => {
    const [stave] = staffChartInput(
      facts({
        charts: [
          diameter({
            limitSets: [
              limits({ provisional: true }),
              limits({ id: 12, number: 2, centre: 254.5e-6, effectiveFrom: day(5), lower: undefined }),
            ],
          }),
        ],
      }),
    ).staves
    expect(
      stave?.limitSets.map(({ fromIndex, toIndex, number, provisional }) => [
        fromIndex,
        toIndex,
        number,
        provisional,
      ]),
    ).toEqual([
      [2, 4, 1, true],
      [5, 7, 2, false],
    ])
    expect(stave?.limitSets[0]?.sigma).toBeNear(0.4, { absolute: 1e-9 })
    expect(stave?.limitSets[0]?.lower).toBeNear(252.8, { absolute: 1e-9 })
    expect(stave?.limitSets[1]?.lower).toBeUndefined()
  })

  it('marks lots that the set judging them left out of its baseline', () => {
    const [stave] = staffChartInput(
      facts({ charts: [diameter({ limitSets: [limits({ effectiveFrom: day(0), leftOut: [901, 903] })] })] }),
    ).staves
    expect(stave?.leftOut).toEqual([1, 3])
  })

  it('draws tolerance lines of the specification’s means, and none for a spread or a ratio', () => {
    const { specification: body } = steelContext()
    const input = staffChartInput(
      facts({
        specification: { number: 6, body },
        charts: [
          diameter(),
          diameter({ statistic: 'within-lot-sd' }),
          diameter({ characteristic: 'closure' }),
        ],
      }),
    )
    expect(input.staves[0]?.tolerance).toEqual({
      lower: expect.closeTo(251, 9),
      upper: expect.closeTo(257, 9),
      label: 'specification revision 6',
    })
    expect(input.staves.slice(1).map(({ tolerance }) => tolerance)).toEqual([undefined, undefined])
  })

  it('turns members of signals into places on the chart, rising, and drops what is not on it', () => {
    const signal = {
      id: 3,
      rule: 'nine-on-one-side',
      side: 'above',
      state: 'open',
      sentence: 'Nine.',
    } as const
    const [stave] = staffChartInput(
      facts({
        charts: [
          diameter({
            signals: [
              { ...signal, members: [905, 901, 77] },
              { ...signal, id: 4, members: [77] },
            ],
          }),
        ],
      }),
    ).staves
    expect(stave?.signals).toEqual([{ ...signal, members: [1, 5] }])
  })

  it('draws a bar line where die, machine, setting, specification or limits change, and nowhere else', () => {
    const changed = [
      lot(0),
      lot(1),
      lot(2, { die: 'Die 8' }),
      lot(3, { die: undefined, machine: 'Machine 2' }),
      lot(4, { die: undefined, machine: 'Machine 2', setting: 'oil 41 °C' }),
      lot(5, { die: undefined, machine: undefined, specificationNumber: 2 }),
    ]
    const input = staffChartInput(
      facts({ lots: changed, charts: [diameter({ limitSets: [limits({ effectiveFrom: day(1) })] })] }),
    )
    expect(
      input.barLines.map(({ atIndex, kind, reason, detail }) => [atIndex, kind, reason, detail]),
    ).toEqual([
      [1, 'limit-set', 'limit set 1', '2 Sep, M. Orrin'],
      [2, 'die', 'Die 8 in', '3 Jul, T. Aldous'],
      [3, 'die', 'no die named', '4 Jul, T. Aldous'],
      [3, 'machine', 'Machine 2', '4 Jul, T. Aldous'],
      [4, 'setting', 'oil 41 °C', '5 Jul, T. Aldous'],
      [5, 'machine', 'no machine named', '6 Jul, T. Aldous'],
      [5, 'setting', 'usual setting', '6 Jul, T. Aldous'],
      [5, 'specification', 'specification revision 2', '6 Jul, T. Aldous'],
    ])
  })

  it('tells limits of several charts that change together once, by number where it is the same', () => {
    const one = (number: number) => limits({ number, effectiveFrom: day(4) })
    const reasonOf = (numbers: readonly number[]) =>
      staffChartInput(
        facts({ charts: numbers.map((number) => diameter({ limitSets: [one(number)] })) }),
      ).barLines.map(({ reason }) => reason)
    expect(reasonOf([5, 5])).toEqual(['limit set 5'])
    expect(reasonOf([5, 2])).toEqual(['new limit sets'])
  })

  it('has nothing to show of no lots', () => {
    expect(staffChartInput(facts({ lots: [] }))).toMatchObject({ lots: [], barLines: [] })
  })
})
