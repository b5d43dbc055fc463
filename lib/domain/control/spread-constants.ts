/**
 * c4(n): mean of the sample standard deviation of n normal values over σ,
 * √(2/(n−1)) Γ(n/2)/Γ((n−1)/2), by c4(2) = √(2/π) and c4(n) c4(n+1) = √((n−1)/n): only square roots.
 * Throws a RangeError below n = 2 or when n is not whole. Source: ISO 7870-2; ASTM E2587 (definition).
 */
export function meanOfSpread(n: number): number {
  if (!Number.isInteger(n) || n < 2) throw new RangeError(`c4 of ${n} values`)
  let value = Math.sqrt(2 / Math.PI)
  for (let size = 2; size < n; size += 1) value = Math.sqrt((size - 1) / size) / value
  return value
}

/** d2(2) = 2/√π: mean range of two normal values over σ. Source: ASTM E2587 (definition). */
export const MEAN_RANGE_OF_TWO = 2 / Math.sqrt(Math.PI)
