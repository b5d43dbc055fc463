import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { type ModelInput, propagate } from '@/lib/domain/metrology/propagate'

const input = (id: string, value: number, u: number, common = false): ModelInput => ({
  id,
  name: id,
  value,
  u,
  unit: '',
  type: 'B',
  distribution: 'normal',
  common,
})

describe('propagate(inputs, model)', () => {
  it('adds independent contributions in quadrature and keeps the common part apart', () => {
    const { y } = propagate([input('a', 3, 0.3, true), input('b', 5, 0.4)], ({ a = 0, b = 0 }) => ({
      y: a + b,
    }))
    expect(y?.estimate.value).toBe(8)
    expect(y?.estimate.u).toBeCloseTo(0.5, 14)
    expect(y?.estimate.uCommon).toBeCloseTo(0.3, 14)
  })

  it('treats results that share an input as a whole: their difference is free of it', () => {
    const { d } = propagate([input('a', 3, 0.3), input('b', 5, 0.4)], ({ a = 0, b = 0 }) => ({
      d: a + b - a,
    }))
    expect(d?.estimate.u).toBeCloseTo(0.4, 12)
  })

  it('agrees with the analytic law for products of powers', () => {
    const positive = fc.double({ min: 0.5, max: 50, noNaN: true })
    fc.assert(
      fc.property(positive, positive, (a, b) => {
        const ua = a * 1e-4
        const ub = b * 2e-4
        const { y } = propagate([input('a', a, ua), input('b', b, ub)], ({ a: x = 0, b: z = 0 }) => ({
          y: (x * x) / z,
        }))
        const expected = ((a * a) / b) * Math.sqrt(4 * 1e-8 + 4e-8)
        expect(Math.abs((y?.estimate.u ?? 0) / expected - 1)).toBeLessThan(1e-6)
      }),
    )
  })

  it('leaves out a result that the model cannot give', () => {
    const model = ({ a = 0 }): { y?: number } => (a > 10 ? { y: a } : {})
    expect(propagate([input('a', 3, 0.3)], model)).toEqual({})
  })

  it('leaves out a result that is missing one standard uncertainty away, rather than telling too little', () => {
    const model = ({ a = 0, b = 0 }): { y?: number; z: number } => ({ z: b, ...(a > 2.8 ? { y: a } : {}) })
    const found = propagate([input('a', 3, 0.3), input('b', 1, 0.1)], model)
    expect(found.y).toBeUndefined()
    expect(found.z?.estimate.u).toBeCloseTo(0.1, 12)
  })

  it('has no line for an input that does not matter, nor for one without uncertainty', () => {
    const inputs = [input('a', 3, 0.3), input('b', 1, 0.1), input('c', 1, 0)]
    const { y } = propagate(inputs, ({ a = 0, c = 0 }) => ({ y: a + c }))
    expect(y?.budget.map((line) => line.input)).toEqual(['a'])
  })
})
