import { describe, expect, it } from 'vitest'
import {
  decimalsForUncertainty,
  formatNumber,
  formatQuantity,
  formatWithUncertainty,
} from '@/lib/domain/units/format'

describe('formatNumber(value, format)', () => {
  it.each([
    [1234.5678, { decimals: 2 }, '1234.57'],
    [1234.5678, { decimals: 2, decimal: 'comma' as const }, '1234,57'],
    [-0.004, { decimals: 2 }, '0.00'],
    [-1.5, { decimals: 1 }, '\u22121.5'],
    [1.5, { decimals: 1, sign: 'always' as const }, '+1.5'],
    [0, { decimals: 1, sign: 'always' as const }, '0.0'],
    [0.0001, { decimals: 2, sign: 'always' as const }, '0.00'],
    [12345, { decimals: -2 }, '12300'],
    [-12355, { decimals: -1 }, '\u221212360'],
    [1e21, { decimals: 0 }, '1000000000000000000000'],
    [1e-9, { decimals: 12 }, '0.000000001000'],
    [undefined, { decimals: 2 }, '\u2013'],
    [Number.NaN, { decimals: 2 }, '\u2013'],
    [Number.POSITIVE_INFINITY, { decimals: 2 }, '\u2013'],
  ])('%d with %j is %s', (value, format, text) => {
    expect(formatNumber(value, format)).toBe(text)
  })
})

describe('formatQuantity(si, unit, format)', () => {
  it('converts and rounds, with the unit’s plain decimals where none are asked for', () => {
    expect(formatQuantity(0.000254, 'mm')).toBe('0.2540')
    expect(formatQuantity(0.000254, 'thou', { withUnit: true })).toBe('10.00\u00a0thou')
    expect(formatQuantity(20, '°F')).toBe('68.0')
    expect(formatQuantity(1, '°F', { difference: true })).toBe('1.8')
    expect(formatQuantity(0.000254, 'mm', { decimals: 3, decimal: 'comma' })).toBe('0,254')
  })

  it('shows an undefined value as a dash, without a unit', () => {
    expect(formatQuantity(undefined, 'mm', { withUnit: true })).toBe('\u2013')
  })
})

describe('decimalsForUncertainty(u)', () => {
  it.each([
    [0.35, 2],
    [0.0351, 3],
    [0.0996, 2],
    [0.00996, 3],
    [3.4, 1],
    [34, 0],
    [340, -1],
    [1, 1],
  ])('%d has its second digit at %d', (u, decimals) => {
    expect(decimalsForUncertainty(u)).toBe(decimals)
  })

  it.each([0, -1, Number.NaN, Number.POSITIVE_INFINITY])('%d has none', (u) => {
    expect(decimalsForUncertainty(u)).toBeUndefined()
  })
})

describe('formatWithUncertainty(si, u, unit)', () => {
  it('rounds the value where its uncertainty ends', () => {
    expect(formatWithUncertainty(0.000254031, 0.000000351, 'µm')).toEqual({
      value: '254.03',
      uncertainty: '0.35',
    })
    expect(formatWithUncertainty(7849.27, 37.8, 'kg/m³')).toEqual({ value: '7849', uncertainty: '38' })
    expect(formatWithUncertainty(7849.27, 378, 'kg/m³')).toEqual({ value: '7850', uncertainty: '380' })
  })

  it('says a dash for an unusable uncertainty and for a missing value', () => {
    expect(formatWithUncertainty(0.000254, undefined, 'µm')).toEqual({
      value: '254.0',
      uncertainty: '\u2013',
    })
    expect(formatWithUncertainty(undefined, 0.000001, 'µm')).toEqual({ value: '\u2013', uncertainty: '1.0' })
  })
})
