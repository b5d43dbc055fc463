import { incompleteBeta } from './incomplete-beta'
import { incompleteGamma } from './incomplete-gamma'
import type { Tails } from './tails'

/** P(K ≤ k) and P(K > k) of the binomial distribution: n trials, each with probability p. Source: DLMF 8.17(i); NIST/SEMATECH e-Handbook 1.3.6.6.18. */
export function binomialTails(k: number, n: number, p: number): Tails {
  if (k < 0) return { lower: 0, upper: 1 }
  if (k >= n) return { lower: 1, upper: 0 }
  const whole = Math.floor(k)
  const { lower, upper } = incompleteBeta(whole + 1, n - whole, p, 1 - p)
  return { lower: upper, upper: lower }
}

/** P(K ≤ k) and P(K > k) of the Poisson distribution of the given mean. */
export function poissonTails(k: number, mean: number): Tails {
  if (k < 0) return { lower: 0, upper: 1 }
  const { lower, upper } = incompleteGamma(Math.floor(k) + 1, mean)
  return { lower: upper, upper: lower }
}
