/**
 * Standard uncertainty from bounds (JCGM 100:2008, 4.3.7 and 4.3.9): rectangular a/√3, triangular a/√6.
 * `halfWidth` in the unit of the quantity. Throws a RangeError for a negative or non-finite half-width.
 */
export function standardUncertaintyFromBounds(
  halfWidth: number,
  distribution: 'rectangular' | 'triangular' = 'rectangular',
): number {
  if (!Number.isFinite(halfWidth) || halfWidth < 0) throw new RangeError(`half-width ${halfWidth}`)
  return halfWidth / Math.sqrt(distribution === 'rectangular' ? 3 : 6)
}

/** Standard uncertainty of a reading with resolution step q: q/√12 (JCGM 100:2008, F.2.2.1). */
export const resolutionUncertainty = (step: number): number => standardUncertaintyFromBounds(step / 2)
