import { positive } from '../units/positive'
import {
  type DegreesCelsius,
  type KilogramsPerCubicMetre,
  type SquareMetresPerSecond,
  squareMetresPerSecond,
} from '../units/quantity'

/** Kinematic viscosity of air at 20 °C and 1.2 kg/m³, m²/s. */
export const AIR_VISCOSITY_20 = squareMetresPerSecond(1.51e-5)

/**
 * Kinematic viscosity of air: ν = η/ρ with η = 1.458e-6 T^{3/2}/(T + 110.4).
 * t °C (T = t + 273.15), ρ air density kg/m³, η Pa·s, ν m²/s. Valid −50 to 100 °C; moisture changes it by
 * less than 1 %. Source: Sutherland's law with the constants of the U.S. Standard Atmosphere (1976), from
 * memory; 1.51e-5 m²/s at 20 °C and 1.2 kg/m³.
 */
export function airViscosity(
  temperature: DegreesCelsius,
  density: KilogramsPerCubicMetre,
): SquareMetresPerSecond {
  const T = positive('T', temperature + 273.15)
  return squareMetresPerSecond((1.458e-6 * T * Math.sqrt(T)) / (T + 110.4) / positive('ρ', density))
}
