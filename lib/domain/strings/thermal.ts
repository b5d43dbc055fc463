import { positive } from '../units/positive'
import { type Newtons, newtons, type PerKelvin } from '../units/quantity'

/**
 * Change of tension of a string held at fixed length by a frame: ΔT = −EA(α_s − α_f)Δ.
 *
 * EA axial stiffness N, α linear expansions 1/K of string and frame, Δ temperature change K. For metals; the
 * bulk α of a polymer does not act along a drawn filament. Throws a RangeError when EA is not above zero.
 * Source: Hooke's law with thermal strain.
 */
export const thermalTensionChange = (
  axialStiffness: Newtons,
  stringExpansion: PerKelvin,
  frameExpansion: PerKelvin,
  temperatureChange: number,
): Newtons =>
  newtons(-positive('EA', axialStiffness) * (stringExpansion - frameExpansion) * temperatureChange)

/**
 * Pitch under a dead weight after a temperature change: f/f₀ = √(1 + α_sΔ)/(1 + α_fΔ). The string keeps its
 * tension and its mass per metre falls; the frame keeps the span. Negligible: 0.01 to 0.03 cents a kelvin.
 * Source: f = √(T/µ)/(2L) with thermal strain.
 */
export const thermalPitchUnderDeadWeight = (
  stringExpansion: PerKelvin,
  frameExpansion: PerKelvin,
  temperatureChange: number,
): number =>
  Math.sqrt(positive('1 + α_sΔ', 1 + stringExpansion * temperatureChange)) /
  positive('1 + α_fΔ', 1 + frameExpansion * temperatureChange)
