import { exp } from '../units/elementary'
import {
  type DegreesCelsius,
  type KilogramsPerCubicMetre,
  kilogramsPerCubicMetre,
  type Pascals,
} from '../units/quantity'

export interface AirState {
  readonly temperature: DegreesCelsius
  readonly pressure: Pascals
  /** Relative humidity, 0 to 1. */
  readonly humidity: number
}

/** Humid air of ordinary rooms; outside this the formulas are not claimed, though they go on. */
export const isOrdinaryAir = ({ temperature, pressure, humidity }: AirState): boolean =>
  temperature >= 10 &&
  temperature <= 30 &&
  pressure >= 60_000 &&
  pressure <= 110_000 &&
  humidity >= 0 &&
  humidity <= 0.8

/**
 * Density of moist air, kg/m³, by the CIPM-2007 equation; t °C, p Pa, relative humidity h 0…1, mole fraction
 * of CO₂ (0.0004 outdoors). Relative uncertainty 2.2e-5 for 600–1100 hPa and 15–27 °C.
 * Throws a RangeError when the result is not finite.
 * Source: Picard, Davis, Gläser, Fujii, Metrologia 45 (2008) 149.
 */
export function airDensity(
  { temperature: t, pressure: p, humidity }: AirState,
  carbonDioxide = 0.0004,
): KilogramsPerCubicMetre {
  const T = t + 273.15
  const saturation = exp(1.2378847e-5 * T * T - 1.9121316e-2 * T + 33.93711047 - 6343.1645 / T)
  const enhancement = 1.00062 + 3.14e-8 * p + 5.6e-7 * t * t
  const x = (humidity * enhancement * saturation) / p
  const ratio = p / T
  const compressibility =
    1 -
    ratio *
      (1.58123e-6 -
        2.9331e-8 * t +
        1.1043e-10 * t * t +
        (5.707e-6 - 2.051e-8 * t) * x +
        (1.9898e-4 - 2.376e-6 * t) * x * x) +
    ratio * ratio * (1.83e-11 - 0.765e-8 * x * x)
  const leading = (3.48374 + 1.4446 * (carbonDioxide - 0.0004)) * 1e-3
  return kilogramsPerCubicMetre(((leading * p) / (compressibility * T)) * (1 - 0.378 * x))
}

/**
 * The simple form: ρ = (0.34848 p − 0.009 h e^{0.061 t})/(273.15 + t), p hPa, h % RH, t °C. Within 2e-4 for
 * 900–1100 hPa, 10–30 °C, below 80 % RH. Source: OIML R 111-1 (2004), eq. E.3-1.
 */
export const airDensitySimple = ({ temperature: t, pressure, humidity }: AirState): KilogramsPerCubicMetre =>
  kilogramsPerCubicMetre(
    (0.34848 * (pressure / 100) - 0.009 * (humidity * 100) * exp(0.061 * t)) / (273.15 + t),
  )
