import { describe, expect, it } from 'vitest'
import { isCharted, isFinal, type LotState, lotStates, stateAfterEntry } from '@/lib/domain/record/lot-state'

describe('stateAfterEntry', () => {
  it.each<[LotState, boolean, boolean, LotState]>([
    ['measuring', false, false, 'measuring'],
    ['measuring', true, false, 'to-decide'],
    // A withdrawn sounding takes the lot back to the bench.
    ['to-decide', false, false, 'measuring'],
    ['held', true, true, 'held'],
    ['rework', true, false, 'rework'],
    ['rework', true, true, 'to-decide'],
    ['released', false, false, 'released'],
    ['scrapped', true, true, 'scrapped'],
  ])(
    'from %s with the plan complete: %s, measured anew: %s goes to %s',
    (state, planComplete, measuredAnew, after) => {
      expect(stateAfterEntry(state, { planComplete, measuredAnew })).toBe(after)
    },
  )
})

describe('isCharted', () => {
  it('leaves only lots off the chart that are still being measured', () => {
    expect(lotStates.filter((state) => !isCharted(state))).toEqual(['measuring'])
  })
})

describe('isFinal', () => {
  it('counts a held lot and a lot in rework as open', () => {
    expect(lotStates.filter(isFinal)).toEqual(['released', 'regraded', 'concession', 'scrapped'])
  })
})
