import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { understandEntry } from '@/lib/domain/metrology/understand-entry'

const diameter = {
  dimension: 'length',
  unit: 'mm',
  name: 'Diameter',
  min: 1e-5,
  max: 0.02,
  expected: 254e-6,
} as const

describe('understandEntry(text, reading)', () => {
  it.each([
    ['.2541', 'mm', 254.1e-6],
    ['0,254', 'mm', 254e-6],
    ['254', 'µm', 254e-6],
    ['254.3', 'µm', 254.3e-6],
    ['.010', 'in', 254e-6],
    ['10', 'thou', 254e-6],
    ['10.06 thou', 'thou', 255.524e-6],
    ['0.3 mm', 'mm', 300e-6],
  ])('reads %s as %s for a wire of 0.254 mm', (text, unit, si) => {
    const entry = understandEntry(text, diameter)
    expect(entry.ok && entry.value.unit).toBe(unit)
    expect(entry.ok && entry.value.si).toBeCloseTo(si, 15)
  })

  it('keeps the default unit where none fits, so that the entry is asked about', () => {
    const entry = understandEntry('0.5', diameter)
    expect(entry.ok && entry.value.unit).toBe('mm')
  })

  it.each(['', 'abc', '0.2.5', '1,000.5'])('refuses %j with a sentence', (text) => {
    const entry = understandEntry(text, diameter)
    expect(entry.ok).toBe(false)
    expect(!entry.ok && entry.problems[0]?.message).toMatch(/^Diameter/)
  })

  it('never changes a value that has its unit', () => {
    fc.assert(
      fc.property(fc.double({ min: 0.05, max: 5, noNaN: true }), (x) => {
        const text = `${x.toFixed(4)} mm`
        const entry = understandEntry(text, diameter)
        expect(entry.ok && entry.value.si).toBeCloseTo(Number(x.toFixed(4)) / 1000, 12)
      }),
    )
  })
})
