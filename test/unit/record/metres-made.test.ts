import { describe, expect, it } from 'vitest'
import { metresMade, metresMadeBy } from '@/lib/domain/record/metres-made'

const lot = (madeAt: number, lengthMetres: number | undefined, product = 'A') => ({
  madeAt,
  lengthMetres,
  product,
})

describe('metresMade', () => {
  it('sums what is known and counts what is not', () => {
    expect(metresMade([lot(30, 1200), lot(10, undefined), lot(20, 800)])).toEqual({
      lots: 3,
      metres: 2000,
      withoutLength: 1,
      firstMadeAt: 10,
      lastMadeAt: 30,
    })
  })

  it('of no lot is nothing, since no day', () => {
    expect(metresMade([])).toEqual({
      lots: 0,
      metres: 0,
      withoutLength: 0,
      firstMadeAt: undefined,
      lastMadeAt: undefined,
    })
  })

  it('takes more lots than a call can have arguments', () => {
    const many = Array.from({ length: 200_000 }, (_, index) => lot(index, 1))
    expect(metresMade(many)).toMatchObject({ metres: 200_000, firstMadeAt: 0, lastMadeAt: 199_999 })
  })
})

describe('metresMadeBy', () => {
  it('keeps the groups in the order in which they first occur, and loses no lot', () => {
    const lots = [lot(5, 10, 'B'), lot(4, 20, 'A'), lot(3, undefined, 'B'), lot(2, 40, 'A')]
    expect(metresMadeBy(lots, ({ product }) => product)).toMatchObject([
      { group: 'B', lots: 2, metres: 10, withoutLength: 1, lastMadeAt: 5 },
      { group: 'A', lots: 2, metres: 60, withoutLength: 0, firstMadeAt: 2 },
    ])
  })
})
