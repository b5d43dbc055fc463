/** Both tails of a distribution, each with its own digits: 1 − p has none left where p is nearly 1. */
export interface Tails {
  /** P(X ≤ x). */
  readonly lower: number
  /** P(X > x). */
  readonly upper: number
}
