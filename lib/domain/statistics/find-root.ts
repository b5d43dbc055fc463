const MOST_STEPS = 200
const EPSILON = 2.220446049250313e-16

/**
 * Root of a continuous function between two places where its signs differ, to the last digits of the place.
 * Throws a RangeError when the signs do not differ.
 *
 * Source: R. P. Brent, Algorithms for Minimization without Derivatives (1973), chapter 4.
 */
export function findRoot(f: (x: number) => number, from: number, to: number): number {
  let a = from
  let b = to
  let fa = f(a)
  let fb = f(b)
  if (fa === 0) return a
  if (fb === 0) return b
  if (!(fa * fb < 0)) throw new RangeError(`no change of sign between ${from} (${fa}) and ${to} (${fb})`)
  let c = a
  let fc = fa
  let step = b - a
  let before = step
  for (let count = 0; count < MOST_STEPS; count += 1) {
    if (Math.abs(fc) < Math.abs(fb)) {
      ;[a, b, c] = [b, c, b]
      ;[fa, fb, fc] = [fb, fc, fb]
    }
    const near = 2 * EPSILON * Math.abs(b)
    const half = (c - b) / 2
    if (Math.abs(half) <= near || fb === 0) return b
    const next = Math.abs(before) >= near && Math.abs(fa) > Math.abs(fb) ? interpolate() : undefined
    before = next === undefined ? half : step
    step = next ?? half
    a = b
    fa = fb
    b += Math.abs(step) > near ? step : half > 0 ? near : -near
    fb = f(b)
    if (fb > 0 === fc > 0) {
      c = a
      fc = fa
      step = b - a
      before = step
    }

    function interpolate(): number | undefined {
      const s = fb / fa
      let p = 2 * half * s
      let q = 1 - s
      if (a !== c) {
        const r = fb / fc
        const t = fa / fc
        p = s * (2 * half * t * (t - r) - (b - a) * (r - 1))
        q = (t - 1) * (r - 1) * (s - 1)
      }
      if (p > 0) q = -q
      p = Math.abs(p)
      return 2 * p < Math.min(3 * half * q - Math.abs(near * q), Math.abs(before * q)) ? p / q : undefined
    }
  }
  return b
}
