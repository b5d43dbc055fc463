import { describe, expect, it } from 'vitest'
import { nearness } from './near'

describe('toBeNear', () => {
  it('accepts a deviation up to the absolute tolerance', () => {
    expect(10.5).toBeNear(10, { absolute: 0.5 })
    expect(-1e-12).toBeNear(0, { absolute: 1e-12 })
  })

  it('accepts a deviation up to the relative tolerance, of the expected value', () => {
    expect(1.01e-7).toBeNear(1e-7, { relative: 0.0101 })
    expect(-99).toBeNear(-100, { relative: 0.01 })
  })

  it.each([
    ['beyond the absolute tolerance', 10.51, 10, { absolute: 0.5 }],
    ['beyond the relative tolerance', 1.02, 1, { relative: 0.01 }],
    ['beyond both', 1.02, 1, { absolute: 0.01, relative: 0.01 }],
    ['a relative tolerance of nought', 1e-300, 0, { relative: 1 }],
    ['not a number', Number.NaN, 1, { absolute: 1e9 }],
    ['not a number, expected so', Number.NaN, Number.NaN, { absolute: 1e9 }],
    ['infinity for a number', Number.POSITIVE_INFINITY, 1, { relative: 1e300 }],
    ['minus infinity for infinity', Number.NEGATIVE_INFINITY, Number.POSITIVE_INFINITY, { absolute: 1 }],
    ['undefined', undefined, 0, { absolute: 1 }],
    ['a numeric text', '1', 1, { absolute: 1 }],
  ])('rejects %s', (_title, received, expected, tolerance) => {
    expect(() => expect(received).toBeNear(expected, tolerance)).toThrow()
    expect(nearness(received, expected, tolerance).near).toBe(false)
  })

  it('throws without a tolerance, even turned round by not', () => {
    expect(() => expect(1).toBeNear(1, {})).toThrow('needs { absolute } or { relative }')
    expect(() => expect(1).not.toBeNear(2, { absolute: Number.NaN })).toThrow('needs { absolute }')
    expect(() => expect(1).not.toBeNear(2, { relative: -1 })).toThrow('needs { absolute }')
  })

  it('reports both numbers and their deviation', () => {
    expect(nearness(3, 2, { absolute: 0.5 }).report).toBe(
      'received 3, expected 2: deviation 1, relative 0.5; allowed {"absolute":0.5}',
    )
  })
})
