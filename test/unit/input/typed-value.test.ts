import { describe, expect, it } from 'vitest'
import { metres } from '@/lib/domain/units/quantity'
import { parseInput } from '@/lib/input/parse-input'
import { sheetBounds } from '@/lib/input/sheet-bounds'
import { typedValue } from '@/lib/input/typed-value'

const diameter = typedValue(sheetBounds.diameter, metres)

describe('typedValue', () => {
  it.each([
    ['0.254', 'mm', 2.54e-4],
    ['0,254', 'mm', 2.54e-4],
    ['254', 'µm', 2.54e-4],
    ['10 thou', 'mm', 2.54e-4],
  ])('finds the SI value of “%s” in %s', (typed, unit, si) => {
    const parsed = parseInput(diameter, { typed, unit })
    expect(parsed.ok && parsed.value.si).toBe(si)
  })

  it('keeps the text as it was typed, and the unit it was understood in', () => {
    expect(parseInput(diameter, { typed: '10.06 thou', unit: 'mm' })).toMatchObject({
      ok: true,
      value: { typed: '10.06 thou', unit: 'thou' },
    })
  })

  it('refuses an SI value that is not that of the text', () => {
    const parsed = parseInput(diameter, { typed: '0.254', unit: 'mm', si: 2.55e-4 })
    expect(parsed).toMatchObject({ ok: false, problems: [{ message: expect.stringContaining('0.254') }] })
  })

  it.each([
    ['nothing', '', 'mm'],
    ['stray text', 'thick', 'mm'],
    ['both decimal signs', '1,000.2', 'mm'],
    ['a value out of bounds', '254', 'mm'],
    ['a unit of another dimension', '0.254 kg', 'mm'],
    ['an unknown unit', '0.254', 'ell'],
    ['a prototype’s name as unit', '0.254', 'constructor'],
    ['a control character', '0.254\u0007', 'mm'],
    ['a lone surrogate', '0.254\ud800', 'mm'],
    ['a text without end', '0.2540000000000000000000000000000000000000001', 'mm'],
  ])('refuses %s with a sentence', (_, typed, unit) => {
    const parsed = parseInput(diameter, { typed, unit })
    expect(parsed.ok).toBe(false)
    if (!parsed.ok) expect(parsed.problems[0]?.message).toMatch(/^Diameter: .*\.$/s)
  })
})
