import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { reasonRows } from '@/lib/domain/charts/reason-rows'
import type { BarLine, BarLineKind } from '@/lib/domain/charts/staff-chart'
import { textWidth } from '@/lib/domain/charts/text-width'

const bar = (atIndex: number, kind: BarLineKind, reason: string): BarLine => ({
  atIndex,
  double: kind === 'limit-set',
  kinds: [kind],
  reason,
  detail: '13 Oct, T. Aldous',
})

const xOf = ({ atIndex }: BarLine): number => 10 * atIndex

describe('reasonRows', () => {
  it('stands in one row where there is room', () => {
    const rows = reasonRows([bar(0, 'die', 'die 7 in'), bar(30, 'die', 'die 8 in')], xOf, 800)
    expect(rows.map(({ row, x }) => [row, x])).toEqual([
      [0, 0],
      [0, 300],
    ])
  })

  it('lets limits and dies choose before settings; the third is left out', () => {
    const rows = reasonRows(
      [bar(0, 'setting', 'oil 41 °C'), bar(1, 'limit-set', 'limit set 5'), bar(2, 'die', 'die 7 in')],
      xOf,
      800,
    )
    expect(rows.map(({ row }) => row)).toEqual([undefined, 0, 1])
  })

  it('lets a product choose before a coil, and a coil before a spool', () => {
    const rows = reasonRows(
      [bar(0, 'spool', 'spool S-7'), bar(1, 'coil', 'coil C-118'), bar(2, 'product', 'Larch 254')],
      xOf,
      800,
    )
    expect(rows.map(({ row }) => row)).toEqual([undefined, 1, 0])
  })

  it('leaves out what would run off the page', () => {
    expect(reasonRows([bar(70, 'die', 'die 7 in')], xOf, 720)[0]?.row).toBeUndefined()
  })

  it('never lets two reasons of one row touch, and keeps the order of the bars', () => {
    fc.assert(
      fc.property(
        fc.array(
          fc.record({
            at: fc.nat({ max: 70 }),
            kind: fc.constantFrom('die' as const, 'setting' as const, 'limit-set' as const),
            reason: fc.constantFrom('die 7 in', 'specification revision 6, coil C-118', 'x'),
          }),
          { maxLength: 10 },
        ),
        (drawn) => {
          const bars = drawn.map(({ at, kind, reason }) => bar(at, kind, reason))
          const rows = reasonRows(bars, xOf, 800)
          expect(rows.map((one) => one.bar)).toEqual(bars)
          for (const row of [0, 1]) {
            const own = rows.filter((one) => one.row === row).toSorted((a, b) => a.x - b.x)
            own.slice(1).forEach((next, index) => {
              const before = own[index]
              if (!before) return
              const w = Math.max(textWidth(before.bar.reason, 13, 'italic'), textWidth(before.bar.detail, 11))
              expect(next.x).toBeGreaterThanOrEqual(before.x + w)
            })
          }
        },
      ),
      { numRuns: 150, seed: 1 },
    )
  })
})
