import { positive } from '../units/positive'
import {
  type KilogramsPerMetre,
  kilogramsPerMetre,
  type Metres,
  metres,
  type Newtons,
} from '../units/quantity'

/**
 * Elastic strain under load: ε = T/EA.
 * T N, EA axial stiffness N of the load-bearing section. For nylon and gut creep adds several per cent that
 * no modulus gives: mark the piece under load instead. Throws a RangeError when EA is not above zero or T is
 * negative. Source: Hooke's law.
 */
export function elasticStrain(tension: Newtons, axialStiffness: Newtons): number {
  if (!(tension >= 0)) throw new RangeError(`T has to be zero or more, not ${tension}`)
  return tension / positive('EA', axialStiffness)
}

/** Mass per metre of the stretched string: µ = µ₀/(1 + ε), kg/m. Source: the mass stays, the length grows. */
export const loadedMassPerMetre = (unloaded: KilogramsPerMetre, strain: number): KilogramsPerMetre =>
  kilogramsPerMetre(positive('µ₀', unloaded) / positive('1 + ε', 1 + strain))

/** Mass per metre of the unloaded string: µ₀ = µ (1 + ε), kg/m: comparable with the weighed one. */
export const unloadedMassPerMetre = (loaded: KilogramsPerMetre, strain: number): KilogramsPerMetre =>
  kilogramsPerMetre(positive('µ', loaded) * positive('1 + ε', 1 + strain))

/** Diameter of the stretched string: d (1 − νε), m; ν Poisson's ratio. First order. Source: elasticity. */
export const loadedDiameter = (diameter: Metres, strain: number, poisson: number): Metres =>
  metres(positive('d', diameter) * (1 - poisson * strain))
