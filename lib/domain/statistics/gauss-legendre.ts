import { cos } from '../units/elementary'

interface Rule {
  readonly nodes: readonly number[]
  readonly weights: readonly number[]
}

/** Nodes and weights on −1 … 1, by Newton's method on the Legendre polynomial. Source: DLMF 3.5(v). */
export function gaussLegendre(n: number): Rule {
  const nodes: number[] = []
  const weights: number[] = []
  for (let i = 0; i < n; i += 1) {
    let x = cos((Math.PI * (i + 0.75)) / (n + 0.5))
    let slope = 1
    for (let step = 0; step < 30; step += 1) {
      let before = 1
      let value = x
      for (let k = 2; k <= n; k += 1)
        [before, value] = [value, ((2 * k - 1) * x * value - (k - 1) * before) / k]
      slope = (n * (x * value - before)) / (x * x - 1)
      const change = value / slope
      x -= change
      if (Math.abs(change) < 1e-16) break
    }
    nodes.push(-x)
    weights.push(2 / ((1 - x * x) * slope * slope))
  }
  return { nodes, weights }
}

const SIXTEEN = gaussLegendre(16)

/**
 * ∫ f over from … to by Gauss–Legendre rules of sixteen nodes on equal panels: exact to rounding where a panel
 * is short against the features of a smooth f.
 */
export function integrate(f: (x: number) => number, from: number, to: number, panels: number): number {
  const half = (to - from) / panels / 2
  let sum = 0
  for (let panel = 0; panel < panels; panel += 1) {
    const middle = from + (2 * panel + 1) * half
    SIXTEEN.nodes.forEach((node, index) => {
      sum += (SIXTEEN.weights[index] ?? 0) * f(middle + half * node)
    })
  }
  return sum * half
}
