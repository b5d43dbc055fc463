import { describe, expect, it } from 'vitest'
import { barLinesWithin } from '@/lib/domain/charts/bar-lines'
import type { BarLineInput } from '@/lib/domain/charts/staff-chart'

const line = (atIndex: number, kind: BarLineInput['kind'], reason: string, detail = ''): BarLineInput => ({
  atIndex,
  kind,
  reason,
  detail,
})

describe('barLinesWithin', () => {
  it('tells what falls together together: limits, specification, die, machine, setting', () => {
    const told = barLinesWithin(
      [
        line(5, 'setting', 'oil 41 °C', '12 Sep'),
        line(5, 'die', 'die 7 in', '12 Sep'),
        line(5, 'limit-set', 'limit set 5', '2 Sep, M. Orrin'),
        line(5, 'machine', 'machine 2', ''),
        line(5, 'specification', 'specification revision 6', '12 Sep'),
      ],
      { from: 0, to: 9 },
    )
    expect(told).toEqual([
      {
        atIndex: 5,
        double: true,
        kinds: ['limit-set', 'specification', 'die', 'machine', 'setting'],
        reason: 'limit set 5, specification revision 6, die 7 in, machine 2, oil 41 °C',
        detail: '2 Sep, M. Orrin; 12 Sep',
      },
    ])
  })

  it('tells product and materials in their places between them', () => {
    const kinds = ['spool', 'setting', 'coil', 'die', 'resin', 'product', 'limit-set'] as const
    const [told] = barLinesWithin(
      kinds.map((kind) => line(4, kind, kind)),
      { from: 0, to: 9 },
    )
    expect(told?.reason).toBe('limit-set, product, die, coil, spool, resin, setting')
  })

  it('is double for limits only, in order of lots', () => {
    const told = barLinesWithin([line(7, 'die', 'b'), line(3, 'limit-set', 'a')], { from: 0, to: 9 })
    expect(told.map(({ atIndex, double }) => [atIndex, double])).toEqual([
      [3, true],
      [7, false],
    ])
  })

  it('keeps both ends of the window and nothing outside, nor what is no index', () => {
    const at = [1, 2, 5, 6, Number.NaN].map((index) => line(index, 'die', `${index}`))
    expect(barLinesWithin(at, { from: 2, to: 5 }).map(({ atIndex }) => atIndex)).toEqual([2, 5])
    expect(barLinesWithin(at, { from: 0, to: -1 })).toEqual([])
  })
})
