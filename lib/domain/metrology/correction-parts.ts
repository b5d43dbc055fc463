import { ln } from '../units/elementary'
import type { Correction } from './evaluation'
import { type ModelFacts, STEEL_EXPANSION } from './model-facts'

type CorrectedResult = Correction['on']

type Told = Pick<Correction, 'id' | 'name' | 'relative' | 'formula' | 'source'> & {
  readonly outside?: string | undefined
}

/** A relative change of mass per metre, or of force, as cents of the fundamental. */
const cents = (relative: number): number => (600 * ln(1 + relative)) / Math.LN2

/** A correction on a result of this size; with its cents unless it is one of length. */
export function correctionOn(on: CorrectedResult, value: number, told: Told): Correction {
  const { outside, ...rest } = told
  return {
    ...rest,
    on,
    amount: told.relative * value,
    ...(on === 'diameter' ? {} : { cents: cents(told.relative) }),
    ...(outside === undefined ? {} : { outside }),
  }
}

/** The known error of a gauge, taken off its reading; none when there is no error to take off. */
export const knownError = (
  on: CorrectedResult,
  value: number,
  gauge: {
    readonly what: string
    readonly error: number | undefined
    readonly reading: number
    readonly power: 1 | -1 | -2
  },
): readonly Correction[] => {
  const { error, power, reading, what } = gauge
  if (!error) return []
  // (reading − e)^power / reading^power, power 1, −1 or −2 of that reading in the result.
  const factor = (reading - error) / reading
  const change = power === 1 ? factor : power === -1 ? 1 / factor : 1 / (factor * factor)
  return [
    correctionOn(on, value, {
      id: `${what.replaceAll(' ', '-')}-error`,
      name: `Known error of the ${what}`,
      relative: change - 1,
      formula: 'reading − error',
      source: 'Calibration of the equipment.',
    }),
  ]
}

/** By how much a length in the denominator and the specimen's own expansion change mass per metre at 20 °C. */
export function temperatureFactor({ celsius, expansion }: ModelFacts, powerOfLength: 1 | 2): number {
  const rule = 1 + STEEL_EXPANSION * (celsius - 20)
  const specimen = 1 + (expansion ?? 0) * (celsius - 20)
  return specimen / (powerOfLength === 1 ? rule : rule * rule)
}

/** Said of every temperature correction: what it rests on where the room is far from 20 °C. */
export const farFrom20 = (celsius: number): string | undefined =>
  Math.abs(celsius - 20) > 10
    ? 'More than 10 K from 20 °C: rule, gauge and rig are taken as steel and at one temperature.'
    : undefined

/** Said of every buoyancy: where the formula for the air is not claimed. */
export const unusualAir = ({ ordinaryAir }: ModelFacts): string | undefined =>
  ordinaryAir
    ? undefined
    : 'The air is outside 10–30 °C, 600–1100 hPa or 80 % humidity: its density is not claimed there.'
