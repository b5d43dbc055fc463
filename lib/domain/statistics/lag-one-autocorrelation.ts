import { mean } from './mean'
import { sumOfSquaresAboutMean } from './sum-of-squares'

/**
 * Lag-1 autocorrelation r1 = Σ(xᵢ − x̄)(xᵢ₊₁ − x̄)/Σ(xᵢ − x̄)²: how much neighbours in order are alike. Above
 * 1.96/√n the neighbours of a chart are alike, and limits from moving ranges are too narrow. Undefined when the
 * values do not vary, or for fewer than two.
 *
 * Source: NIST StRD (definition used for the certified values).
 */
export function lagOneAutocorrelation(values: readonly number[]): number | undefined {
  const middle = mean(values)
  const squares = sumOfSquaresAboutMean(values)
  if (middle === undefined || squares === undefined || !(squares > 0)) return undefined
  let products = 0
  values.forEach((value, index) => {
    const next = values[index + 1]
    if (next !== undefined) products += (value - middle) * (next - middle)
  })
  return products / squares
}

/** Largest |r1| that independent values would show in 95 of 100 series: z₀.₉₇₅/√n (Bartlett 1946). */
export const autocorrelationBound = (n: number): number => 1.959963984540054 / Math.sqrt(n)

/**
 * von Neumann's ratio Σ(xᵢ₊₁ − xᵢ)²/Σ(xᵢ − x̄)²: near 2 for independent values, lower where neighbours are
 * alike. Undefined when the values do not vary. Source: J. von Neumann, Ann. Math. Statist. 12 (1941) 367.
 */
export function vonNeumannRatio(values: readonly number[]): number | undefined {
  const squares = sumOfSquaresAboutMean(values)
  if (squares === undefined || !(squares > 0)) return undefined
  let differences = 0
  values.forEach((value, index) => {
    const next = values[index + 1]
    if (next !== undefined) differences += (next - value) * (next - value)
  })
  return differences / squares
}
