import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { powerProductUncertainty } from '@/lib/domain/metrology/power-product-uncertainty'
import { seededNormal } from '@/test/support/seeded-random'

describe('powerProductUncertainty(factors, options)', () => {
  it('is the law of tension: 4µL²f² with its three contributions', () => {
    const { contributions, u, value } = powerProductUncertainty(
      [
        { value: 0.00578, u: 2e-5, exponent: 1 },
        { value: 0.648, u: 5e-4, exponent: 2 },
        { value: 110, u: 0.05, exponent: 2 },
      ],
      { constant: 4 },
    )
    // Source: check case made for this, T = 4µL²f².
    expect(value).toBeNear(117.468983808, { relative: 1e-12 })
    expect(u).toBeNear(0.45769177918618054, { relative: 1e-12 })
    expect(contributions[1]).toBeNear(0.181279296, { relative: 1e-12 })
  })

  it('agrees with a simulation of correlated factors', () => {
    const normal = seededNormal(11)
    const [r, n] = [0.6, 40_000]
    let squares = 0
    for (let count = 0; count < n; count += 1) {
      const [a, b] = [normal(), normal()]
      const x = 2.5 * (1 + 0.004 * a)
      const y = 4 * (1 + 0.006 * (r * a + Math.sqrt(1 - r * r) * b))
      squares += ((x * x) / y / 1.5625 - 1) ** 2
    }
    const told = powerProductUncertainty(
      [
        { value: 2.5, u: 0.01, exponent: 2 },
        { value: 4, u: 0.024, exponent: -1 },
      ],
      {
        correlation: [
          [1, r],
          [r, 1],
        ],
      },
    )
    expect(Math.sqrt(squares / n)).toBeNear(told.relative, { relative: 0.02 })
  })

  it('adds relative uncertainties in quadrature where nothing is correlated', () => {
    const positive = fc.double({ min: 0.1, max: 100, noNaN: true })
    fc.assert(
      fc.property(positive, positive, (x, y) => {
        const { relative } = powerProductUncertainty([
          { value: x, u: 0.003 * x, exponent: 1 },
          { value: y, u: 0.001 * y, exponent: -4 },
        ])
        expect(relative).toBeNear(0.005, { relative: 1e-12 })
      }),
    )
  })

  it('throws for a factor of zero and a broken exponent', () => {
    expect(() => powerProductUncertainty([{ value: 0, u: 1, exponent: 1 }])).toThrow(RangeError)
    expect(() => powerProductUncertainty([{ value: 1, u: 1, exponent: 0.5 }])).toThrow(RangeError)
  })
})
