import { describe, expect, it } from 'vitest'
import type { InspectionPlan } from '@/lib/domain/metrology/specification'
import { metres } from '@/lib/domain/units/quantity'
import { benchFields, cellOrder, nextCell, shiftFrom } from '@/lib/input/bench-cells'

const plan: InspectionPlan = {
  specimens: 2,
  positions: 2,
  directions: 2,
  takenAt: ['head', 'tail'],
  weighedState: 'slack',
  cutLength: metres(0.5),
  acceptanceConstant: 1.5,
  rigCode: 'R-1',
}

describe('cellOrder(plan)', () => {
  it('goes station by station, specimen by specimen, and leaves out set-up values', () => {
    expect(cellOrder(plan).map((cell) => cell.key)).toEqual([
      '1.d1a',
      '1.d1b',
      '1.d2a',
      '1.d2b',
      '2.d1a',
      '2.d1b',
      '2.d2a',
      '2.d2b',
      '1.cutMass',
      '2.cutMass',
      '1.frequency',
      '2.frequency',
    ])
  })

  it('has one direction when the plan has one', () => {
    const ids = benchFields({ ...plan, directions: 1 }).map((field) => field.id)
    expect(ids).toEqual(['d1a', 'd2a', 'cutLength', 'cutMass', 'span', 'temperature', 'frequency'])
  })
})

describe('nextCell(order, key, filled)', () => {
  it('goes to the next empty cell, then back to an earlier empty one, then nowhere', () => {
    const order = cellOrder(plan)
    expect(nextCell(order, '1.d1a', (key) => key === '1.d1b')?.key).toBe('1.d2a')
    expect(nextCell(order, '2.frequency', (key) => key !== '1.d2b')?.key).toBe('1.d2b')
    expect(nextCell(order, '2.frequency', () => true)).toBeUndefined()
  })
})

describe('shiftFrom(order, key, values, locked)', () => {
  const order = cellOrder(plan)

  it('moves the values of the station one cell further and empties the cell', () => {
    const values = { '1.d1a': 1, '1.d1b': 2, '1.d2a': 3, '1.cutMass': 9 }
    expect(shiftFrom(order, '1.d1b', values, () => false)).toEqual({
      '1.d1a': 1,
      '1.d2a': 2,
      '1.d2b': 3,
      '1.cutMass': 9,
    })
  })

  it('crosses to the next specimen and stops at the first empty cell', () => {
    const values = { '1.d2b': 4, '2.d1b': 6 }
    expect(shiftFrom(order, '1.d2b', values, () => false)).toEqual({ '2.d1a': 4, '2.d1b': 6 })
  })

  it('is refused when there is no room, and leaves what it was given alone', () => {
    const values = Object.freeze({ '1.cutMass': 1, '2.cutMass': 2 })
    expect(shiftFrom(order, '1.cutMass', values, () => false)).toBeUndefined()
  })

  it('does not touch specimens that are already stored', () => {
    const values = { '1.cutMass': 1 }
    expect(shiftFrom(order, '1.cutMass', values, (specimen) => specimen === 2)).toBeUndefined()
  })
})
