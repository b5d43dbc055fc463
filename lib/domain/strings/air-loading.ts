import { positive } from '../units/positive'
import {
  type Hertz,
  type KilogramsPerCubicMetre,
  type KilogramsPerMetre,
  type KilogramsPerMetreSecond,
  kilogramsPerMetre,
  kilogramsPerMetreSecond,
  type Metres,
  type Seconds,
  type SquareMetresPerSecond,
  seconds,
} from '../units/quantity'
import { stokesFactors } from './stokes-cylinder'

export interface Air {
  readonly density: KilogramsPerCubicMetre
  readonly viscosity: SquareMetresPerSecond
}

/** Stokes' number M = (r/2)√(ω/ν) of a string of diameter d m at f Hz. */
export const stokesNumber = (diameter: Metres, frequency: Hertz, viscosity: SquareMetresPerSecond): number =>
  (positive('d', diameter) / 4) *
  Math.sqrt((2 * Math.PI * positive('f', frequency)) / positive('ν', viscosity))

/**
 * Mass of air that moves with a metre of string: µ_air = k ρ_a π r², kg/m, k by Stokes (exact Bessel form).
 *
 * d outer diameter m, f Hz, ρ_a kg/m³, ν m²/s. 0.05 % of a thin steel string, 0.18 % of nylon.
 * Throws a RangeError unless all are above zero. Source: Stokes (1851).
 */
export function airMassPerMetre(diameter: Metres, frequency: Hertz, air: Air): KilogramsPerMetre {
  const { inertia } = stokesFactors(stokesNumber(diameter, frequency, air.viscosity))
  return kilogramsPerMetre((inertia * positive('ρ_a', air.density) * Math.PI * diameter * diameter) / 4)
}

/** Relative change of the fundamental by the air's mass: 1/√(1 + µ_air/µ) − 1. */
export const airFrequencyShift = (massPerMetre: KilogramsPerMetre, airMass: KilogramsPerMetre): number => {
  const share = airMass / positive('µ', massPerMetre)
  const root = Math.sqrt(1 + share)
  return -share / (root * (1 + root))
}

/** Drag of the air per metre of string: R = ω ρ_a π r² k′, kg/(m·s). Source: Stokes (1851). */
export function airDrag(diameter: Metres, frequency: Hertz, air: Air): KilogramsPerMetreSecond {
  const { drag } = stokesFactors(stokesNumber(diameter, frequency, air.viscosity))
  return kilogramsPerMetreSecond(
    (2 * Math.PI * frequency * positive('ρ_a', air.density) * Math.PI * diameter * diameter * drag) / 4,
  )
}

/**
 * Decay by air alone: amplitude time constant τ = 2µ/R, and Q = ωµ/R = πfτ. Real decays are shorter where
 * supports or the material take their part. Source: damped oscillator; R by Stokes (1851).
 */
export const airDecay = (
  massPerMetre: KilogramsPerMetre,
  frequency: Hertz,
  drag: KilogramsPerMetreSecond,
): { readonly amplitudeTime: Seconds; readonly quality: number } => {
  const tau = (2 * massPerMetre) / positive('R', drag)
  return { amplitudeTime: seconds(tau), quality: Math.PI * frequency * tau }
}
