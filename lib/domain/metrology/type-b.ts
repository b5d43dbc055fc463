/** What is known of a quantity between its bounds. `normal-95`: the bounds hold 95 % of a normal one. */
export type BoundsDistribution = 'rectangular' | 'triangular' | 'arcsine' | 'normal-95'

const divisors: Readonly<Record<BoundsDistribution, number>> = {
  rectangular: Math.sqrt(3),
  triangular: Math.sqrt(6),
  arcsine: Math.SQRT2,
  'normal-95': 1.959963984540054,
}

/**
 * Standard uncertainty from bounds ± a: rectangular a/√3, triangular a/√6, arcsine (a temperature that swings
 * between two limits) a/√2, a normal one of which 95 % lies within a/1.96.
 * `halfWidth` in the unit of the quantity. Throws a RangeError for a negative or non-finite half-width.
 * Source: JCGM 100:2008, 4.3.4, 4.3.7, 4.3.9; arcsine H.1.3.4.
 */
export function standardUncertaintyFromBounds(
  halfWidth: number,
  distribution: BoundsDistribution = 'rectangular',
): number {
  if (!Number.isFinite(halfWidth) || halfWidth < 0) throw new RangeError(`half-width ${halfWidth}`)
  return halfWidth / divisors[distribution]
}

/** Standard uncertainty of a reading with resolution step q: q/√12 (JCGM 100:2008, F.2.2.1). */
export const resolutionUncertainty = (step: number): number => standardUncertaintyFromBounds(step / 2)
