import { erfc } from './erfc'

/** P(Z ≤ z) of the standard normal distribution, with small relative error in the lower tail. Source: DLMF 7.2 (Φ(z) = ½ erfc(−z/√2)). */
export const normalCdf = (z: number): number => erfc(-z / Math.SQRT2) / 2

/** P(Z > z): its own function, because 1 − Φ loses every digit in the upper tail. */
export const normalUpperTail = (z: number): number => erfc(z / Math.SQRT2) / 2
