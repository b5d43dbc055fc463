/**
 * Ways of interpolating between ordered values: position h = (n − 1)p + 1 (type 7, for display),
 * (n + 1)p (type 6, for plots on probability scale), (n + 1/3)p + 1/3 (type 8, median-unbiased).
 */
export type QuantileType = 6 | 7 | 8

const position: Readonly<Record<QuantileType, (n: number, p: number) => number>> = {
  6: (n, p) => (n + 1) * p,
  7: (n, p) => (n - 1) * p + 1,
  8: (n, p) => (n + 1 / 3) * p + 1 / 3,
}

/**
 * Sample quantile x_p of values in any order, by the named type. Undefined for no values.
 * Throws a RangeError when p is outside 0 … 1.
 *
 * Source: R. J. Hyndman, Y. Fan, The American Statistician 50 (1996) 361.
 */
export function sampleQuantile(values: readonly number[], p: number, type: QuantileType): number | undefined {
  if (!(p >= 0 && p <= 1)) throw new RangeError(`quantile at p = ${p}`)
  const sorted = [...values].sort((a, b) => a - b)
  const n = sorted.length
  const h = Math.min(Math.max(position[type](n, p), 1), n)
  // A position that only rounding keeps off a whole number is that number.
  const nearest = Math.round(h)
  const low = Math.abs(h - nearest) < 4e-15 * n ? nearest : Math.floor(h)
  const below = sorted[low - 1]
  const above = sorted[low] ?? below
  if (below === undefined || above === undefined) return undefined
  const share = low === nearest && Math.abs(h - nearest) < 4e-15 * n ? 0 : h - low
  return below + share * (above - below)
}
