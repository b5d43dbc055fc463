import { positive } from '../units/positive'
import {
  type Hertz,
  type KilogramsPerMetre,
  kilogramsPerMetre,
  type Metres,
  type Newtons,
} from '../units/quantity'

/**
 * Mass per metre from load, fundamental and span, uncorrected: µ = T / (2 L f)².
 *
 * T tension N, f fundamental Hz, L span m, µ kg/m of the loaded string. Low by nearly 1 % for thin steel
 * before stretch, ends and air are accounted for: `resonance-chain.ts` does that.
 * Throws a RangeError unless all are above zero.
 * Source: Rayleigh, Theory of Sound I (1894), ch. VI; Fletcher & Rossing (1998), ch. 2.
 */
export function massPerMetreFromResonance(
  tension: Newtons,
  frequency: Hertz,
  span: Metres,
): KilogramsPerMetre {
  const speed = 2 * positive('L', span) * positive('f', frequency)
  return kilogramsPerMetre(positive('T', tension) / (speed * speed))
}
