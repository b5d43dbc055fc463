import { positive } from '../units/positive'
import {
  type KilogramsPerCubicMetre,
  type KilogramsPerMetre,
  kilogramsPerMetre,
  type Metres,
  metres,
} from '../units/quantity'
import { type Core, coreAcrossCorners, coreArea } from './core-section'

/** A round wrap wire. Without a lay the turns touch. */
export interface Wrap {
  readonly density: KilogramsPerCubicMetre
  readonly diameter: Metres
  /** Lay (advance of a turn), m; at least the wire's diameter. */
  readonly lay?: Metres
}

/** How a wrap lies on a hexagonal core: on the circle through its corners (upper), or hugging it (lower). */
export type HexPath = 'circle' | 'tight'

export interface WoundMass {
  readonly core: KilogramsPerMetre
  readonly wrap: KilogramsPerMetre
  readonly total: KilogramsPerMetre
  readonly outerDiameter: Metres
  /** Metres of wrap wire on a metre of string. */
  readonly wrapLength: number
}

/** Mass and length of one wrap whose wire follows a turn of `path` m around the string. */
function wrapOn(path: number, { density, diameter, lay = diameter }: Wrap) {
  positive('d_w', diameter)
  if (!(lay >= diameter)) throw new RangeError(`a lay of ${lay} m is less than the wrap wire’s ${diameter} m`)
  const length = Math.sqrt(path * path + lay * lay) / lay
  return { length, mass: positive('ρ_w', density) * ((Math.PI * diameter * diameter) / 4) * length }
}

/**
 * Mass per metre of a core with one round wrap:
 * µ = ρ_c A_c + ρ_w (π d_w²/4) √(path² + p²)/p, path π(d_c + d_w) on a round core.
 *
 * d m, ρ kg/m³, p lay m (d_w when the turns touch); D = d_c + 2d_w. On a hexagon of s across flats, corners
 * c = 2s/√3: path π(c + d_w) as upper, 2√3 s + πd_w as lower limit, D = c + 2d_w: report both, as real wraps
 * bite into the corners. Drawing of core and wrap while winding takes 0 to 2 % off.
 * Throws a RangeError for values not above zero or a lay below the wire. Source: geometry, derived.
 */
export function woundMass(
  core: Core & { readonly density: KilogramsPerCubicMetre },
  wrap: Wrap,
  hexPath: HexPath = 'circle',
): WoundMass {
  const corners = coreAcrossCorners(core)
  const path =
    core.shape === 'hex' && hexPath === 'tight'
      ? 2 * Math.sqrt(3) * core.size + Math.PI * wrap.diameter
      : Math.PI * (corners + wrap.diameter)
  const { length, mass } = wrapOn(path, wrap)
  const coreMass = positive('ρ_c', core.density) * coreArea(core)
  return {
    core: kilogramsPerMetre(coreMass),
    wrap: kilogramsPerMetre(mass),
    total: kilogramsPerMetre(coreMass + mass),
    outerDiameter: metres(corners + 2 * wrap.diameter),
    wrapLength: length,
  }
}

/**
 * Several wraps, each laid on the one below: the next takes the outer diameter below for its core. Nesting
 * makes the true diameter smaller and each turn slightly lighter. Source: geometry, derived.
 */
export function woundLayersMass(
  core: Core & { readonly density: KilogramsPerCubicMetre },
  wraps: readonly Wrap[],
): { readonly total: KilogramsPerMetre; readonly outerDiameter: Metres } {
  let total = positive('ρ_c', core.density) * coreArea(core)
  let diameter: number = coreAcrossCorners(core)
  for (const wrap of wraps) {
    total += wrapOn(Math.PI * (diameter + wrap.diameter), wrap).mass
    diameter += 2 * wrap.diameter
  }
  return { total: kilogramsPerMetre(total), outerDiameter: metres(diameter) }
}
