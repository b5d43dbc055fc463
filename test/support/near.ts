/** `toBeNear`: near-equal numbers, with a tolerance that must be said each time. */
import { expect } from 'vitest'

/** At least one of the two; with both, meeting either is enough. */
export interface Tolerance {
  /** Largest |received − expected|, in the unit of the numbers. */
  readonly absolute?: number
  /** Largest |received − expected| / |expected|. */
  readonly relative?: number
}

export interface Nearness {
  readonly near: boolean
  readonly report: string
}

/**
 * Whether `received` lies within the tolerance of `expected`. Not a number is near nothing; the infinities
 * are near themselves only. Throws when no usable tolerance is given.
 */
export function nearness(received: unknown, expected: number, tolerance: Tolerance): Nearness {
  const { absolute, relative } = tolerance
  const given = [absolute, relative].filter((part) => part !== undefined)
  if (given.length === 0 || given.some((part) => !Number.isFinite(part) || part < 0))
    throw new TypeError('toBeNear needs { absolute } or { relative }, each finite and not negative')
  if (typeof received !== 'number') return { near: false, report: `${String(received)} is not a number` }
  const deviation = Math.abs(received - expected)
  const near =
    received === expected ||
    (Number.isFinite(deviation) &&
      ((absolute !== undefined && deviation <= absolute) ||
        (relative !== undefined && deviation <= relative * Math.abs(expected))))
  const share = expected === 0 ? '' : `, relative ${deviation / Math.abs(expected)}`
  return {
    near,
    report: `received ${received}, expected ${expected}: deviation ${deviation}${share}; allowed ${JSON.stringify(tolerance)}`,
  }
}

expect.extend({
  toBeNear(received: unknown, expected: number, tolerance: Tolerance) {
    const { near, report } = nearness(received, expected, tolerance)
    return { pass: near, message: () => report }
  },
})

declare module 'vitest' {
  // biome-ignore lint/suspicious/noExplicitAny: the declaration merged into has this parameter and default
  interface Matchers<T = any> {
    /** Near-equal numbers; the tolerance is absolute, relative or both (meeting either is enough). */
    toBeNear(expected: number, tolerance: Tolerance): T
  }
}
