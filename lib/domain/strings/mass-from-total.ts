import { positive } from '../units/positive'
import { type Kilograms, type KilogramsPerMetre, kilogramsPerMetre, type Metres } from '../units/quantity'

/**
 * Mass per metre of a piece: µ = m / ℓ.
 *
 * m mass kg (true mass: `weighed-mass.ts`), ℓ length m, µ kg/m in the state in which ℓ was measured: slack
 * for a cut piece, loaded for a piece marked at both edges under load.
 * Throws a RangeError unless both are above zero. Source: definition.
 */
export const massPerMetreFromTotal = (mass: Kilograms, length: Metres): KilogramsPerMetre =>
  kilogramsPerMetre(positive('m', mass) / positive('ℓ', length))
