import { describe, expect, it } from 'vitest'
import { runWords } from '@/lib/domain/charts/run-words'

const members = (many: number): number[] => Array.from({ length: many }, (_, index) => index)

describe('runWords', () => {
  it('says how many and on which side, in words up to twelve', () => {
    expect(runWords({ members: members(9), side: 'above', state: 'open' })).toBe('nine above centre')
    expect(runWords({ members: members(12), side: 'below', state: 'open' })).toBe('twelve below centre')
    expect(runWords({ members: members(13), side: 'below', state: 'open' })).toBe('13 below centre')
  })

  it('says what became of it', () => {
    expect(runWords({ members: members(9), side: 'below', state: 'answered' })).toBe(
      'nine below centre, answered',
    )
    expect(runWords({ members: members(10), side: 'above', state: 'no-longer-holds' })).toBe(
      'ten above centre, no longer holds',
    )
  })
})
