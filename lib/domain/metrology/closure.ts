/** How well the two routes to mass per metre agree (DESIGN §2). */
export type ClosureVerdict = 'closed' | 'doubtful' | 'open'

/** Coverage factor of every expanded uncertainty here: U = k·u. */
export const COVERAGE_FACTOR = 2

/**
 * Normalised error of a closure: its value over its expanded uncertainty U = 2u.
 * Throws a RangeError when u is not positive.
 * Source: ISO/IEC 17043:2010, B.3.1.3 (E_n with expanded uncertainties).
 */
export function normalisedError(closure: number, u: number): number {
  if (!(u > 0)) throw new RangeError(`normalised error with standard uncertainty ${u}`)
  return closure / (COVERAGE_FACTOR * u)
}

/** At most 1: closed; at most 1.5: doubtful; above: open, and only then a fault is raised. */
export function closureVerdict(closure: number, u: number): ClosureVerdict {
  const size = Math.abs(normalisedError(closure, u))
  if (size <= 1) return 'closed'
  return size <= 1.5 ? 'doubtful' : 'open'
}
