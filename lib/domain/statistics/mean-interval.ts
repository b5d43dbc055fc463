import { chiSquareQuantile } from './chi-square'
import { tQuantile } from './student-t'
import type { Summary } from './summary'

export type Interval = readonly [lower: number, upper: number]

/** Two-sided interval for the mean of normal values, x̄ ± t·s/√n. Undefined for fewer than two values. Source: NIST/SEMATECH e-Handbook 1.3.5.2. */
export function meanInterval({ m2, mean, n }: Summary, confidence: number): Interval | undefined {
  if (n < 2) return undefined
  const half = tQuantile((1 + confidence) / 2, n - 1) * Math.sqrt(m2 / (n - 1) / n)
  return [mean - half, mean + half]
}

/** Two-sided interval for the standard deviation of normal values, by χ². Undefined below two values. */
export function standardDeviationInterval({ m2, n }: Summary, confidence: number): Interval | undefined {
  if (n < 2) return undefined
  const at = (p: number) => Math.sqrt(m2 / chiSquareQuantile(p, n - 1))
  return [at((1 + confidence) / 2), at((1 - confidence) / 2)]
}
