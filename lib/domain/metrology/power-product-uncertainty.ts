/** A factor x^p of a product, with the standard uncertainty of x in the unit of x. */
export interface PowerFactor {
  readonly value: number
  readonly u: number
  readonly exponent: number
}

export interface PowerProduct {
  readonly value: number
  readonly u: number
  readonly relative: number
  /** c_i u_i of each factor, signed, in the unit of the product. */
  readonly contributions: readonly number[]
}

const power = (x: number, p: number): number => {
  let product = 1
  for (let step = 0; step < Math.abs(p); step += 1) product *= x
  return p < 0 ? 1 / product : product
}

/**
 * Value and uncertainty of y = c Π x_i^p_i, whose relative variance is Σ (p_i u_i/x_i)² and, for correlated
 * inputs, 2 Σ r_ij p_i p_j (u_i/x_i)(u_j/x_j) more. Exponents are whole numbers.
 * Throws a RangeError for a factor that is zero or an exponent that is not whole.
 * Source: JCGM 100:2008, 5.1.6 and 5.2.2.
 */
export function powerProductUncertainty(
  factors: readonly PowerFactor[],
  {
    constant = 1,
    correlation,
  }: { readonly constant?: number; readonly correlation?: readonly (readonly number[])[] } = {},
): PowerProduct {
  let value = constant
  for (const { value: x, exponent } of factors) {
    if (x === 0 || !Number.isInteger(exponent)) throw new RangeError(`factor ${x} to the power ${exponent}`)
    value *= power(x, exponent)
  }
  const contributions = factors.map(({ value: x, u, exponent }) => (value * exponent * u) / x)
  let variance = 0
  contributions.forEach((one, i) => {
    contributions.forEach((other, j) => {
      variance += one * other * (i === j ? 1 : (correlation?.[i]?.[j] ?? 0))
    })
  })
  const u = Math.sqrt(Math.max(0, variance))
  return { value, u, relative: u / Math.abs(value), contributions }
}
