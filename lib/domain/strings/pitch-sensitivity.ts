import { ln } from '../units/elementary'
import { positive } from '../units/positive'
import { type Cents, cents } from '../units/quantity'
import { ratioOfCents } from './pitch'

/** What changes: mass per metre, diameter (at fixed density), speaking length, tension. */
export type PitchCause = 'mu' | 'd' | 'L' | 'T'

/** Exponents of f = √(T/µ)/(2L) with µ ∝ d². */
const exponents: Readonly<Record<PitchCause, number>> = { mu: -0.5, d: -1, L: -1, T: 0.5 }

/**
 * Cents by which the fundamental moves when one quantity changes by a relative amount and the others stay:
 * −8.61 c per +1 % of µ, +8.61 of T, −17.23 of L or d.
 * Throws a RangeError when the change is −1 or below. Source: f = √(T/µ)/(2L), exact.
 */
export const centsOfChange = (cause: PitchCause, relative: number): Cents =>
  cents((1200 * exponents[cause] * ln(positive('1 + change', 1 + relative))) / Math.LN2)

/**
 * Relative change of tension at fixed pitch: µ 1 % → 1 %; d or L 1 % → 2.01 %. A string is tuned: a deviation
 * of mass changes the pull, not the note. Source: T = µ(2Lf)², exact.
 */
export const tensionChangeAtPitch = (cause: Exclude<PitchCause, 'T'>, relative: number): number =>
  cause === 'mu' ? relative : 2 * relative + relative * relative

/** An interval in cents as ratios of frequency and of mass per metre or tension. */
export function ratiosOfCents(interval: Cents): {
  readonly frequency: number
  readonly massOrTension: number
} {
  const frequency = ratioOfCents(interval)
  return { frequency, massOrTension: frequency * frequency }
}
