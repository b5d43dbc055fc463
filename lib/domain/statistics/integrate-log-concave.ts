import { exp, ln } from '../units/elementary'
import { integrate } from './gauss-legendre'

/** What lies this far (in logarithm) below the peak does not count: e^−45 is 3e-20. */
const DEPTH = 45
const GOLDEN = (Math.sqrt(5) - 1) / 2

/** Place of the maximum of a function of one peak on 0 … ∞. Source: derived (concave g has one peak). */
function peakOf(g: (x: number) => number): number {
  let low = 0
  let high = 1
  while (g(2 * high) > g(high)) high *= 2
  high *= 2
  let a = high - GOLDEN * (high - low)
  let b = low + GOLDEN * (high - low)
  let ga = g(a)
  let gb = g(b)
  // A rough place is enough: the integral does not depend on it.
  for (let step = 0; step < 60 && high - low > 1e-6 * high; step += 1) {
    if (ga > gb) {
      high = b
      b = a
      gb = ga
      a = high - GOLDEN * (high - low)
      ga = g(a)
    } else {
      low = a
      a = b
      ga = gb
      b = low + GOLDEN * (high - low)
      gb = g(b)
    }
  }
  return (low + high) / 2
}

/** Where g falls below `level` between `inside` (above it) and `outside` (below it). */
function edge(g: (x: number) => number, level: number, inside: number, outside: number): number {
  let near = inside
  let far = outside
  for (let step = 0; step < 40; step += 1) {
    const middle = (near + far) / 2
    if (g(middle) > level) near = middle
    else far = middle
  }
  return far
}

/**
 * ln ∫ e^g over 0 … ∞ for a concave g (one peak): only where g is within 45 of its maximum, in panels short
 * against the width of the peak. `turns` are places where g bends sharply; panels do not reach across them.
 */
export function integrateLogConcave(g: (x: number) => number, turns: readonly number[] = []): number {
  const peak = peakOf(g)
  const height = g(peak)
  const level = height - DEPTH
  let right = 2 * peak
  while (g(right) > level) right *= 2
  right = edge(g, level, peak, right)
  const left = edge(g, level, peak, 0)
  const breaks = [left, ...turns.filter((turn) => turn > left && turn < right).sort((a, b) => a - b), right]
  let sum = 0
  breaks.forEach((to, index) => {
    const from = breaks[index - 1]
    if (from !== undefined) sum += integrate((x) => exp(g(x) - height), from, to, 20)
  })
  return height + ln(sum)
}
