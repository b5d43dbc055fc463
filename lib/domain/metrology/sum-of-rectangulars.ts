import { findRoot } from '../statistics/find-root'

/**
 * P(−x ≤ Σ X_i ≤ x) for independent X_i rectangular on ± a_i, x ≥ 0.
 * The distribution of the sum is a piecewise polynomial: 1/(n! Π 2a_i) Σ_s (Π s_i)(x + Σ s_i a_i)₊ⁿ over all
 * signs s. Source: repeated integration of the rectangles, derived. For at most twelve inputs.
 */
export function coverageOfRectangularSum(halfWidths: readonly number[], x: number): number {
  const n = halfWidths.length
  if (n === 0 || n > 12 || halfWidths.some((a) => !(a > 0)))
    throw new RangeError(`sum of rectangles of half-widths ${halfWidths.join(', ')}`)
  let scale = 1
  halfWidths.forEach((a, index) => {
    scale *= 2 * a * (index + 1)
  })
  let sum = 0
  for (let signs = 0; signs < 1 << n; signs += 1) {
    let at = x
    let sign = 1
    halfWidths.forEach((a, index) => {
      const minus = ((signs >> index) & 1) === 1
      at += minus ? -a : a
      if (minus) sign = -sign
    })
    if (at > 0) {
      let term = sign
      for (let step = 0; step < n; step += 1) term *= at
      sum += term
    }
  }
  return 2 * (sum / scale) - 1
}

/**
 * Half-width of the symmetric interval that holds the share p of a sum of rectangular inputs: what k u
 * overstates when few rectangular inputs rule a budget. Throws a RangeError unless 0 < p < 1.
 * Source: JCGM 101:2008, 9.2.3 (four equal ones).
 */
export function halfWidthOfRectangularSum(halfWidths: readonly number[], coverage: number): number {
  if (!(coverage > 0 && coverage < 1)) throw new RangeError(`coverage ${coverage}`)
  const reach = halfWidths.reduce((sum, a) => sum + a, 0)
  return findRoot((x) => coverageOfRectangularSum(halfWidths, x) - coverage, 0, reach)
}
