import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { parseQuantity, parseQuantityAs, type QuantityReading } from '@/lib/domain/units/parse-quantity'
import { metres } from '@/lib/domain/units/quantity'

const diameter: QuantityReading = {
  dimension: 'length',
  unit: 'mm',
  name: 'Diameter',
  min: 0.00002,
  max: 0.008,
  where: 'd1a',
}
const span: QuantityReading = { dimension: 'length', unit: 'mm', name: 'Span' }

describe('parseQuantity(text, reading) accepts', () => {
  it.each([
    ['0,254mm', 'mm', 0.000254],
    ['0.254', 'mm', 0.000254],
    ['10.06 thou', 'thou', 0.000255524],
    ['.010 in', 'in', 0.000254],
    ['.010"', 'in', 0.000254],
    ['10 mil', 'thou', 0.000254],
    ['254 um', 'µm', 0.000254],
    ['254 \u03bcm', 'µm', 0.000254],
    ['254 µm', 'µm', 0.000254],
    [' 254\u00a0µm ', 'µm', 0.000254],
  ])('%j in %s', (text, unit, si) => {
    const read = parseQuantity(text, diameter)
    expect(read).toEqual({ ok: true, value: { typed: text.trim(), unit, si: expect.closeTo(si, 15) } })
  })

  it.each([
    ['25 1/2 in', 0.6477],
    ['25 1/2"', 0.6477],
    ['1/64 in', 0.000396875],
    ['2 1/2 ft', 0.762],
  ])('the fraction %j', (text, si) => {
    const read = parseQuantity(text, span)
    expect(read.ok && read.value.si).toBeCloseTo(si, 14)
  })

  it('254 µm, 0.254 mm and 10 thou as the very same wire', () => {
    const si = ['254 µm', '0,254 mm', '10 thou', '.010 in'].map((text) => {
      const read = parseQuantity(text, diameter)
      return read.ok ? read.value.si : undefined
    })
    expect(si).toEqual([0.000254, 0.000254, 0.000254, 0.000254])
  })

  it('temperatures with their zero, and negative ones', () => {
    const reading: QuantityReading = { dimension: 'temperature', unit: '°C', name: 'Temperature' }
    const read = (text: string) => {
      const parsed = parseQuantity(text, reading)
      return parsed.ok ? parsed.value.si : undefined
    }
    expect(read('\u22125')).toBe(-5)
    expect(read('68 °F')).toBe(20)
    expect(read('68F')).toBe(20)
    expect(read('293.15 K')).toBeCloseTo(20, 12)
  })

  it('values on either bound', () => {
    expect(parseQuantity('0.02', diameter).ok).toBe(true)
    expect(parseQuantity('8', diameter).ok).toBe(true)
  })

  it('a value through a door of quantity.ts', () => {
    const read = parseQuantityAs('0,5 m', span, metres)
    expect(read).toEqual({ ok: true, value: { typed: '0,5 m', unit: 'm', si: 0.5 } })
  })
})

describe('parseQuantity(text, reading) refuses with a sentence', () => {
  it.each([
    ['', /nothing was typed/],
    ['mm', /no digits/],
    ['1,234.5 mm', /both a comma and a point/],
    ['1 234', /gap between its digits/],
    ['1e-3', /power of ten/],
    ['1e-3 mm', /not a plain number/],
    ['0.254 kg', /“kg” is not a unit understood here/],
    ['0.254 MM', /“MM” is not a unit understood here/],
    ['0.254 mm mm', /“mm mm” is not a unit/],
    ['1/2', /fractions are for inches/],
    ['25 1/2 mm', /fractions are for inches/],
    ['1/0 in', /divides by zero/],
    ['25.5 1/2 in', /not a plain number/],
    ['254', /254 mm was read, and it has to be between 0.02 mm and 8 mm/],
    ['10 in', /10 in was read, and it has to be between 0.000787402 in and 0.314961 in/],
    ['-0.254', /\u22120.254 mm was read/],
  ])('%j', (text, reason) => {
    const read = parseQuantity(text, diameter)
    expect(read.ok).toBe(false)
    if (!read.ok) {
      expect(read.problems[0]?.message).toMatch(reason)
      expect(read.problems[0]?.message).toMatch(/^Diameter: /)
      expect(read.problems[0]?.where).toBe('d1a')
    }
  })

  it('names a single bound alone', () => {
    const low = parseQuantity('0', { ...span, min: 0.1 })
    const high = parseQuantity('5000', { ...span, max: 3 })
    expect(!low.ok && low.problems[0]?.message).toBe('Span: 0 mm was read, and it has to be at least 100 mm.')
    expect(!high.ok && high.problems[0]?.message).toBe(
      'Span: 5000 mm was read, and it has to be at most 3000 mm.',
    )
  })

  it('never throws, whatever is typed', () => {
    fc.assert(
      fc.property(fc.string(), (text) => {
        const read = parseQuantity(text, span)
        if (read.ok) expect(Number.isFinite(read.value.si)).toBe(true)
        else expect(read.problems.length).toBe(1)
      }),
    )
  })
})
