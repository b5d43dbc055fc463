import { ln } from '../units/elementary'
import { findRoot } from './find-root'
import type { Tails } from './tails'

/** A probability and the tail that has it. Source: definition. */
export interface WantedTail {
  readonly tail: keyof Tails
  readonly probability: number
}

/**
 * P(X ≤ x) = p said by the smaller tail: 1 − p is exact for p ≥ ½, so that a far upper quantile keeps what p
 * itself has of it. Throws a RangeError unless 0 < p < 1.
 */
export function lowerProbability(p: number): WantedTail {
  if (!(p > 0 && p < 1)) throw new RangeError(`quantile at p = ${p}`)
  return p <= 0.5 ? { tail: 'lower', probability: p } : { tail: 'upper', probability: 1 - p }
}

/** Zero at the quantile, rising with x. An underflow counts as e^−800. */
const target =
  (tails: (x: number) => Tails, { probability, tail }: WantedTail) =>
  (x: number): number => {
    const got = tails(x)[tail]
    const excess = (got > 0 ? ln(got) : -800) - ln(probability)
    return tail === 'lower' ? excess : -excess
  }

/** Quantile of a distribution on 0 … ∞, searched by doubling or halving from `start`. */
export function positiveQuantile(tails: (x: number) => Tails, wanted: WantedTail, start: number): number {
  const f = target(tails, wanted)
  let low = start
  let high = start
  while (f(high) < 0) {
    low = high
    high *= 2
  }
  while (f(low) > 0) {
    high = low
    low /= 2
  }
  return low === high ? low : findRoot(f, low, high)
}

/** Quantile of a distribution on the whole line, searched from `start` by steps that double. */
export function realQuantile(
  tails: (x: number) => Tails,
  wanted: WantedTail,
  start: number,
  firstStep: number,
): number {
  const f = target(tails, wanted)
  let low = start
  let high = start
  for (let width = firstStep; f(high) < 0; width *= 2) {
    low = high
    high += width
  }
  for (let width = firstStep; f(low) > 0; width *= 2) {
    high = low
    low -= width
  }
  return low === high ? low : findRoot(f, low, high)
}

/** Quantile of a distribution on 0 … 1. */
export const unitQuantile = (tails: (x: number) => Tails, wanted: WantedTail): number =>
  findRoot(target(tails, wanted), 0, 1)
