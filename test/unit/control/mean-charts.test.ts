import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { chartConstants } from '@/lib/domain/control/chart-constants'
import { subgroupCharts, unequalSubgroupCharts } from '@/lib/domain/control/mean-charts'

describe('chartConstants', () => {
  it('of two values: d2 = 2/√π, c4 = √(2/π), no lower limits', () => {
    const { B3, c4, D3, d2, E2 } = chartConstants(2)
    expect(d2).toBeCloseTo(2 / Math.sqrt(Math.PI), 12)
    expect(c4).toBeCloseTo(Math.sqrt(2 / Math.PI), 12)
    expect([B3, D3]).toEqual([0, 0])
    expect(E2).toBeCloseTo(2.6587, 4)
  })

  it('refuses a subgroup of one', () => {
    expect(() => chartConstants(1)).toThrow(RangeError)
    expect(() => chartConstants(2.5)).toThrow(RangeError)
  })
})

const value = fc.double({ min: -1e3, max: 1e3, noNaN: true })
const groups = fc
  .integer({ min: 2, max: 9 })
  .chain((n) => fc.array(fc.array(value, { minLength: n, maxLength: n }), { minLength: 1, maxLength: 30 }))

describe('subgroupCharts', () => {
  it('is undefined for no subgroups, for subgroups of one, and for unequal ones', () => {
    expect(subgroupCharts([])).toBeUndefined()
    expect(subgroupCharts([[1], [2]])).toBeUndefined()
    expect(
      subgroupCharts([
        [1, 2],
        [1, 2, 3],
      ]),
    ).toBeUndefined()
  })

  it('has its limits on the centre line when all values are equal', () => {
    const charts = subgroupCharts([
      [5, 5, 5],
      [5, 5, 5],
    ])
    expect(charts?.byRange.mean).toEqual({ centre: 5, lower: 5, upper: 5 })
    expect(charts?.bySd.spread).toEqual({ centre: 0, lower: 0, upper: 0 })
  })

  it('moves with its values and grows with their unit', () => {
    fc.assert(
      fc.property(groups, fc.double({ min: 0.5, max: 2, noNaN: true }), value, (all, unit, shift) => {
        const charts = subgroupCharts(all)
        const other = subgroupCharts(all.map((one) => one.map((x) => x * unit + shift)))
        const scale = 1e-9 * (Math.abs(charts?.bySd.mean.upper ?? 0) + 2e3)
        expect(
          Math.abs((other?.bySd.mean.upper ?? 0) - ((charts?.bySd.mean.upper ?? 0) * unit + shift)),
        ).toBeLessThan(scale)
        expect(Math.abs((other?.byRange.sigma ?? 0) - (charts?.byRange.sigma ?? 0) * unit)).toBeLessThan(
          scale,
        )
      }),
      { numRuns: 100, seed: 3 },
    )
  })
})

describe('unequalSubgroupCharts', () => {
  it('agrees with the pooled chart where sizes are equal', () => {
    const all = [
      [1, 2, 4],
      [2, 2, 3],
      [0, 3, 3],
    ]
    const unequal = unequalSubgroupCharts(all)
    expect(unequal?.pooled).toBeCloseTo(subgroupCharts(all)?.pooled ?? 0, 14)
    expect(unequal?.centre).toBeCloseTo(subgroupCharts(all)?.bySd.mean.centre ?? 0, 14)
  })

  it('is undefined with a subgroup of one', () => {
    expect(unequalSubgroupCharts([[1, 2], [3]])).toBeUndefined()
    expect(unequalSubgroupCharts([])).toBeUndefined()
  })
})
