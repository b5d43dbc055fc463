import { describe, expect, it } from 'vitest'
import { globalRisks } from '@/lib/domain/quality/global-risks'
import { seededNormal } from '@/test/support/seeded-random'

const tolerance = { lower: -2, upper: 2 }
const accept = { lower: -1.8, upper: 1.8 }

describe('globalRisks(setting)', () => {
  it('is what a simulation of production and measurement finds', () => {
    const normal = seededNormal(23)
    const n = 200_000
    let consumer = 0
    let producer = 0
    for (let item = 0; item < n; item += 1) {
      const made = 0.3 + 1.2 * normal()
      const read = made + 0.4 * normal()
      const good = Math.abs(made) <= 2
      const taken = Math.abs(read) <= 1.8
      if (!good && taken) consumer += 1
      if (good && !taken) producer += 1
    }
    const risks = globalRisks({ mean: 0.3, deviation: 1.2, u: 0.4, tolerance, accept })
    expect(consumer / n).toBeNear(risks.consumer, { absolute: 6 * Math.sqrt(risks.consumer / n) })
    expect(producer / n).toBeNear(risks.producer, { absolute: 6 * Math.sqrt(risks.producer / n) })
  })

  it('adds up: accepted is what conforms and is not rejected, and what does not and is accepted', () => {
    const { accepted, conforming, consumer, producer } = globalRisks({
      mean: -1,
      deviation: 0.8,
      u: 0.1,
      tolerance,
      accept,
    })
    expect(accepted).toBeNear(conforming - producer + consumer, { absolute: 1e-13 })
  })

  it('has no risk where measuring is nearly exact, and throws without deviations', () => {
    const fine = globalRisks({ mean: 0, deviation: 1, u: 1e-5, tolerance, accept: tolerance })
    expect(fine.consumer + fine.producer).toBeLessThan(1e-5)
    expect(() => globalRisks({ mean: 0, deviation: 0, u: 1, tolerance, accept })).toThrow(RangeError)
  })
})
