import { positive } from '../units/positive'
import {
  type KilogramsPerCubicMetre,
  type KilogramsPerMetre,
  kilogramsPerMetre,
  type Metres,
  type MetresToTheFourth,
  metresToTheFourth,
  type SquareMetres,
  squareMetres,
} from '../units/quantity'

/** Area of a solid round wire: A = π d²/4, m². Throws a RangeError unless d is above zero. Source: geometry. */
export const roundArea = (diameter: Metres): SquareMetres =>
  squareMetres((Math.PI * positive('d', diameter) * diameter) / 4)

/** Second moment of area of a solid round wire: I = π d⁴/64, m⁴. Source: geometry. */
export const roundSecondMoment = (diameter: Metres): MetresToTheFourth => {
  const square = positive('d', diameter) * diameter
  return metresToTheFourth((Math.PI * square * square) / 64)
}

/** Mass per metre of a solid round wire: µ = ρ π d²/4, kg/m. Source: geometry. */
export const solidWireMassPerMetre = (diameter: Metres, density: KilogramsPerCubicMetre): KilogramsPerMetre =>
  kilogramsPerMetre(positive('ρ', density) * roundArea(diameter))

/**
 * What a tolerance on diameter means for mass per metre at fixed density: (1 ± t/d)² − 1, relative.
 * d and t m. ±2 % of diameter are +4.04 and −3.96 % of mass. Source: geometry.
 */
export const massSpreadOfDiameterTolerance = (
  diameter: Metres,
  tolerance: Metres,
): { readonly plus: number; readonly minus: number } => {
  const share = tolerance / positive('d', diameter)
  return { plus: 2 * share + share * share, minus: -2 * share + share * share }
}
