import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { LinesOfSpecimens } from '@/lib/services/import/lines-of-specimens'

describe('LinesOfSpecimens', () => {
  it('finds what was noted, and nothing else', () => {
    const lines = new LinesOfSpecimens()
    lines.note('LA-1', 1, 2)
    lines.note('LA-1', 3, 7)
    expect([lines.find('LA-1', 1), lines.find('LA-1', 3)]).toEqual([2, 7])
    // A line is no specimen, and another lot's is not this one's.
    expect([lines.find('LA-1', 2), lines.find('LA-1', 7), lines.find('LA-2', 1)]).toEqual([
      undefined,
      undefined,
      undefined,
    ])
  })

  it('agrees with a plain map', () => {
    const row = fc.tuple(fc.constantFrom('A', 'B', 'C'), fc.integer({ min: 1, max: 9 }))
    fc.assert(
      fc.property(fc.array(row, { maxLength: 40 }), (rows) => {
        const lines = new LinesOfSpecimens()
        const plain = new Map<string, number>()
        rows.forEach(([lot, specimen], index) => {
          const key = `${lot} ${specimen}`
          expect(lines.find(lot, specimen)).toBe(plain.get(key))
          if (plain.has(key)) return
          lines.note(lot, specimen, index + 2)
          plain.set(key, index + 2)
        })
      }),
    )
  })
})
