import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { formatNumber } from '@/lib/domain/units/format'
import { parseNumber } from '@/lib/domain/units/parse-number'

describe('parseNumber(text) accepts', () => {
  it.each([
    ['254', 254],
    ['0,254', 0.254],
    ['0.254', 0.254],
    ['.010', 0.01],
    [',010', 0.01],
    ['10', 10],
    ['007', 7],
    ['+3', 3],
    ['+0,5', 0.5],
    ['-1.5', -1.5],
    ['\u22121.5', -1.5],
    ['\u2212,5', -0.5],
    ['  329.63 ', 329.63],
    ['1,060', 1.06],
    ['1.060', 1.06],
    ['0', 0],
    ['0.000000000000000000001', 1e-21],
    ['123456789012345678901234567890', 1.2345678901234568e29],
  ])('%j as %d', (text, value) => {
    expect(parseNumber(text)).toEqual({ ok: true, value })
  })

  it('never gives a negative zero', () => {
    const read = parseNumber('-0,0')
    expect(read.ok && Object.is(read.value, 0)).toBe(true)
  })
})

describe('parseNumber(text) refuses with a sentence', () => {
  it.each([
    ['', /nothing was typed/i],
    ['   ', /nothing was typed/i],
    ['abc', /no digits/],
    ['-', /no digits/],
    ['.', /no digits/],
    [',', /no digits/],
    ['1,234.5', /both a comma and a point/],
    ['1.234,5', /both a comma and a point/],
    ['1.234.567', /more than one decimal sign/],
    ['1,234,567', /more than one decimal sign/],
    ['0..5', /more than one decimal sign/],
    ['1 234', /gap between its digits/],
    ['1\u00a0234', /gap between its digits/],
    ['1\u202f234,5', /gap between its digits/],
    ["1'234", /gap between its digits/],
    ['0. 254', /gap between its digits/],
    ['254.', /no digit after its decimal sign/],
    ['254,', /no digit after its decimal sign/],
    ['1e-3', /power of ten/],
    ['2.54E2', /power of ten/],
    ['254 mm', /not a plain number/],
    ['0x10', /not a plain number/],
    ['1/2', /not a plain number/],
    ['--5', /not a plain number/],
    ['5-', /not a plain number/],
    ['+-5', /not a plain number/],
    ['NaN', /no digits/],
    ['Infinity', /no digits/],
    ['\u0662\u0665', /no digits/],
    ['2\u00b754', /not a plain number/],
    ['9'.repeat(400), /too large/],
  ])('%j', (text, reason) => {
    const read = parseNumber(text)
    expect(read.ok).toBe(false)
    if (!read.ok) {
      expect(read.problems[0]?.message).toMatch(reason)
      expect(read.problems[0]?.message).toMatch(/^[A-Z“].*\.$/)
      expect(read.problems[0]?.mend).toMatch(/\.$/)
    }
  })

  it('begins the sentence with the name and says where', () => {
    expect(parseNumber('x', { name: 'Diameter', where: 'd1a' })).toEqual({
      ok: false,
      problems: [
        {
          code: 'bad-input',
          message: 'Diameter: “x” has no digits.',
          mend: 'Type a number, such as 0.254.',
          where: 'd1a',
        },
      ],
    })
  })

  it('refuses the other decimal sign where a file declares one', () => {
    expect(parseNumber('0,254', { decimal: 'comma' })).toEqual({ ok: true, value: 0.254 })
    expect(parseNumber('0.254', { decimal: 'comma' }).ok).toBe(false)
    expect(parseNumber('0.254', { decimal: 'point' })).toEqual({ ok: true, value: 0.254 })
    expect(parseNumber('0,254', { decimal: 'point' }).ok).toBe(false)
  })
})

describe('parseNumber and formatNumber', () => {
  it('meet again: what is shown is read back to the shown digits, with point and comma', () => {
    fc.assert(
      fc.property(
        fc.double({ min: -1e9, max: 1e9, noNaN: true }),
        fc.integer({ min: 0, max: 12 }),
        fc.constantFrom('point' as const, 'comma' as const),
        (value, decimals, decimal) => {
          const read = parseNumber(formatNumber(value, { decimals, decimal }), { decimal })
          expect(read.ok).toBe(true)
          if (read.ok) expect(Math.abs(read.value - value)).toBeLessThanOrEqual(0.5000001 * 10 ** -decimals)
        },
      ),
    )
  })

  it('never throws, whatever is typed', () => {
    fc.assert(
      fc.property(fc.string(), (text) => {
        const read = parseNumber(text)
        if (read.ok) expect(Number.isFinite(read.value)).toBe(true)
        else expect(read.problems.length).toBe(1)
      }),
    )
  })
})
