import { STEEL_EXPANSION } from '@/lib/domain/metrology/model-facts'
import { airDensity } from '@/lib/domain/strings/air-density'
import { airViscosity } from '@/lib/domain/strings/air-viscosity'
import type { Core } from '@/lib/domain/strings/core-section'
import { deadWeightForce, hangingStringForce } from '@/lib/domain/strings/dead-weight-force'
import type { EndCondition } from '@/lib/domain/strings/end-condition'
import { loadBearingSection } from '@/lib/domain/strings/load-bearing'
import { soundedFundamental } from '@/lib/domain/strings/sounding-forward'
import { axialStiffness, bendingStiffness } from '@/lib/domain/strings/stiffness'
import {
  degreesCelsius,
  kilograms,
  kilogramsPerMetre,
  metres,
  metresPerSecondSquared,
  newtons,
  pascals,
} from '@/lib/domain/units/quantity'

/** A string as it is, at 20 °C and unloaded, SI. */
export interface TrueString {
  /** Outer diameter. */
  readonly diameter: number
  readonly massPerMetre: number
  /** What bears the load of a wound string; a plain one has none. */
  readonly core?: Core
  /** Of what bears the load. */
  readonly modulus: number
  /** Along the string; none where a bulk expansion does not hold (polymers). */
  readonly expansion?: number
  /** What the piece displaces air with. */
  readonly density: number
}

/** Where and on what it is measured, SI. Lengths are those that rule and rig show, true at 20 °C. */
export interface Bench {
  readonly celsius: number
  readonly gravity: number
  readonly hangingMass: number
  readonly hangingLength: number
  /** Mass per metre that the works reckons for the string below the edge. */
  readonly reckonedMassPerMetre: number
  /** Share by which the load pulls more than reckoned. */
  readonly pull: number
  readonly span: number
  readonly endCondition: EndCondition
  readonly cutLength: number
  /** Cut slack, or at marks made under the load. */
  readonly weighedState: 'slack' | 'marked'
}

export interface PerfectReadings {
  readonly diameter: number
  readonly cutMass: number
  readonly frequency: number
}

/**
 * What hands and instruments without any error read on a string: the domain's own chain backwards, step by
 * step: expansion, buoyancy of the piece, weights in air, stretch, ends, air that moves along. A wound string
 * stretches and bends by its core; a piece marked under load weighs what the stretched string does.
 */
export function perfectReadings(string: TrueString, bench: Bench): PerfectReadings {
  const away = bench.celsius - 20
  const steel = 1 + STEEL_EXPANSION * away
  const grown = 1 + (string.expansion ?? 0) * away
  const air = { temperature: degreesCelsius(bench.celsius), pressure: pascals(101325), humidity: 0.5 }
  const density = airDensity(air)
  const diameter = metres(string.diameter)
  const modulus = pascals(string.modulus)
  const bearing = loadBearingSection(string.core, diameter)
  const stiffness = axialStiffness(modulus, bearing.area)
  const perMetre = kilogramsPerMetre(string.massPerMetre / grown)
  const gravity = metresPerSecondSquared(bench.gravity)
  const weights = deadWeightForce(kilograms(bench.hangingMass), gravity, density)
  const below = hangingStringForce(
    kilogramsPerMetre(bench.reckonedMassPerMetre),
    metres(bench.hangingLength),
    gravity,
  )
  const force = newtons((weights + below) * (1 + bench.pull))
  const frequency = soundedFundamental(
    {
      force,
      span: metres(bench.span * steel),
      endCondition: bench.endCondition,
      axialStiffness: stiffness,
      bendingStiffness: bendingStiffness(modulus, bearing.secondMoment),
      outerDiameter: diameter,
      air: { density, viscosity: airViscosity(air.temperature, density) },
    },
    perMetre,
  )
  const weighed = bench.weighedState === 'slack' ? perMetre : perMetre / (1 + force / stiffness)
  return {
    diameter: diameter / (1 - ((string.expansion ?? STEEL_EXPANSION) - STEEL_EXPANSION) * away),
    // The balance is adjusted with weights of 8000 kg/m³.
    cutMass: (weighed * bench.cutLength * steel * (1 - density / string.density)) / (1 - density / 8000),
    frequency,
  }
}
