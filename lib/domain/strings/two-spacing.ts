import { positive } from '../units/positive'
import {
  type Hertz,
  type KilogramsPerMetre,
  kilogramsPerMetre,
  type Metres,
  metres,
  type Newtons,
} from '../units/quantity'

export interface Spacing {
  readonly span: Metres
  readonly frequency: Hertz
}

/**
 * Mass per metre from two spans under one load. Every constant end correction and the zero error of the
 * spacing fall out: 1/f = 2(L − δ)/v, so s = (1/f₁ − 1/f₂)/(L₁ − L₂), v = 2/s, µ = T s²/4, δ = L₁ − v/(2f₁).
 *
 * T tension N, L spans m, f fundamentals Hz; µ kg/m of the loaded string, δ total shortening m. Wants u(f)/f
 * of 1e-5 and L₁/L₂ of at least 1.5. Throws a RangeError when the spans are equal or the longer span does
 * not sound lower. Source: from v = 2 L f (Rayleigh, Theory of Sound I, ch. VI), derived.
 */
export function massPerMetreFromTwoSpacings(
  tension: Newtons,
  first: Spacing,
  second: Spacing,
): { readonly massPerMetre: KilogramsPerMetre; readonly endCorrection: Metres } {
  const slope =
    (1 / positive('f₁', first.frequency) - 1 / positive('f₂', second.frequency)) /
    (positive('L₁', first.span) - positive('L₂', second.span))
  const speed = 2 / positive('slope of 1/f over L', slope)
  return {
    massPerMetre: kilogramsPerMetre((positive('T', tension) * slope * slope) / 4),
    endCorrection: metres(first.span - speed / (2 * first.frequency)),
  }
}
