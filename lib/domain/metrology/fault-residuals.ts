import { ln } from '../units/elementary'
import { positive } from '../units/positive'

/** What was found of a string, with relative standard uncertainties, and what it should be. SI. */
export interface FaultReadings {
  readonly diameter: number
  /** Unloaded mass per metre by either route. */
  readonly weighed: number
  readonly sounded: number
  readonly nominalDiameter: number
  readonly nominalDensity: number
  readonly uDiameter: number
  readonly uWeighed: number
  readonly uSounded: number
}

/** Departures from nominal as natural logarithms, the three checks, and each over its standard uncertainty. */
export interface FaultResiduals {
  readonly diameter: number
  readonly weighed: number
  readonly sounded: number
  /** The two routes: δw − δr, the closure. */
  readonly routes: number
  /** Density by weighing: δw − 2δd. */
  readonly densityWeighed: number
  /** Density by sounding: δr − 2δd. */
  readonly densitySounded: number
  readonly zRoutes: number
  readonly zDensityWeighed: number
  readonly zDensitySounded: number
}

/**
 * The residuals whose pattern points to a measuring fault: δd = ln(d/d₀), δw = ln(µ_w/µ₀), δr = ln(µ_r/µ₀) with
 * µ₀ = ρ₀πd₀²/4, and c₁ = δw − δr, c₂ = δw − 2δd, c₃ = δr − 2δd. A true size (δ, 2δ, 2δ) leaves all c at zero.
 * One piece tells that routes disagree, not which is wrong, until the fault is above about 1 %.
 * Throws a RangeError for values not above zero. Source: definitions, derived.
 */
export function faultResiduals(readings: FaultReadings): FaultResiduals {
  const { nominalDensity: density, uDiameter, uSounded, uWeighed } = readings
  const nominal = positive('d₀', readings.nominalDiameter)
  const target = (positive('ρ₀', density) * Math.PI * nominal * nominal) / 4
  const diameter = ln(positive('d', readings.diameter) / nominal)
  const weighed = ln(positive('µ_w', readings.weighed) / target)
  const sounded = ln(positive('µ_r', readings.sounded) / target)
  const routes = weighed - sounded
  const densityWeighed = weighed - 2 * diameter
  const densitySounded = sounded - 2 * diameter
  const quadrature = (a: number, b: number): number => positive('u', Math.sqrt(a * a + b * b))
  return {
    diameter,
    weighed,
    sounded,
    routes,
    densityWeighed,
    densitySounded,
    zRoutes: routes / quadrature(uWeighed, uSounded),
    zDensityWeighed: densityWeighed / quadrature(uWeighed, 2 * uDiameter),
    zDensitySounded: densitySounded / quadrature(uSounded, 2 * uDiameter),
  }
}
