import type { StaffSegment, ToleranceLine } from './staff-chart'

/** Two staff lines are 14 px apart, which is 1 σ of the newest limit set in the window. */
export const STAFF_SPACE = 14

/** Spaces that limit lines may take before a stave is drawn at a smaller scale: the staff and as much again. */
const MOST_SPACES = 13

const isUsable = (perSpace: number): boolean => Number.isFinite(perSpace) && perSpace > 0

const widest = (values: readonly number[]): number =>
  values.length === 0 ? 0 : Math.max(...values) - Math.min(...values)

/** A step in the last decimal shown, so that equal values still have a scale. */
const lastPlace = (decimals: number): number => 10 ** -decimals

/**
 * Middle and units per space of a stave. With limits a space is 1 σ of the newest set, or more where a change of
 * limit sets would carry the older lines out of sight. Without limits six spaces hold the tolerance or the
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
    return { middle: newest.centre, perSpace: Math.max(newest.sigma, reach / MOST_SPACES) }
  }
  const limits = tolerances.map(({ value }) => value)
  const middleOf = (all: readonly number[]): number => (Math.max(...all) + Math.min(...all)) / 2
  const middle =
    newest?.centre ??
    (limits.length === 2 ? middleOf(limits) : values.length > 0 ? middleOf(values) : (limits[0] ?? 0))
  const extent = Math.max(widest(limits), 2 * Math.max(0, ...values.map((value) => Math.abs(value - middle))))
  const perSpace = extent / 6
  return { middle, perSpace: isUsable(perSpace) ? perSpace : lastPlace(decimals) }
}
