import { describe, expect, it } from 'vitest'
import { characteristicIds, characteristics } from '@/lib/domain/metrology/characteristics'
import { guardFactorOf, limitsOf, tolerancedCharacteristics } from '@/lib/domain/quality/tolerances'
import { steelContext } from '@/test/support/steel-context'

const { specification } = steelContext()

describe('limitsOf(specification, id)', () => {
  it('has limits for just the toleranced characteristics', () => {
    const having = characteristicIds.filter((id) => limitsOf(specification, id) !== undefined)
    expect(having).toEqual([...tolerancedCharacteristics])
  })

  it('has no lower limit where the characteristic is one-sided, and the target between two others', () => {
    for (const id of tolerancedCharacteristics) {
      const limits = limitsOf(specification, id)
      expect(limits?.lower === undefined, id).toBe(characteristics[id].oneSided)
    }
    expect(limitsOf(specification, 'massPerMetreSounded')).toEqual({ lower: 389.8e-6, upper: 405.8e-6 })
  })
})

describe('guardFactorOf(specification, id)', () => {
  it('is 1 for tension and mass, 0 for the rest, unless the specification says otherwise', () => {
    expect(tolerancedCharacteristics.filter((id) => guardFactorOf(specification, id) === 1)).toEqual([
      'massPerMetreWeighed',
      'massPerMetreSounded',
      'tension',
    ])
    const said = { ...specification, guardFactors: { tension: 0, ovality: 1 } as const }
    expect(guardFactorOf(said, 'tension')).toBe(0)
    expect(guardFactorOf(said, 'ovality')).toBe(1)
  })
})
