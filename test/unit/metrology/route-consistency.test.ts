import { describe, expect, it } from 'vitest'
import { closureVerdict } from '@/lib/domain/metrology/closure'
import { routeConsistency } from '@/lib/domain/metrology/route-consistency'

describe('routeConsistency(one, other, correlation)', () => {
  const one = { value: 0.3853, u: 0.00015 }
  const other = { value: 0.38605, u: 0.00027 }

  it('is zeta, and half of it as normalised error', () => {
    // Source: definitions of ISO 13528 and ISO/IEC 17043, computed with 40 digits.
    expect(routeConsistency(one, other).zeta).toBeNear(-2.42821465589316, { relative: 1e-10 })
    expect(routeConsistency(one, other).normalisedError).toBeNear(-1.21410732794658, { relative: 1e-10 })
    expect(routeConsistency(one, other, 0.3).zeta).toBeNear(-2.81271975231506, { relative: 1e-10 })
  })

  it('changes its sign with the order', () => {
    expect(routeConsistency(other, one, 0.3).zeta).toBeNear(2.81271975231506, { relative: 1e-10 })
  })

  it('agrees with the verdict on a closure of the same relative size', () => {
    const { normalisedError } = routeConsistency(one, other)
    const u = Math.hypot(0.00015, 0.00027) / 0.3853
    expect(closureVerdict(Math.log(one.value / other.value), u)).toBe(
      Math.abs(normalisedError) <= 1.5 ? 'doubtful' : 'open',
    )
  })

  it('throws when the difference has no uncertainty', () => {
    expect(() => routeConsistency({ value: 1, u: 0 }, { value: 2, u: 0 })).toThrow(RangeError)
    expect(() => routeConsistency({ value: 1, u: 1 }, { value: 2, u: 1 }, 1)).toThrow(RangeError)
  })
})
