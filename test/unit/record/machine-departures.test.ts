import { describe, expect, it } from 'vitest'
import { chartDepartures, limitsFor } from '@/lib/domain/record/chart-departures'
import type { ChartPoint, FrozenLimits } from '@/lib/domain/record/chart-history'
import { machineDepartures, standardisedPoints } from '@/lib/domain/record/machine-departures'
import { limits } from '../../support/write-states'

const DAY = 86_400_000

const point = (lotId: number, value: number, change: Partial<ChartPoint> = {}): ChartPoint => ({
  lotId,
  code: `L-${String(lotId).padStart(3, '0')}`,
  madeAt: lotId * DAY,
  value,
  machineId: 1,
  evaluatedAt: 1000 + lotId,
  ...change,
})

/** A product with centre 0 and this σ, whose lots lie so many σ off. */
const product = (productId: number, sigma: number, lots: readonly (readonly [number, number])[]) => ({
  productId,
  limitSets: [limits({ id: productId * 10, centre: 0, sigma, lower: -3 * sigma, upper: 3 * sigma })],
  points: lots.map(([lotId, sigmas]) => point(lotId, sigmas * sigma)),
})

const alternating = (from: number) =>
  Array.from({ length: 9 }, (_, index): readonly [number, number] => [from + index, 0.5])

describe('machineDepartures(machineId, charts)', () => {
  const split = alternating(1)
  const odd = split.filter(([lot]) => lot % 2 === 1)
  const even = split.filter(([lot]) => lot % 2 === 0)

  it('finds a run that lots of two products make together, in σ, dated by its newest evaluation', () => {
    expect(machineDepartures(1, [product(7, 2, odd), product(8, 0.1, even)])).toEqual([
      {
        limitSetId: 70,
        rule: 'nine-on-one-side',
        side: 'above',
        lotId: 9,
        productId: 7,
        members: [1, 2, 3, 4, 5, 6, 7, 8, 9],
        departure: expect.closeTo(0.5, 12),
        raisedAt: 1009,
      },
    ])
  })

  it('leaves to a product what its own chart finds: a run of its lots alone, a lot beyond its limits', () => {
    expect(machineDepartures(1, [product(7, 2, split)])).toEqual([])
    expect(
      machineDepartures(1, [
        product(7, 2, [
          [1, 4],
          [3, -4],
        ]),
        product(8, 1, [[2, 5]]),
      ]),
    ).toEqual([])
  })

  it('takes lots of this machine only, in the order they were made', () => {
    const other = { ...product(8, 0.1, even), points: even.map(([id, z]) => point(id, z, { machineId: 2 })) }
    expect(machineDepartures(1, [product(7, 2, odd), other])).toEqual([])
    const points = standardisedPoints(1, [product(8, 0.1, even), product(7, 2, odd)])
    expect(points.map((one) => one.lotId)).toEqual([1, 2, 3, 4, 5, 6, 7, 8, 9])
  })

  it('has no place for lots before the first limit set, and none for a set without spread', () => {
    const late = { ...product(7, 2, odd), limitSets: [limits({ effectiveFrom: 4 * DAY, centre: 0 })] }
    expect(standardisedPoints(1, [late]).map((one) => one.lotId)).toEqual([5, 7, 9])
    expect(standardisedPoints(1, [{ ...late, limitSets: [limits({ sigma: 0 })] }])).toEqual([])
  })

  it('passes over a product that is not asked for runs', () => {
    const calm = product(8, 0.1, even)
    const seasonal = { ...calm, limitSets: calm.limitSets.map((set) => ({ ...set, rules: [] })) }
    expect(machineDepartures(1, [product(7, 2, odd), seasonal])).toEqual([])
  })
})

describe('limits and a target that a specification moves', () => {
  const set: FrozenLimits = limits({ target: 254e-6 })

  it('move together; the spread stays', () => {
    const moved = limitsFor(set, { target: 256e-6 })
    expect(moved).toMatchObject({ id: 5, sigma: 0.6e-6 })
    expect(moved.centre).toBeCloseTo(256e-6, 15)
    expect(moved.upper).toBeCloseTo(257.8e-6, 15)
    expect(moved.lower).toBeCloseTo(254.2e-6, 15)
  })

  it('stay where either side knows no target', () => {
    expect(limitsFor(set, {}).centre).toBe(254e-6)
    expect(limitsFor(limits(), { target: 256e-6 }).centre).toBe(254e-6)
  })

  it('raise nothing for lots that follow a moved target, and everything for lots that do not', () => {
    const follow = Array.from({ length: 30 }, (_, index) =>
      point(index + 1, (index < 15 ? 254e-6 : 256e-6) + (index % 2 === 0 ? 0.3e-6 : -0.3e-6), {
        target: index < 15 ? 254e-6 : 256e-6,
      }),
    )
    expect(chartDepartures({ points: follow, limitSets: [set] })).toEqual([])
    const stay = follow.map((one) => ({ ...one, target: 254e-6 }))
    const found = chartDepartures({ points: stay, limitSets: [set] })
    // 256.3 µm is beyond the upper limit of 255.8 µm, 255.7 µm is not; all of them lie above the centre.
    expect(found.map(({ lotId, rule }) => [lotId, rule]).slice(0, 2)).toEqual([
      [17, 'beyond-the-limits'],
      [19, 'beyond-the-limits'],
    ])
    expect(found.filter(({ rule }) => rule === 'nine-on-one-side').map(({ lotId }) => lotId)).toEqual([23])
  })

  it('asks only the rules that a set is for', () => {
    const run = Array.from({ length: 9 }, (_, index) => point(index + 1, 254.2e-6))
    expect(chartDepartures({ points: run, limitSets: [set] })).toHaveLength(1)
    expect(chartDepartures({ points: run, limitSets: [{ ...set, rules: ['beyond-the-limits'] }] })).toEqual(
      [],
    )
  })
})
