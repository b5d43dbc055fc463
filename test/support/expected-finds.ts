import { type Random, seededRandom } from '@/prisma/demo/random'

/** A fault as a statistician would draw it: standard normal lots, a shift in σ, limits from a baseline. */
export interface DrawnFault {
  readonly products: number
  readonly baseline: number
  /** Lots within which it is to be found; products take turns. */
  readonly lots: number
  /** Departure of the lot’s mean, σ, at its place from 1. */
  readonly shift?: (place: number) => number
  /** How much wider its five specimens differ; the chart is then that of their standard deviation. */
  readonly spread?: number
}

const WORKS = 4000
const D2 = 1.128
const C4 = 0.94

const mean = (values: readonly number[]): number => values.reduce((sum, one) => sum + one, 0) / values.length

const spreadOfFive = (random: Random, times: number): number => {
  const values = Array.from({ length: 5 }, () => times * random.normal(6))
  const centre = mean(values)
  return Math.sqrt(values.reduce((sum, one) => sum + (one - centre) ** 2, 0) / 4)
}

interface Limits {
  readonly centre: number
  readonly sigma: number
}

function limitsOf(values: readonly number[], isSpread: boolean): Limits {
  const centre = mean(values)
  if (isSpread) return { centre, sigma: (centre * Math.sqrt(1 - C4 * C4)) / C4 }
  const ranges = values.slice(1).map((value, index) => Math.abs(value - (values[index] ?? 0)))
  return { centre, sigma: mean(ranges) / D2 }
}

/** Whether one works finds it: a lot beyond 3σ, or nine on that side in a row, of one product or over all. */
function isFound({ baseline, lots, products, shift, spread }: DrawnFault, random: Random): boolean {
  const draw = (times: number): number =>
    spread === undefined ? random.normal(6) : spreadOfFive(random, times)
  const limits = Array.from({ length: products }, () =>
    limitsOf(
      Array.from({ length: baseline }, () => draw(1)),
      spread !== undefined,
    ),
  )
  const runs = limits.map(() => 0)
  let together = 0
  for (let place = 1; place <= lots; place += 1) {
    const product = place % products
    const { centre, sigma } = limits[product] ?? { centre: 0, sigma: 1 }
    const z = (draw(spread ?? 1) + (shift?.(place) ?? 0) - centre) / sigma
    together = z > 0 ? together + 1 : 0
    runs[product] = z > 0 ? (runs[product] ?? 0) + 1 : 0
    if (z > 3 || together >= 9 || (runs[product] ?? 0) >= 9) return true
  }
  return false
}

/**
 * Share of works in which the charts find a fault within so many of its lots, from nothing but its size in σ: it
 * knows nothing of the demo, its generator or the program’s charts, and writes their rules anew.
 */
export function expectedFinds(fault: DrawnFault): number {
  const random = seededRandom(97)
  let found = 0
  for (let works = 0; works < WORKS; works += 1) if (isFound(fault, random)) found += 1
  return found / WORKS
}

/** Fewest of `n` that are found when each is with probability p: three standard deviations below the mean. */
export const fewestOf = (n: number, p: number): number => n * p - 3 * Math.sqrt(n * p * (1 - p))
