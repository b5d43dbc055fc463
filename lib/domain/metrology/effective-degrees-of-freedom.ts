import { tQuantile } from '../statistics/student-t'

/** Standard uncertainty of one input (in the result's unit) with its degrees of freedom, Infinity for type B. */
export interface UncertaintyWithFreedom {
  readonly u: number
  readonly degrees: number
}

/**
 * Combined standard uncertainty and its effective degrees of freedom, ν = u⁴/Σ(u_i⁴/ν_i); Infinity when no
 * part has finitely many. Throws a RangeError when there is no uncertainty or a ν_i is not above zero.
 * Source: Welch–Satterthwaite formula, JCGM 100:2008, G.4.1.
 */
export function effectiveDegreesOfFreedom(parts: readonly UncertaintyWithFreedom[]): UncertaintyWithFreedom {
  let variance = 0
  for (const { u } of parts) variance += u * u
  if (!(variance > 0)) throw new RangeError(`degrees of freedom of a combined uncertainty of ${variance}`)
  let sum = 0
  for (const { u, degrees } of parts) {
    if (!(degrees > 0)) throw new RangeError(`${degrees} degrees of freedom`)
    const share = (u * u) / variance
    sum += (share * share) / degrees
  }
  return { u: Math.sqrt(variance), degrees: sum > 0 ? 1 / sum : Number.POSITIVE_INFINITY }
}

/**
 * Coverage factor k for two-sided coverage p: the t quantile at (1 + p)/2. With `truncated` the degrees of
 * freedom are cut to the next lower whole number, as JCGM 100:2008, G.4.1 advises; else used as they are.
 */
export function coverageFactor(degrees: number, coverage = 0.95, truncated = true): number {
  return tQuantile((1 + coverage) / 2, truncated ? Math.floor(degrees) : degrees)
}
