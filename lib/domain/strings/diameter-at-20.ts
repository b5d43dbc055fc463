import { positive } from '../units/positive'
import {
  type DegreesCelsius,
  type KilogramsPerMetre,
  kilogramsPerMetre,
  type Metres,
  metres,
  type PerKelvin,
} from '../units/quantity'

/**
 * Diameter at 20 °C from one read by a laser at another temperature: d₂₀ = d/(1 + α(t − 20)).
 *
 * d m, α linear expansion 1/K, t °C. For metals; along a drawn monofilament the bulk α does not hold.
 * Throws a RangeError when d is not above zero. Source: ISO 1 (reference temperature 20 °C).
 */
export const diameterAt20 = (diameter: Metres, temperature: DegreesCelsius, expansion: PerKelvin): Metres =>
  metres(positive('d', diameter) / (1 + expansion * (temperature - 20)))

/**
 * The same for a contact gauge at the string's temperature, which grows with it: only the difference counts,
 * d₂₀ = d(1 − (α_string − α_gauge)(t − 20)); zero for steel on steel. Source: ISO 1.
 */
export const diameterAt20ByContact = (
  diameter: Metres,
  temperature: DegreesCelsius,
  expansion: PerKelvin,
  gaugeExpansion: PerKelvin,
): Metres => metres(positive('d', diameter) * (1 - (expansion - gaugeExpansion) * (temperature - 20)))

/** Length at a temperature as shown by a rule true at 20 °C: ℓ = R(1 + α_r(t − 20)), m. Source: ISO 1. */
export const lengthByRule = (
  reading: Metres,
  temperature: DegreesCelsius,
  ruleExpansion: PerKelvin,
): Metres => metres(positive('R', reading) * (1 + ruleExpansion * (temperature - 20)))

/** Mass per metre of a piece at 20 °C from that at t: µ₂₀ = µ_t(1 + α(t − 20)), kg/m. Source: ISO 1. */
export const massPerMetreAt20 = (
  massPerMetre: KilogramsPerMetre,
  temperature: DegreesCelsius,
  expansion: PerKelvin,
): KilogramsPerMetre => kilogramsPerMetre(positive('µ', massPerMetre) * (1 + expansion * (temperature - 20)))
