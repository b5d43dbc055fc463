import { MEAN_RANGE_OF_TWO } from './spread-constants'

export interface IndividualsLimits {
  readonly centre: number
  readonly meanMovingRange: number
  /** Mean moving range of two over d2(2). */
  readonly sigma: number
  readonly lower: number
  readonly upper: number
}

/** Mean by differences from the first value, which keeps the digits of numbers that differ in their last ones. */
export const meanOf = (values: readonly number[]): number => {
  const first = values[0] ?? 0
  return first + values.reduce((sum, value) => sum + (value - first), 0) / values.length
}

/**
 * Individuals chart: centre = mean, σ = mean moving range of neighbours / d2(2), limits ±3σ. An undefined
 * value is a gap: no moving range is taken across it. Undefined when no two neighbours exist.
 * Source: ISO 7870-2; ASTM E2587; NIST/SEMATECH e-Handbook 6.3.2.2 (example).
 */
export function individualsLimits(values: readonly (number | undefined)[]): IndividualsLimits | undefined {
  const kept = values.filter((value): value is number => value !== undefined)
  const ranges: number[] = []
  values.forEach((value, index) => {
    const before = values[index - 1]
    if (value !== undefined && before !== undefined) ranges.push(Math.abs(value - before))
  })
  if (ranges.length === 0) return undefined
  const centre = meanOf(kept)
  const meanMovingRange = meanOf(ranges)
  const sigma = meanMovingRange / MEAN_RANGE_OF_TWO
  return { centre, meanMovingRange, sigma, lower: centre - 3 * sigma, upper: centre + 3 * sigma }
}
