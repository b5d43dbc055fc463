import { type Hertz, hertz } from '../units/quantity'

/**
 * What a clock that runs fast by a relative error does: f_read = f/(1 + ε), and a mass per metre from
 * f_read comes out as (1 + ε)² of the true one. ε relative rate error of sampling or counting clock; audio
 * clocks run within ±1e-4. Source: definition of frequency.
 */
export const frequencyReadByClock = (
  frequency: Hertz,
  rateError: number,
): { readonly read: Hertz; readonly massBias: number } => ({
  read: hertz(frequency / (1 + rateError)),
  massBias: 2 * rateError + rateError * rateError,
})
