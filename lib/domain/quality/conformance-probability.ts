import { normalCdf, normalUpperTail } from '../statistics/normal'
import type { Limits } from './judge-specimen'

/**
 * Probability that a quantity of which y ± u is known lies inside its limits (either may be missing):
 * Φ((U−y)/u) − Φ((L−y)/u), computed from the tails so that 1 − tiny keeps its meaning. Without uncertainty it
 * is 1 on or inside the limits, else 0. Source: JCGM 106:2012, 7.4.
 */
export function conformanceProbability(y: number, u: number, { lower, upper }: Limits): number {
  if (!(u > 0)) return (lower ?? y) <= y && y <= (upper ?? y) ? 1 : 0
  const above = upper === undefined ? 0 : normalUpperTail((upper - y) / u)
  const below = lower === undefined ? 0 : normalCdf((lower - y) / u)
  return Math.max(0, 1 - above - below)
}
