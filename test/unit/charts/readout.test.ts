import { describe, expect, it } from 'vitest'
import { sigmasText, valueText } from '@/lib/domain/charts/readout'

describe('valueText', () => {
  it('has the decimals of its stave, the works’ decimal sign, and a sign where deviations are charted', () => {
    expect(valueText(254.466, { decimals: 2 })).toBe('254.47')
    expect(valueText(254.466, { decimals: 2 }, { decimal: 'comma' })).toBe('254,47')
    expect(valueText(0.18, { decimals: 2, signed: true })).toBe('+0.18')
    expect(valueText(-0.14, { decimals: 2, signed: true })).toBe('\u22120.14')
    expect(valueText(-0.001, { decimals: 2, signed: true })).toBe('0.00')
  })

  it('is a dash without a value', () => {
    expect(valueText(undefined, { decimals: 2 })).toBe('\u2013')
    expect(valueText(Number.NaN, { decimals: 2 })).toBe('\u2013')
  })
})

describe('sigmasText', () => {
  it('is one decimal with its sign and σ behind a space that does not break', () => {
    expect(sigmasText(1.34)).toBe('+1.3\u00a0σ')
    expect(sigmasText(-0.86, { decimal: 'comma' })).toBe('\u22120,9\u00a0σ')
  })

  it('is a dash without limits', () => {
    expect(sigmasText(undefined)).toBe('\u2013')
  })
})
