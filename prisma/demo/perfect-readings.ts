import { STEEL_EXPANSION } from '@/lib/domain/metrology/model-facts'
import { airDensity } from '@/lib/domain/strings/air-density'
import { airViscosity } from '@/lib/domain/strings/air-viscosity'
import { deadWeightForce, hangingStringForce } from '@/lib/domain/strings/dead-weight-force'
import type { EndCondition } from '@/lib/domain/strings/end-condition'
import { solidWireMassPerMetre } from '@/lib/domain/strings/round-section'
import { soundedFundamental } from '@/lib/domain/strings/sounding-forward'
import { plainWireAxialStiffness, plainWireBendingStiffness } from '@/lib/domain/strings/stiffness'
import {
  degreesCelsius,
  kilograms,
  kilogramsPerCubicMetre,
  kilogramsPerMetre,
  metres,
  metresPerSecondSquared,
  newtons,
  pascals,
} from '@/lib/domain/units/quantity'

/** A plain steel string as it is, at 20 °C and unloaded, SI. */
export interface TrueString {
  readonly diameter: number
  readonly density: number
  readonly modulus: number
  readonly expansion: number
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
}

export interface PerfectReadings {
  readonly diameter: number
  readonly cutMass: number
  readonly frequency: number
}

/**
 * What hands and instruments without any error read on a string: the domain's own chain backwards, step by
 * step: expansion, buoyancy of the piece, weights in air, stretch, ends, air that moves along.
 */
export function perfectReadings(string: TrueString, bench: Bench): PerfectReadings {
  const away = bench.celsius - 20
  const steel = 1 + STEEL_EXPANSION * away
  const grown = 1 + string.expansion * away
  const air = { temperature: degreesCelsius(bench.celsius), pressure: pascals(101325), humidity: 0.5 }
  const density = airDensity(air)
  const diameter = metres(string.diameter)
  const modulus = pascals(string.modulus)
  const at20 = solidWireMassPerMetre(diameter, kilogramsPerCubicMetre(string.density))
  const perMetre = kilogramsPerMetre(at20 / grown)
  const gravity = metresPerSecondSquared(bench.gravity)
  const weights = deadWeightForce(kilograms(bench.hangingMass), gravity, density)
  const below = hangingStringForce(
    kilogramsPerMetre(bench.reckonedMassPerMetre),
    metres(bench.hangingLength),
    gravity,
  )
  const frequency = soundedFundamental(
    {
      force: newtons((weights + below) * (1 + bench.pull)),
      span: metres(bench.span * steel),
      endCondition: bench.endCondition,
      axialStiffness: plainWireAxialStiffness(modulus, diameter),
      bendingStiffness: plainWireBendingStiffness(modulus, diameter),
      outerDiameter: diameter,
      air: { density, viscosity: airViscosity(air.temperature, density) },
    },
    perMetre,
  )
  return {
    diameter: diameter / (1 - (string.expansion - STEEL_EXPANSION) * away),
    // The balance is adjusted with weights of 8000 kg/m³; the piece is as dense as the handbook says.
    cutMass: (perMetre * bench.cutLength * steel * (1 - density / HANDBOOK_DENSITY)) / (1 - density / 8000),
    frequency,
  }
}

const HANDBOOK_DENSITY = 7850
