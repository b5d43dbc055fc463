import { describe, expect, it } from 'vitest'
import { pathData, px } from '@/lib/domain/charts/path-data'

describe('px', () => {
  it('keeps two decimals and no trailing noughts', () => {
    expect(px(1.005)).toBe('1')
    expect(px(12.346)).toBe('12.35')
    expect(px(3)).toBe('3')
    expect(px(0.1 + 0.2)).toBe('0.3')
  })

  it('has no minus nought', () => {
    expect(px(-0)).toBe('0')
    expect(px(-0.001)).toBe('0')
  })
})

describe('pathData', () => {
  it('writes segments one after the other', () => {
    expect(pathData([['M', 0, 1.25], ['L', -3, 4], ['C', 1, 2, 3, 4, 5.555, 6], ['Z']])).toBe(
      'M0 1.25L-3 4C1 2 3 4 5.56 6Z',
    )
    expect(pathData([])).toBe('')
  })
})
