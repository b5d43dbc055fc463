import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { type FaultReadings, faultResiduals } from '@/lib/domain/metrology/fault-residuals'

const nominal = {
  nominalDiameter: 254e-6,
  nominalDensity: 7850,
  uDiameter: 0.002,
  uWeighed: 4e-4,
  uSounded: 7e-4,
}
const massOf = (diameter: number) => (7850 * Math.PI * diameter * diameter) / 4

const truth = (share: number): FaultReadings => {
  const diameter = 254e-6 * (1 + share)
  return { ...nominal, diameter, weighed: massOf(diameter), sounded: massOf(diameter) }
}

const size = fc.double({ min: -0.03, max: 0.03, noNaN: true })

describe('faultResiduals(readings)', () => {
  it('leaves all checks at zero for a true size', () => {
    fc.assert(
      fc.property(size, (share) => {
        const found = faultResiduals(truth(share))
        expect(found.diameter).toBeNear(Math.log(1 + share), { absolute: 1e-14 })
        for (const c of [found.routes, found.densityWeighed, found.densitySounded])
          expect(c).toBeNear(0, { absolute: 1e-14 })
      }),
    )
  })

  it('shows each fault by its pattern: micrometer 0 − −, balance + + 0, octave of the sounding', () => {
    fc.assert(
      fc.property(size, size, (share, fault) => {
        const right = truth(share)
        const micrometer = faultResiduals({ ...right, diameter: right.diameter * Math.exp(fault) })
        expect(micrometer.routes).toBeNear(0, { absolute: 1e-13 })
        expect(micrometer.densityWeighed).toBeNear(-2 * fault, { absolute: 1e-13 })
        expect(micrometer.densitySounded).toBeNear(-2 * fault, { absolute: 1e-13 })
        const balance = faultResiduals({ ...right, weighed: right.weighed * Math.exp(fault) })
        expect(balance.routes).toBeNear(fault, { absolute: 1e-13 })
        expect(balance.densityWeighed).toBeNear(fault, { absolute: 1e-13 })
        expect(balance.densitySounded).toBeNear(0, { absolute: 1e-13 })
        const octave = faultResiduals({ ...right, sounded: right.sounded / 4 })
        expect(octave.routes).toBeNear(Math.log(4), { absolute: 1e-13 })
        expect(octave.densitySounded).toBeNear(-Math.log(4), { absolute: 1e-13 })
      }),
    )
  })

  it('weighs each check by its own uncertainty', () => {
    const right = truth(0)
    const { routes, zRoutes } = faultResiduals({ ...right, weighed: right.weighed * 1.01 })
    expect(zRoutes).toBeNear(routes / Math.hypot(4e-4, 7e-4), { relative: 1e-12 })
  })

  it('throws for values not above zero', () => {
    expect(() => faultResiduals({ ...truth(0), weighed: 0 })).toThrow(RangeError)
    expect(() => faultResiduals({ ...truth(0), uWeighed: 0, uSounded: 0 })).toThrow(RangeError)
  })
})
