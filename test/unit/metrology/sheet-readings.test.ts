import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { diameterPairs, fundamentalOfPlucks, loadOf } from '@/lib/domain/metrology/sheet-readings'
import { kilograms } from '@/lib/domain/units/quantity'
import { seededNormal } from '@/test/support/seeded-random'
import { diameterAt, typedHertz } from '@/test/support/sheets'
import { steelContext } from '@/test/support/steel-context'

describe('diameterPairs(sheet, shift)', () => {
  it('pairs the directions of a position, takes a lone one twice, in the order of positions', () => {
    const diameters = [diameterAt(3, 'b', '0.2'), diameterAt(1, 'a', '0.3'), diameterAt(1, 'b', '0.4')]
    expect(diameterPairs({ diameters }, 0)).toEqual({
      pairs: [
        [0.3e-3, 0.4e-3],
        [0.2e-3, 0.2e-3],
      ],
      complete: [[0.3e-3, 0.4e-3]],
    })
  })

  it('shifts every reading', () => {
    const { pairs } = diameterPairs({ diameters: [diameterAt(1, 'a', '0.25')] }, -1e-6)
    expect(pairs[0]?.[0]).toBeNear(0.249e-3, { absolute: 1e-18 })
  })
})

describe('fundamentalOfPlucks(sheet)', () => {
  const of = (...typed: string[]) => fundamentalOfPlucks({ frequencies: typed.map(typedHertz) })

  it('is undefined without a pluck, and has no scatter for one', () => {
    expect(of()).toBeUndefined()
    expect(of('330')).toEqual({ value: 330, n: 1, scatter: 0 })
  })

  it('is the mean of two with s/√2, the median of more with 1.2533 s/√n', () => {
    expect(of('330', '330.2')?.value).toBe(330.1)
    expect(of('330', '330.2')?.scatter).toBeNear(0.1, { relative: 1e-9 })
    const three = of('330', '335', '330.1')
    expect(three?.value).toBe(330.1)
    expect(of('1', '2', '3', '4')?.value).toBe(2.5)
  })

  it('tells the standard deviation of medians that are drawn many times, within 5 %', () => {
    const normal = seededNormal(5)
    const medians: number[] = []
    const told: number[] = []
    for (let draw = 0; draw < 4000; draw += 1) {
      const plucks = Array.from({ length: 9 }, () => typedHertz(String(330 + 0.1 * normal())))
      const one = fundamentalOfPlucks({ frequencies: plucks })
      medians.push(one?.value ?? 0)
      told.push((one?.scatter ?? 0) ** 2)
    }
    const mean = medians.reduce((a, b) => a + b) / medians.length
    const variance = medians.reduce((sum, one) => sum + (one - mean) ** 2, 0) / (medians.length - 1)
    const meanTold = told.reduce((a, b) => a + b) / told.length
    // 1.2533 is the limit for many plucks; for nine the true factor is 1.224.
    expect(Math.sqrt(meanTold / variance)).toBeNear(1, { absolute: 0.05 })
  })

  it('does not depend on the order of the plucks', () => {
    fc.assert(
      fc.property(
        fc.array(fc.double({ min: 300, max: 340, noNaN: true }), { minLength: 1, maxLength: 7 }),
        (f) => {
          const forward = of(...f.map(String))
          const backward = of(...[...f].reverse().map(String))
          expect(backward).toEqual(forward)
        },
      ),
    )
  })
})

describe('loadOf(sheet, context)', () => {
  const context = steelContext()

  it('adds hanger and weights, with their uncertainties in quadrature', () => {
    const { load } = loadOf({ load: { kind: 'weights', hanger: 'H-01', weights: ['W-05', 'W-02'] } }, context)
    expect(load?.value).toBeNear(7.4, { absolute: 1e-12 })
    expect(load?.u).toBeNear(Math.sqrt(1e-10 + 64e-10 + 9e-10), { relative: 1e-9 })
  })

  it('counts a weight that hangs twice twice', () => {
    const { load } = loadOf({ load: { kind: 'weights', hanger: 'H-01', weights: ['W-02', 'W-02'] } }, context)
    expect(load?.value).toBeNear(4.4, { absolute: 1e-12 })
  })

  it('names what is not registered and gives no load then', () => {
    const { load, unknown } = loadOf({ load: { kind: 'weights', hanger: 'H-9', weights: ['W-05'] } }, context)
    expect(load).toBeUndefined()
    expect(unknown).toEqual(['H-9'])
  })

  it('believes a typed mass to half a per mille, and is empty when nothing is said', () => {
    const value = { typed: '7', unit: 'kg', si: kilograms(7) }
    expect(loadOf({ load: { kind: 'mass', value } }, context).load).toMatchObject({ value: 7, u: 0.0035 })
    expect(loadOf({}, context)).toEqual({ unknown: [] })
    expect(loadOf({ load: { kind: 'weights', hanger: '', weights: [] } }, context).load).toBeUndefined()
  })
})
