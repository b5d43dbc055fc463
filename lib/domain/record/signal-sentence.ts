import type { CharacteristicId } from '../metrology/characteristics'
import { formatQuantity, type NumberFormat } from '../units/format'
import type { ChartedStatistic, Departure } from './chart-history'
import { chartName, chartUnit, type ResultUnits } from './display-unit'

/** A signal in a sentence: what, which lots, how far from the centre line. */
export function signalSentence(
  signal: Pick<Departure, 'rule' | 'side' | 'departure'> & {
    readonly characteristic: CharacteristicId
    readonly statistic: ChartedStatistic
    /** Codes of the lots of the pattern, in chart order. */
    readonly memberCodes: readonly string[]
  },
  units: ResultUnits,
  decimal?: NumberFormat['decimal'],
): string {
  const { unit, decimals } = chartUnit(signal.characteristic, signal.statistic, units)
  const name = chartName(signal.characteristic, signal.statistic)
  const distance = formatQuantity(signal.departure, unit, {
    decimals,
    decimal,
    difference: true,
    sign: 'always',
    withUnit: true,
  })
  const { memberCodes: codes } = signal
  const [first, last] = [codes[0] ?? '', codes.at(-1) ?? '']
  if (signal.rule === 'nine-on-one-side')
    return `${name}: ${codes.length} lots on one side, ${signal.side} the centre line, ${first} to ${last}, ${distance} on average.`
  const which = signal.side === 'above' ? 'upper' : 'lower'
  return codes.length === 1
    ? `${name}: ${first} is beyond the ${which} limit, ${distance} from the centre line.`
    : `${name}: ${first} to ${last} are beyond the ${which} limit, ${distance} from the centre line on average.`
}
