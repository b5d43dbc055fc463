import { COVERAGE_FACTOR } from '../metrology/closure'
import { normalQuantile } from '../statistics/normal-quantile'
import type { Limits } from './judge-specimen'

export interface GuardBand {
  /** Width w, in the unit of the quantity. */
  readonly width: number
  /** w over the expanded uncertainty U = 2u. */
  readonly factor: number
  /** The tolerance less the guard band on each side that has a limit. */
  readonly accept: Limits
}

/** Guard band r·U: values inside `accept` are inside the tolerance. Source: JCGM 106:2012, 8.3; ISO 14253-1. */
export function guardBand(limits: Limits, u: number, factor: number): GuardBand {
  const width = factor * COVERAGE_FACTOR * u
  return {
    width,
    factor,
    accept: {
      ...(limits.lower === undefined ? {} : { lower: limits.lower + width }),
      ...(limits.upper === undefined ? {} : { upper: limits.upper - width }),
    },
  }
}

/**
 * The guard band with which a value just accepted conforms with at least the probability p towards the nearer
 * limit: w = z_p u. Throws a RangeError unless 0 < p < 1. Source: JCGM 106:2012, 8.3.2.
 */
export const guardBandForProbability = (limits: Limits, u: number, p: number): GuardBand =>
  guardBand(limits, u, normalQuantile(p) / COVERAGE_FACTOR)

/** Tolerance width over 4u: how fine the measurement is for it. Source: JCGM 106:2012, 7.6.3. */
export const measurementCapability = (limits: Required<Limits>, u: number): number =>
  (limits.upper - limits.lower) / (4 * u)
