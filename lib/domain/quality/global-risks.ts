import { integrate } from '../statistics/gauss-legendre'
import { normalCdf } from '../statistics/normal'
import { normalDensity } from '../statistics/normal-density'

export interface GlobalRisks {
  /** Outside the tolerance, yet accepted. */
  readonly consumer: number
  /** Inside the tolerance, yet rejected. */
  readonly producer: number
  readonly conforming: number
  readonly accepted: number
}

export interface RiskSetting {
  /** Mean and standard deviation of what is made. */
  readonly mean: number
  readonly deviation: number
  /** Standard uncertainty of measuring. */
  readonly u: number
  readonly tolerance: { readonly lower: number; readonly upper: number }
  readonly accept: { readonly lower: number; readonly upper: number }
}

/**
 * How often, over a normal production measured with a normal error, a nonconforming item is accepted and a
 * conforming one rejected: joint probabilities. Throws a RangeError unless both deviations are above zero.
 * Source: JCGM 106:2012, 9.5.
 */
export function globalRisks({ accept, deviation, mean, tolerance, u }: RiskSetting): GlobalRisks {
  if (!(deviation > 0 && u > 0)) throw new RangeError(`risks with deviations ${deviation} and ${u}`)
  const made = (x: number) => normalDensity((x - mean) / deviation) / deviation
  const acceptedAt = (x: number) => normalCdf((accept.upper - x) / u) - normalCdf((accept.lower - x) / u)
  const both = (x: number) => made(x) * acceptedAt(x)
  // Nothing is left of a normal curve nine deviations from its middle; between the places where acceptance
  // changes, the curve of what is made is all there is to follow.
  const [from, to] = [mean - 9 * deviation, mean + 9 * deviation]
  const places = [accept.lower - 9 * u, accept.lower + 9 * u, accept.upper - 9 * u, accept.upper + 9 * u]
  const sum = (a: number, b: number): number => {
    const cuts = [a, ...places.filter((x) => x > a && x < b).sort((x, y) => x - y), b]
    return cuts.slice(1).reduce((total, end, index) => {
      const start = cuts[index] ?? a
      const panels = Math.ceil((end - start) / Math.min(deviation, Math.max(u, (end - start) / 40)))
      return end > start ? total + integrate(both, start, end, panels) : total
    }, 0)
  }
  const within = (x: number) => Math.min(to, Math.max(from, x))
  const [lower, upper] = [within(tolerance.lower), within(tolerance.upper)]
  const acceptedInside = sum(lower, upper)
  const consumer = sum(from, lower) + sum(upper, to)
  const conforming =
    normalCdf((tolerance.upper - mean) / deviation) - normalCdf((tolerance.lower - mean) / deviation)
  return {
    consumer,
    producer: Math.max(0, conforming - acceptedInside),
    conforming,
    accepted: acceptedInside + consumer,
  }
}
