import type { WorkingState } from './datasheet'

/**
 * Shares of the least breaking load at which the shading of a tension table changes: below 0.25 a string is
 * slack, to 0.60 it works, to 0.75 it is offered only if the maker of the instrument agrees, above it is not
 * offered. Common practice, no source: steel strings work at 0.4 to 0.75 of their breaking load.
 */
export const WORKING_BOUNDS = { slack: 0.25, working: 0.6, upper: 0.75 } as const

export function workingState(fraction: number | undefined): WorkingState {
  if (fraction === undefined) return 'working'
  if (fraction < WORKING_BOUNDS.slack) return 'slack'
  if (fraction <= WORKING_BOUNDS.working) return 'working'
  return fraction <= WORKING_BOUNDS.upper ? 'upper' : 'over'
}
