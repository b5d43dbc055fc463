import { describe, expect, it } from 'vitest'
import { propagateCovariance, simultaneousMeans } from '@/lib/domain/metrology/simultaneous-readings'

describe('simultaneousMeans(series)', () => {
  it('gives means, their uncertainties and what they have in common', () => {
    const found = simultaneousMeans([
      [1, 2, 3],
      [2, 4, 6],
      [3, 2, 1],
    ])
    expect(found?.means).toEqual([2, 4, 2])
    expect(found?.u[0]).toBeNear(1 / Math.sqrt(3), { relative: 1e-15 })
    expect(found?.covariance[0]?.[1]).toBeNear(2 / 3, { relative: 1e-15 })
    expect(found?.covariance[0]?.[2]).toBeNear(-1 / 3, { relative: 1e-15 })
  })

  it('is undefined for one reading, and throws for series of different lengths', () => {
    expect(simultaneousMeans([[1], [2]])).toBeUndefined()
    expect(simultaneousMeans([])).toBeUndefined()
    expect(() => simultaneousMeans([[1, 2], [1]])).toThrow(RangeError)
  })
})

describe('propagateCovariance(sensitivities, covariance)', () => {
  it('cancels what two inputs have in common in their difference, and doubles it in their sum', () => {
    const { correlation, u } = propagateCovariance(
      [
        [1, -1],
        [1, 1],
      ],
      [
        [4, 3],
        [3, 4],
      ],
    )
    expect(u[0]).toBeNear(Math.sqrt(2), { relative: 1e-15 })
    expect(u[1]).toBeNear(Math.sqrt(14), { relative: 1e-15 })
    expect(correlation[0]?.[1]).toBeNear(0, { absolute: 1e-15 })
  })
})
