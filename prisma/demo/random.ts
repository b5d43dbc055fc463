/** A small seeded generator (mulberry32): the demo works is the same on every machine, every time. */
export interface Random {
  /** Uniform in [0, 1). */
  readonly uniform: () => number
  /** Standard normal, cut at ± `cut`. */
  readonly normal: (cut?: number) => number
}

export function seededRandom(seed: number): Random {
  let state = seed >>> 0
  const uniform = () => {
    state = (state + 0x6d2b79f5) >>> 0
    let t = state
    t = Math.imul(t ^ (t >>> 15), t | 1)
    t ^= t + Math.imul(t ^ (t >>> 7), t | 61)
    return ((t ^ (t >>> 14)) >>> 0) / 4294967296
  }
  // The sum of twelve uniforms: near enough to normal for a demo, and exact arithmetic everywhere.
  const once = () => {
    let sum = -6
    for (let draw = 0; draw < 12; draw += 1) sum += uniform()
    return sum
  }
  return {
    uniform,
    normal: (cut = 3) => {
      for (;;) {
        const z = once()
        if (Math.abs(z) <= cut) return z
      }
    },
  }
}
