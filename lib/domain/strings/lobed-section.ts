import { positive } from '../units/positive'
import type { Metres } from '../units/quantity'

/**
 * Relative error of πd²/4 as the area of a wire of constant width d with an odd number of lobes: support
 * function d/2 + e cos kθ encloses A = πd²/4 − (π/2)(k² − 1)e², so that the error of A is −2(k² − 1)e²/d².
 *
 * d width m, e lobe amplitude m, k lobes (3, 5 …). Two-point gauges can't see it; a V-anvil or a rotating
 * scan does. Throws a RangeError when d is not above zero or k is not odd and at least 3.
 * Source: Cauchy's area formula for a support function; for k = 3, πd²/4 − 4πe².
 */
export function lobedAreaError(diameter: Metres, lobeAmplitude: Metres, lobes = 3): number {
  if (!(Number.isInteger(lobes) && lobes >= 3 && lobes % 2 === 1))
    throw new RangeError(`a wire of constant width has an odd number of lobes from 3, not ${lobes}`)
  const share = lobeAmplitude / positive('d', diameter)
  return -2 * (lobes * lobes - 1) * share * share
}
