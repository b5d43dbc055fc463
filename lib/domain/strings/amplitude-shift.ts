import { positive } from '../units/positive'
import type { Metres, Newtons } from '../units/quantity'

/** A string that swings wide. `amplitude` is that of the middle, m; EA axial stiffness N; T tension N; L m. */
export interface WideSwing {
  readonly axialStiffness: Newtons
  readonly tension: Newtons
  readonly length: Metres
  readonly amplitude: Metres
}

/** β a²: relative rise of tension at full deflection, (EA/T)(π²/4)(a/L)². */
function rise({ axialStiffness, tension, length, amplitude }: WideSwing): number {
  const slope = (Math.PI * amplitude) / (2 * positive('L', length))
  return (positive('EA', axialStiffness) / positive('T', tension)) * slope * slope
}

/** √(1 + x) − 1 without loss of digits. */
const rootMinusOne = (x: number): number => x / (1 + Math.sqrt(1 + x))

/**
 * Relative rise of the fundamental in a plane swing, ends fixed: √(1 + (3π²/16)(EA/T)(a/L)²) − 1.
 * With a dead weight that is free to move a third of it remains; a real rig lies between. Read f below
 * a = 0.3 mm. Source: Kirchhoff (1876); Carrier, Quart. Appl. Math. 3 (1945) 157 (from memory).
 */
export const planeAmplitudeShift = (swing: WideSwing): number => rootMinusOne(0.75 * rise(swing))

/** The same for a circular swing: √(1 + (π²/4)(EA/T)(a/L)²) − 1. */
export const circularAmplitudeShift = (swing: WideSwing): number => rootMinusOne(rise(swing))

/**
 * The plane swing exactly, as q″ + ω₀²q(1 + βq²) = 0: f/f₀ = √(1 + βa²) · AGM(1, √(1 − m)),
 * m = βa²/(2(1 + βa²)); the arithmetic-geometric mean stands for the complete elliptic integral.
 * Source: Duffing's equation; Abramowitz & Stegun §17.6.
 */
export function planeAmplitudeShiftExact(swing: WideSwing): number {
  const x = rise(swing)
  let a = 1
  let g = Math.sqrt(1 - x / (2 * (1 + x)))
  for (let step = 0; step < 40 && Math.abs(a - g) > 4e-16 * a; step += 1) {
    const mean = (a + g) / 2
    g = Math.sqrt(a * g)
    a = mean
  }
  return Math.sqrt(1 + x) * a - 1
}
