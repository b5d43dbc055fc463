import { sumOfSquaresAboutMean } from './sum-of-squares'

/** Squares of numbers between these neither overflow nor lose digits to underflow. */
const LARGEST = 1e140
const SMALLEST = 1e-140

/**
 * Sample standard deviation √(Σ(x − x̄)²/(n − 1)), in the unit of the values. It estimates σ a little too low
 * (mean c4·σ for normal values). Not for limits of a chart over lots with drift: there σ comes from moving
 * ranges. Undefined for fewer than two values; 0 when all are equal.
 *
 * Source: definition (ISO 3534-1).
 */
export function sampleStandardDeviation(values: readonly number[]): number | undefined {
  if (values.length < 2) return undefined
  const first = values[0] ?? 0
  const size = values.reduce((most, value) => Math.max(most, Math.abs(value - first)), 0)
  const scale = size > LARGEST || (size > 0 && size < SMALLEST) ? size : 1
  const scaled = scale === 1 ? values : values.map((value) => (value - first) / scale)
  const squares = sumOfSquaresAboutMean(scaled)
  return squares === undefined ? undefined : scale * Math.sqrt(squares / (values.length - 1))
}
