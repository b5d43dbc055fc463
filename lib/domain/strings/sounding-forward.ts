import { type Hertz, hertz, type KilogramsPerMetre, kilogramsPerMetre } from '../units/quantity'
import { airMassPerMetre } from './air-loading'
import { endShift } from './end-condition'
import { fundamental } from './fundamental'
import type { SoundingSetUp } from './resonance-chain'
import { inharmonicity } from './stiffness'
import { elasticStrain, loadedMassPerMetre } from './stretch'

/**
 * The fundamental that a string of known unloaded mass per metre sounds on a rig: the inverse of
 * `resonance-chain.ts`. f = (1+e)/(2L) √(F/(µ_l + µ_air(f))), µ_l = µ₀/(1 + F/EA); the air's mass depends on f
 * weakly, so that repeating the step settles to the last bit within a few rounds.
 *
 * µ₀ kg/m unloaded, f Hz. Throws a RangeError for values not above zero, or when it does not settle (a
 * string lighter than its air). Sources: those of `resonance-chain.ts`.
 */
export function soundedFundamental(setUp: SoundingSetUp, unloaded: KilogramsPerMetre): Hertz {
  const { force, span } = setUp
  const stiff = inharmonicity(setUp.bendingStiffness, force, span)
  const rise = 1 + endShift(setUp.endCondition, stiff)
  const loaded = loadedMassPerMetre(unloaded, elasticStrain(force, setUp.axialStiffness))
  const step = (air: number): Hertz => hertz(rise * fundamental(force, kilogramsPerMetre(loaded + air), span))
  let frequency = step(0)
  for (let round = 0; round < 100; round += 1) {
    const next = step(airMassPerMetre(setUp.outerDiameter, frequency, setUp.air))
    // Two neighbouring numbers may go on changing places for ever.
    if (Math.abs(next - frequency) <= 2.3e-16 * next) return next
    // Where the last bits of the steps differ by more than one, they go round among a few neighbours for ever.
    if (round > 20 && Math.abs(next - frequency) <= 1e-14 * next) return next
    frequency = next
  }
  throw new RangeError(`the fundamental of ${unloaded} kg/m does not settle`)
}
