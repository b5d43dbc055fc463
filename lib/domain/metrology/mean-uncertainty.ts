/**
 * Standard uncertainty of the mean of n specimens when a part of each uncertainty is common to them:
 * u² = u_common² + u_random²/n. The common part is never divided by √n.
 *
 * Throws a RangeError unless n ≥ 1. Source: JCGM 100:2008, 5.2.2 with correlated inputs, and F.1.2.3.
 */
export function meanUncertainty(n: number, uCommon: number, uRandom: number): number {
  if (!(n >= 1)) throw new RangeError(`mean of ${n} specimens`)
  return Math.sqrt(uCommon * uCommon + (uRandom * uRandom) / n)
}

/**
 * Correlation of the results of two specimens that share a part of their uncertainty:
 * r = u_common²/(u_common² + u_random²). Undefined when there is no uncertainty at all.
 * Source: JCGM 100:2008, F.1.2.3.
 */
export function correlationOfSpecimens(uCommon: number, uRandom: number): number | undefined {
  const common = uCommon * uCommon
  const all = common + uRandom * uRandom
  return all > 0 ? common / all : undefined
}
