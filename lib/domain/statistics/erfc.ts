import { exp } from '../units/elementary'

const A = [3.1611237438705655, 113.86415415105016, 377.485237685302, 3209.3775891384694]
const A_LAST = 0.18577770618460315
const B = [23.601290952344122, 244.02463793444417, 1282.6165260773723, 2844.236833439171]
const C = [
  0.5641884969886701, 8.883149794388377, 66.11919063714163, 298.6351381974001, 881.952221241769,
  1712.0476126340707, 2051.0783778260716, 1230.3393547979972,
]
const C_LAST = 2.1531153547440383e-8
const D = [
  15.744926110709835, 117.6939508913125, 537.1811018620099, 1621.3895745666903, 3290.7992357334597,
  4362.619090143247, 3439.3676741437216, 1230.3393548037495,
]
const P = [
  0.30532663496123236, 0.36034489994980445, 0.12578172611122926, 0.016083785148742275, 0.0006587491615298378,
]
const P_LAST = 0.016315387137302097
const Q = [
  2.568520192289822, 1.8729528499234673, 0.5279051029514285, 0.06051834131244132, 0.0023352049762686918,
]

/** (((last·x + a₀)·x + a₁)·x …) over (((x + b₀)·x + b₁)·x …). */
function ratio(x: number, last: number, above: readonly number[], below: readonly number[]): number {
  let numerator = last * x
  let denominator = x
  above.forEach((a, index) => {
    const b = below[index] ?? 0
    const end = index === above.length - 1
    numerator = end ? numerator + a : (numerator + a) * x
    denominator = end ? denominator + b : (denominator + b) * x
  })
  return numerator / denominator
}

/** exp(−x²) without losing the digits that x² loses when it is rounded. */
function expMinusSquare(x: number): number {
  const coarse = Math.trunc(x * 16) / 16
  return exp(-coarse * coarse) * exp(-(x - coarse) * (x + coarse))
}

/**
 * Complementary error function, with small relative error in the far tail too (erfc(26) ≈ 6e-296).
 *
 * Source: W. J. Cody, Rational Chebyshev approximations for the error function, Math. Comp. 23 (1969) 631
 * (coefficients as published with the algorithm; checked against the reference cases).
 */
export function erfc(x: number): number {
  const y = Math.abs(x)
  if (y <= 0.46875) return 1 - x * ratio(x * x, A_LAST, A, B)
  if (y >= 27.3) return x > 0 ? 0 : 2
  const tail = expMinusSquare(y) * (y <= 4 ? ratio(y, C_LAST, C, D) : farTail(y))
  return x > 0 ? tail : 2 - tail
}

function farTail(y: number): number {
  const square = 1 / (y * y)
  const correction = square * ratio(square, P_LAST, P, Q)
  return (0.5641895835477563 - correction) / y
}
