import { positive } from '../units/positive'
import {
  type Hertz,
  type KilogramsPerMetre,
  kilogramsPerMetre,
  type Metres,
  type NewtonSquareMetres,
  type Newtons,
} from '../units/quantity'
import { type Air, airMassPerMetre } from './air-loading'
import { type EndCondition, endShift } from './end-condition'
import { massPerMetreFromResonance } from './mass-from-resonance'
import { inharmonicity } from './stiffness'
import { elasticStrain, unloadedMassPerMetre } from './stretch'

/** What the rig and the string are, apart from frequency and mass. */
export interface SoundingSetUp {
  /** Tension of the string in the span, N: buoyancy, gravity and hanging string already in it. */
  readonly force: Newtons
  readonly span: Metres
  readonly endCondition: EndCondition
  /** EA of the load-bearing section, N. */
  readonly axialStiffness: Newtons
  /** EI, N·m²; that of the core for a wound string. */
  readonly bendingStiffness: NewtonSquareMetres
  /** Outer diameter, m: what pushes the air. */
  readonly outerDiameter: Metres
  readonly air: Air
}

export interface ResonanceChain {
  /** F/(4L²f²), before any correction. */
  readonly raw: KilogramsPerMetre
  readonly inharmonicity: number
  /** Relative rise of the fundamental by stiffness and ends. */
  readonly endShift: number
  readonly airMass: KilogramsPerMetre
  /** Mass per metre of the string under load. */
  readonly loaded: KilogramsPerMetre
  /** F/EA. */
  readonly strain: number
  /** Mass per metre of the unloaded string, comparable with the weighed one. */
  readonly unloaded: KilogramsPerMetre
}

/**
 * Mass per metre by sounding, with the corrections in their order:
 * µ_l = F(1+e)²/(4L²f₁²) − µ_air;  µ₀ = µ_l(1 + F/EA).
 *
 * F tension N, L span m, f₁ fundamental Hz, e shift by stiffness and ends with B = π²EI/(FL²), µ_air air mass
 * at f₁ (Stokes, exact). Amplitude: read f below 0.3 mm, or extrapolate it to zero. The inverse is
 * `sounding-forward.ts`. Throws a RangeError for values not above zero.
 * Sources: those of `mass-from-resonance.ts`, `end-condition.ts`, `air-loading.ts`, `stretch.ts`.
 */
export function resonanceChain(setUp: SoundingSetUp, frequency: Hertz): ResonanceChain {
  const { force, span } = setUp
  const raw = massPerMetreFromResonance(force, frequency, span)
  const stiff = inharmonicity(setUp.bendingStiffness, force, span)
  const shift = endShift(setUp.endCondition, stiff)
  const airMass = airMassPerMetre(setUp.outerDiameter, frequency, setUp.air)
  const loaded = kilogramsPerMetre(positive('µ', raw * (1 + shift) * (1 + shift) - airMass))
  const strain = elasticStrain(force, setUp.axialStiffness)
  return {
    raw,
    inharmonicity: stiff,
    endShift: shift,
    airMass,
    loaded,
    strain,
    unloaded: unloadedMassPerMetre(loaded, strain),
  }
}
