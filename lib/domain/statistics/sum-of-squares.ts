/**
 * Sum of squared departures from the mean, Σ(x − x̄)². Two passes after subtracting the first value, with the
 * second pass's own rounding taken off (Σd)²/n: a plain two-pass loop loses a factor of 8 in F on SmLs09.
 * Undefined for no values.
 *
 * Source: T. F. Chan, G. H. Golub, R. J. LeVeque, The American Statistician 37 (1983) 242 (corrected two-pass).
 */
export function sumOfSquaresAboutMean(values: readonly number[]): number | undefined {
  const first = values[0]
  if (first === undefined) return undefined
  const n = values.length
  let sum = 0
  for (const value of values) sum += value - first
  const offset = sum / n
  let squares = 0
  let rest = 0
  for (const value of values) {
    const departure = value - first - offset
    squares += departure * departure
    rest += departure
  }
  return Math.max(0, squares - (rest * rest) / n)
}
