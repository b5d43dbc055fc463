import { describe, expect, it } from 'vitest'
import { resolutionUncertainty, standardUncertaintyFromBounds } from '@/lib/domain/metrology/type-b'
import { seededUniform } from '@/test/support/seeded-random'

const deviationOf = (draw: () => number): number => {
  const n = 200_000
  let squares = 0
  for (let count = 0; count < n; count += 1) squares += draw() ** 2
  return Math.sqrt(squares / n)
}

describe('standardUncertaintyFromBounds(halfWidth, distribution)', () => {
  it('takes a half-width over √3, √6, √2 or 1.96', () => {
    // Source: JCGM 100:2008, 4.3.4, 4.3.7, 4.3.9, H.1.3.4.
    expect(standardUncertaintyFromBounds(0.0005)).toBeNear(0.0002886751345948129, { relative: 1e-14 })
    expect(standardUncertaintyFromBounds(6, 'triangular')).toBeNear(2.449489742783178, { relative: 1e-14 })
    expect(standardUncertaintyFromBounds(1, 'arcsine')).toBeNear(Math.SQRT1_2, { relative: 1e-14 })
    expect(standardUncertaintyFromBounds(1.96, 'normal-95')).toBeNear(1, { absolute: 1e-4 })
  })

  it('is the standard deviation of what is drawn from each shape', () => {
    const uniform = seededUniform(3)
    expect(deviationOf(() => 2 * uniform() - 1)).toBeNear(standardUncertaintyFromBounds(1), {
      relative: 0.01,
    })
    expect(deviationOf(() => uniform() - uniform())).toBeNear(
      standardUncertaintyFromBounds(1, 'triangular'),
      {
        relative: 0.01,
      },
    )
    expect(deviationOf(() => Math.sin(2 * Math.PI * uniform()))).toBeNear(
      standardUncertaintyFromBounds(1, 'arcsine'),
      { relative: 0.01 },
    )
  })

  it('is zero for zero, and throws for a negative or infinite half-width', () => {
    expect(standardUncertaintyFromBounds(0)).toBe(0)
    expect(() => standardUncertaintyFromBounds(-1)).toThrow(RangeError)
    expect(() => standardUncertaintyFromBounds(Number.POSITIVE_INFINITY)).toThrow(RangeError)
  })
})

describe('resolutionUncertainty(step)', () => {
  it('is the step over √12', () => {
    expect(resolutionUncertainty(1)).toBeNear(1 / Math.sqrt(12), { relative: 1e-15 })
  })
})
