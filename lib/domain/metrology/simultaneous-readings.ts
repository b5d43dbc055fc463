export interface SimultaneousMeans {
  readonly means: readonly number[]
  readonly u: readonly number[]
  /** Covariance of the means. */
  readonly covariance: readonly (readonly number[])[]
}

/**
 * Means of quantities that were read together n times, with the covariance of the means,
 * Σ (x_k − x̄)(y_k − ȳ)/(n(n − 1)): what varies together keeps its correlation.
 * Undefined with fewer than two readings. Throws a RangeError for series of different lengths.
 * Source: JCGM 100:2008, 5.2.3 and H.2.
 */
export function simultaneousMeans(series: readonly (readonly number[])[]): SimultaneousMeans | undefined {
  const n = series[0]?.length ?? 0
  if (series.some((one) => one.length !== n)) throw new RangeError('series of different lengths')
  if (n < 2) return undefined
  const means = series.map((one) => one.reduce((sum, x) => sum + x, 0) / n)
  const departures = series.map((one, index) => one.map((x) => x - (means[index] ?? 0)))
  const covariance = departures.map((one) =>
    departures.map((other) => one.reduce((sum, x, k) => sum + x * (other[k] ?? 0), 0) / (n * (n - 1))),
  )
  return { means, covariance, u: covariance.map((row, index) => Math.sqrt(row[index] ?? 0)) }
}

/**
 * Law of propagation for several results of correlated inputs: U = J C Jᵀ, J the sensitivities ∂y_i/∂x_j, C the
 * covariance of the inputs. Returns the standard uncertainties and the correlations of the results.
 * Source: JCGM 100:2008, 5.2.2 and H.2.3.
 */
export function propagateCovariance(
  sensitivities: readonly (readonly number[])[],
  covariance: readonly (readonly number[])[],
): { readonly u: readonly number[]; readonly correlation: readonly (readonly number[])[] } {
  const between = (one: readonly number[], other: readonly number[]): number =>
    covariance.reduce(
      (sum, row, i) => sum + row.reduce((inner, c, j) => inner + (one[i] ?? 0) * c * (other[j] ?? 0), 0),
      0,
    )
  const all = sensitivities.map((one) => sensitivities.map((other) => between(one, other)))
  const u = all.map((row, index) => Math.sqrt(Math.max(0, row[index] ?? 0)))
  return { u, correlation: all.map((row, i) => row.map((c, j) => c / ((u[i] ?? 0) * (u[j] ?? 0)))) }
}
