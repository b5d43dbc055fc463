import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { calibrationLine, correctionAt } from '@/lib/domain/metrology/calibration-line'
import { seededNormal } from '@/test/support/seeded-random'

describe('calibrationLine(points, reference)', () => {
  it('finds an exact line again, wherever the reference lies', () => {
    const number = fc.double({ min: -5, max: 5, noNaN: true })
    fc.assert(
      fc.property(number, number, number, (at, slope, reference) => {
        const points = [1, 2, 4, 7].map((x) => ({ x, correction: at + slope * (x - reference) }))
        const line = calibrationLine(points, reference)
        expect(line?.at).toBeNear(at, { absolute: 1e-12 })
        expect(line?.slope).toBeNear(slope, { absolute: 1e-12 })
        expect(line && correctionAt(line, reference, 3).value).toBeNear(at + slope * (3 - reference), {
          absolute: 1e-11,
        })
      }),
    )
  })

  it('tells the uncertainty with which a correction is predicted', () => {
    const normal = seededNormal(19)
    const predicted: number[] = []
    const told: number[] = []
    for (let trial = 0; trial < 4000; trial += 1) {
      const points = [0, 1, 2, 3, 4, 5].map((x) => ({ x, correction: 0.1 * x + 0.2 * normal() }))
      const line = calibrationLine(points, 20)
      if (!line) throw new Error('no line')
      const { u, value } = correctionAt(line, 20, 8)
      predicted.push(value - 0.8)
      told.push(u * u)
    }
    const mean = (list: readonly number[]) => list.reduce((a, b) => a + b) / list.length
    expect(Math.sqrt(mean(predicted.map((x) => x * x)) / mean(told))).toBeNear(1, { absolute: 0.04 })
  })

  it('is undefined with two points or without a spread', () => {
    expect(
      calibrationLine(
        [
          { x: 1, correction: 1 },
          { x: 2, correction: 1 },
        ],
        0,
      ),
    ).toBeUndefined()
    expect(
      calibrationLine(
        [1, 1, 1].map((x) => ({ x, correction: x })),
        0,
      ),
    ).toBeUndefined()
  })
})
