import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { StaffSegment } from '@/lib/domain/charts/staff-chart'
import { staveScale } from '@/lib/domain/charts/stave-scale'

const segment = (centre: number, sigma: number): StaffSegment => ({
  fromIndex: 0,
  toIndex: 9,
  number: 1,
  provisional: false,
  centre,
  sigma,
  upper: centre + 3 * sigma,
  lower: centre - 3 * sigma,
  inner: [],
})

const tolerance = (lower: number, upper: number) => [
  { side: 'above' as const, value: upper, label: '' },
  { side: 'below' as const, value: lower, label: '' },
]

describe('staveScale', () => {
  it('draws one σ of the newest limits a space', () => {
    expect(staveScale([segment(253.92, 0.42)], [254.2, 253.1], [], 2)).toEqual({
      middle: 253.92,
      perSpace: 0.42,
    })
  })

  it('draws limits of another set that lies far off within sight', () => {
    const { middle, perSpace } = staveScale([segment(270, 0.42), segment(253.92, 0.42)], [254], [], 2)
    expect(middle).toBe(253.92)
    expect((270 + 3 * 0.42 - (253.92 - 3 * 0.42)) / perSpace).toBeNear(13, { absolute: 1e-9 })
  })

  it('follows a process that has left for good, but not a single slip, and no further than a third', () => {
    const shifted = Array.from({ length: 40 }, (_, index) => 253.92 + 10 * 0.42 + 0.01 * index)
    expect(staveScale([segment(253.92, 0.42)], shifted, [], 2).perSpace).toBeGreaterThan(0.42)
    const slip = [...Array.from({ length: 40 }, () => 253.92), 290]
    expect(staveScale([segment(253.92, 0.42)], slip, [], 2).perSpace).toBe(0.42)
    const lost = Array.from({ length: 40 }, () => 400)
    expect(staveScale([segment(253.92, 0.42)], lost, [], 2).perSpace).toBeNear(3 * 0.42, { absolute: 1e-12 })
  })

  it('holds tolerance or values in six spaces where there are no limits', () => {
    expect(staveScale([], [253, 255], tolerance(251, 257), 2)).toEqual({ middle: 254, perSpace: 1 })
    const wide = staveScale([], [248, 254], tolerance(251, 257), 2)
    expect((254 - 248) / wide.perSpace).toBeLessThanOrEqual(3)
    expect(staveScale([], [1, 4], [], 2)).toEqual({ middle: 2.5, perSpace: 0.5 })
  })

  it('draws equal values, one value and none in steps of the last decimal', () => {
    for (const values of [[5, 5, 5], [5]])
      expect(staveScale([], values, [], 2)).toEqual({ middle: 5, perSpace: 0.01 })
    expect(staveScale([], [], [], 3)).toEqual({ middle: 0, perSpace: 0.001 })
    expect(staveScale([segment(7, 0)], [7, 7], [], 1)).toEqual({ middle: 7, perSpace: 0.1 })
  })

  it('has a usable scale for any values', () => {
    const any = fc.double({ min: -1e250, max: 1e250, noNaN: true })
    fc.assert(
      fc.property(
        fc.array(any, { maxLength: 30 }),
        fc.array(any, { maxLength: 1 }),
        fc.boolean(),
        (values, centres, flat) => {
          const scale = staveScale(
            centres.map((centre) => segment(centre, flat ? 0 : 1)),
            values,
            [],
            2,
          )
          expect(Number.isFinite(scale.middle)).toBe(true)
          expect(scale.perSpace > 0 && Number.isFinite(scale.perSpace)).toBe(true)
        },
      ),
      { numRuns: 200, seed: 1 },
    )
  })
})
