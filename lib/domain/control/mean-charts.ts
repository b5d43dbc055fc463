import { sampleStandardDeviation } from '../statistics/sample-standard-deviation'
import { chartConstants } from './chart-constants'
import { meanOf } from './individuals-chart'
import { meanOfSpread } from './spread-constants'

export interface ControlLimits {
  readonly centre: number
  readonly lower: number
  readonly upper: number
}

export interface SubgroupCharts {
  readonly means: readonly number[]
  readonly ranges: readonly number[]
  readonly standardDeviations: readonly number[]
  /** Means with σ from the mean range (R̄/d2), and the chart of ranges. */
  readonly byRange: { readonly sigma: number; readonly mean: ControlLimits; readonly spread: ControlLimits }
  /** Means with σ from the mean standard deviation (s̄/c4), and the chart of standard deviations. */
  readonly bySd: { readonly sigma: number; readonly mean: ControlLimits; readonly spread: ControlLimits }
  /** Square root of the mean variance within subgroups, and the same without its bias. */
  readonly pooled: number
  readonly pooledUnbiased: number
}

/**
 * Charts of means with ranges or standard deviations, for subgroups of equal size n ≥ 2. Where lots differ from each
 * other for reasons of their own, these limits are too narrow: chart the lot means as individuals then.
 * Undefined without subgroups, or when their sizes differ or are below two.
 * Source: ISO 7870-2; ASTM E2587.
 */
export function subgroupCharts(subgroups: readonly (readonly number[])[]): SubgroupCharts | undefined {
  const n = subgroups[0]?.length ?? 0
  if (n < 2 || subgroups.some((one) => one.length !== n)) return undefined
  const factors = chartConstants(n)
  const means = subgroups.map(meanOf)
  const ranges = subgroups.map((one) => Math.max(...one) - Math.min(...one))
  const standardDeviations = subgroups.map((one) => sampleStandardDeviation(one) ?? Number.NaN)
  const [centre, meanRange, meanSd] = [meanOf(means), meanOf(ranges), meanOf(standardDeviations)]
  const around = (half: number): ControlLimits => ({ centre, lower: centre - half, upper: centre + half })
  const pooled = Math.sqrt(meanOf(standardDeviations.map((sd) => sd * sd)))
  return {
    means,
    ranges,
    standardDeviations,
    byRange: {
      sigma: meanRange / factors.d2,
      mean: around(factors.A2 * meanRange),
      spread: { centre: meanRange, lower: factors.D3 * meanRange, upper: factors.D4 * meanRange },
    },
    bySd: {
      sigma: meanSd / factors.c4,
      mean: around(factors.A3 * meanSd),
      spread: { centre: meanSd, lower: factors.B3 * meanSd, upper: factors.B4 * meanSd },
    },
    pooled,
    pooledUnbiased: pooled / meanOfSpread(subgroups.length * (n - 1) + 1),
  }
}

export interface UnequalSubgroupCharts {
  /** Mean of all values. */
  readonly centre: number
  /** √(Σ(nᵢ − 1)sᵢ² / Σ(nᵢ − 1)). */
  readonly pooled: number
  /** Limits of each subgroup by its own size: centre ± A3(nᵢ) s, and B3(nᵢ) s, B4(nᵢ) s. */
  readonly limits: readonly { readonly mean: ControlLimits; readonly spread: ControlLimits }[]
}

/**
 * The same for subgroups of different sizes, each at least two, with the pooled standard deviation in place of s̄.
 * Undefined without subgroups, or when one is too small. Source: ISO 7870-2.
 */
export function unequalSubgroupCharts(
  subgroups: readonly (readonly number[])[],
): UnequalSubgroupCharts | undefined {
  if (subgroups.length === 0 || subgroups.some((one) => one.length < 2)) return undefined
  const centre = meanOf(subgroups.flat())
  const freedom = subgroups.reduce((sum, one) => sum + one.length - 1, 0)
  const squares = subgroups.reduce((sum, one) => {
    const sd = sampleStandardDeviation(one) ?? 0
    return sum + (one.length - 1) * sd * sd
  }, 0)
  const pooled = Math.sqrt(squares / freedom)
  return {
    centre,
    pooled,
    limits: subgroups.map((one) => {
      const { A3, B3, B4 } = chartConstants(one.length)
      return {
        mean: { centre, lower: centre - A3 * pooled, upper: centre + A3 * pooled },
        spread: { centre: pooled, lower: B3 * pooled, upper: B4 * pooled },
      }
    }),
  }
}
