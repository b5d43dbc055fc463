import { describe, expect, it } from 'vitest'
import { buildStave } from '@/lib/domain/charts/build-stave'
import type { ChartLimitSet, ChartLot, StaveInput } from '@/lib/domain/charts/staff-chart'

const lots = (count: number): ChartLot[] =>
  Array.from({ length: count }, (_, index) => ({
    lotId: index,
    code: `LA-${index}`,
    madeAt: index,
    label: '',
  }))

const set = (fromIndex: number, toIndex: number, more: Partial<ChartLimitSet> = {}): ChartLimitSet => ({
  fromIndex,
  toIndex,
  number: 5,
  centre: 100,
  sigma: 2,
  lower: 94,
  upper: 106,
  provisional: false,
  ...more,
})

const stave = (more: Partial<StaveInput>): StaveInput => ({
  key: 'diameter',
  label: 'Diameter',
  unitLabel: 'µm, individuals',
  decimals: 2,
  oneSided: false,
  values: [],
  leftOut: [],
  limitSets: [],
  signals: [],
  ...more,
})

const built = (input: StaveInput, window = { from: 0, to: input.values.length - 1 }) =>
  buildStave(input, lots(input.values.length), window)

describe('buildStave', () => {
  it('tells each note’s distance from its own centre, and whether it has left its own limits', () => {
    const { notes } = built(
      stave({
        values: [107, 106, 93, 107],
        limitSets: [set(0, 2), set(3, 3, { number: 6, centre: 105, lower: 99, upper: 111 })],
      }),
    )
    expect(notes.map(({ sigmas }) => sigmas)).toEqual([3.5, 3, -3.5, 1])
    expect(notes.map(({ beyond }) => beyond)).toEqual(['above', undefined, 'below', undefined])
  })

  it('has no distances and nothing beyond without limits, or without spread', () => {
    for (const limitSets of [[], [set(0, 1, { sigma: 0, lower: 100, upper: 100 })]]) {
      const { notes, segments } = built(stave({ values: [107, 93], limitSets }))
      expect(notes.map(({ sigmas, beyond }) => [sigmas, beyond])).toEqual([
        [undefined, undefined],
        [undefined, undefined],
      ])
      expect(segments.flatMap(({ upper, lower, inner }) => [upper, lower, ...inner])).toEqual(
        limitSets.flatMap(() => [undefined, undefined]),
      )
    }
  })

  it('draws four inner lines and both limits, or the upper half of a bounded characteristic', () => {
    const [both] = built(stave({ values: [100], limitSets: [set(0, 0)] })).segments
    expect(both).toMatchObject({ centre: 100, upper: 106, lower: 94, inner: [96, 98, 102, 104] })
    const [half] = built(stave({ values: [100], limitSets: [set(0, 0)], oneSided: true })).segments
    expect(half).toMatchObject({ upper: 106, lower: undefined, inner: [102, 104] })
  })

  it('cuts limit sets to the window and drops those outside', () => {
    const { segments } = built(
      stave({ values: Array(30).fill(100), limitSets: [set(0, 4), set(5, 14), set(15, 29)] }),
      { from: 8, to: 20 },
    )
    expect(segments.map(({ fromIndex, toIndex }) => [fromIndex, toIndex])).toEqual([
      [8, 14],
      [15, 20],
    ])
  })

  it('opens a note while its own signal is unanswered, and names all its signals', () => {
    const signal = { rule: 'beyond-the-limits' as const, side: 'above' as const, sentence: '' }
    const run = { rule: 'nine-on-one-side' as const, side: 'above' as const, sentence: 'Nine.' }
    const { notes, slurs } = built(
      stave({
        values: Array(10).fill(107),
        limitSets: [set(0, 9)],
        signals: [
          { ...signal, id: 1, members: [2], state: 'open' },
          { ...signal, id: 2, members: [3], state: 'answered' },
          { ...run, id: 3, members: [1, 2, 3, 4, 5, 6, 7, 8, 9], state: 'open' },
        ],
      }),
    )
    expect(notes.filter(({ open }) => open).map(({ index }) => index)).toEqual([2])
    expect(notes[2]?.signals).toEqual(['1', '3'])
    expect(notes[0]?.signals).toEqual([])
    expect(slurs).toEqual([
      {
        signal: '3',
        side: 'above',
        state: 'open',
        members: [1, 2, 3, 4, 5, 6, 7, 8, 9],
        words: 'nine above centre',
        sentence: 'Nine.',
      },
    ])
  })

  it('draws of a run what lies in the window with a value, and no run of one note', () => {
    const run = {
      id: 3,
      rule: 'nine-on-one-side' as const,
      side: 'above' as const,
      sentence: '',
      state: 'open' as const,
      members: [0, 1, 2, 3, 4, 5, 6, 7, 8],
    }
    const values = [101, 101, 101, 101, 101, undefined, 101, 101, 101]
    const input = stave({ values, limitSets: [set(0, 8)], signals: [run] })
    expect(built(input, { from: 4, to: 8 }).slurs[0]?.members).toEqual([4, 6, 7, 8])
    expect(built(input, { from: 8, to: 8 }).slurs).toEqual([])
  })

  it('says why there are no limits: too few lots, none frozen, no spread', () => {
    const many = (count: number) => Array(count).fill(100) as number[]
    expect(built(stave({ values: [...many(12), undefined] })).withoutLimits).toBe(
      'no limits before 20 lots: 12 so far',
    )
    expect(built(stave({ values: many(20) })).withoutLimits).toBe('no limits frozen yet: 20 lots')
    expect(built(stave({ values: many(3), limitSets: [set(0, 2, { sigma: 0 })] })).withoutLimits).toBe(
      'no spread in the baseline, so no limits',
    )
    expect(built(stave({ values: many(3), limitSets: [set(0, 2)] })).withoutLimits).toBeUndefined()
  })

  it('names both tolerances, or the one there is', () => {
    const both = built(stave({ tolerance: { lower: 90, upper: 110, label: 'specification revision 6' } }))
    expect(both.tolerances).toEqual([
      { side: 'above', value: 110, label: 'upper tolerance, specification revision 6' },
      { side: 'below', value: 90, label: 'lower tolerance, specification revision 6' },
    ])
    expect(built(stave({ tolerance: { upper: 3, label: 'x' } })).tolerances.map(({ side }) => side)).toEqual([
      'above',
    ])
    expect(built(stave({})).tolerances).toEqual([])
  })
})
