import type { StaffSegment, ToleranceLine } from './staff-chart'

/** Two staff lines are 14 px apart, which is 1 σ of the newest limit set in the window. */
export const STAFF_SPACE = 14

/** Spaces that limit lines may take before a stave is drawn at a smaller scale: the staff and as much again. */
const MOST_SPACES = 13

/** px from the middle that notes are followed to, before they stand at the edge with an arrow. */
const FOLLOWED = 119
/** A stave is never drawn at less than a third of its scale for the sake of notes far off. */
const LEAST_SHARE = 3

const isUsable = (perSpace: number): boolean => Number.isFinite(perSpace) && perSpace > 0

/** Not as arguments of one call: a works of many years has more values than a call takes. */
const largest = (values: readonly number[]): number =>
  values.reduce((most, value) => Math.max(most, value), Number.NEGATIVE_INFINITY)
const smallest = (values: readonly number[]): number =>
  values.reduce((least, value) => Math.min(least, value), Number.POSITIVE_INFINITY)

const widest = (values: readonly number[]): number =>
  values.length === 0 ? 0 : largest(values) - smallest(values)

/** The distance from the middle within which all values but the furthest twentieth lie (at least one may be). */
function followed(values: readonly number[], middle: number): number {
  const distances = Float64Array.from(values, (value) => Math.abs(value - middle)).sort()
  return distances[distances.length - 2 - Math.floor(distances.length / 20)] ?? 0
}

/** A step in the last decimal shown, so that equal values still have a scale. */
const lastPlace = (decimals: number): number => 10 ** -decimals

/**
 * Middle and units per space of a stave. With limits a space is 1 σ of the newest set, or more where a change of
 * limit sets or a lasting shift would carry lines or notes out of sight. Without limits six spaces hold the tolerance or the
 * values, whichever is wider; equal values alone are drawn in steps of their last decimal.
 */
export function staveScale(
  segments: readonly StaffSegment[],
  values: readonly number[],
  tolerances: readonly ToleranceLine[],
  decimals: number,
): { readonly middle: number; readonly perSpace: number } {
  const newest = segments.at(-1)
  if (newest && isUsable(newest.sigma)) {
    const reach = widest(
      segments.flatMap(({ centre, upper = centre, lower = centre }) => [centre, upper, lower]),
    )
    const perSpace = Math.max(newest.sigma, reach / MOST_SPACES)
    // A process that has left for good is followed at a smaller scale; a single slip is not.
    const far = followed(values, newest.centre) * (STAFF_SPACE / FOLLOWED)
    return { middle: newest.centre, perSpace: Math.max(perSpace, Math.min(far, LEAST_SHARE * perSpace)) }
  }
  const limits = tolerances.map(({ value }) => value)
  const middleOf = (all: readonly number[]): number => (largest(all) + smallest(all)) / 2
  const middle =
    newest?.centre ??
    (limits.length === 2 ? middleOf(limits) : values.length > 0 ? middleOf(values) : (limits[0] ?? 0))
  const extent = Math.max(
    widest(limits),
    2 * largest([0, ...values.map((value) => Math.abs(value - middle))]),
  )
  const perSpace = extent / 6
  return { middle, perSpace: isUsable(perSpace) ? perSpace : lastPlace(decimals) }
}
