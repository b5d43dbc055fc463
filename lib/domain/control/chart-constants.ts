import { meanRelativeRange, sdOfRelativeRange } from '../statistics/relative-range'
import { meanOfSpread } from './spread-constants'

/** Factors of control charts for subgroups of n normal values, by their names in the standards. */
export interface ChartConstants {
  /** Mean and standard deviation of the range over σ. */
  readonly d2: number
  readonly d3: number
  /** Mean of the sample standard deviation over σ. */
  readonly c4: number
  /** Limits of means: ± A σ, ± A2 R̄, ± A3 s̄. */
  readonly A: number
  readonly A2: number
  readonly A3: number
  /** Limits of the standard deviation: B3 s̄ and B4 s̄, B5 σ and B6 σ. */
  readonly B3: number
  readonly B4: number
  readonly B5: number
  readonly B6: number
  /** Limits of the range: D3 R̄ and D4 R̄, D1 σ and D2 σ. */
  readonly D1: number
  readonly D2: number
  readonly D3: number
  readonly D4: number
  /** Limits of individuals: ± E2 R̄, ± E3 s̄. */
  readonly E2: number
  readonly E3: number
}

/** Integrals of the range take a while, and a chart asks again and again for the same size. */
const known = new Map<number, ChartConstants>()

/**
 * Unrounded chart factors for subgroups of n values, limits at 3σ; lower factors are never below zero.
 * Throws a RangeError unless n is whole and at least 2. Source: ISO 7870-2; ASTM E2587 (definitions).
 */
export function chartConstants(n: number): ChartConstants {
  const constants = known.get(n) ?? reckon(n)
  known.set(n, constants)
  return constants
}

function reckon(n: number): ChartConstants {
  const [d2, d3, c4] = [meanRelativeRange(n), sdOfRelativeRange(n), meanOfSpread(n)]
  const spread = 3 * Math.sqrt(1 - c4 * c4)
  const A = 3 / Math.sqrt(n)
  return {
    d2,
    d3,
    c4,
    A,
    A2: A / d2,
    A3: A / c4,
    B3: Math.max(0, 1 - spread / c4),
    B4: 1 + spread / c4,
    B5: Math.max(0, c4 - spread),
    B6: c4 + spread,
    D1: Math.max(0, d2 - 3 * d3),
    D2: d2 + 3 * d3,
    D3: Math.max(0, 1 - (3 * d3) / d2),
    D4: 1 + (3 * d3) / d2,
    E2: 3 / d2,
    E3: 3 / c4,
  }
}
