import type { CharacteristicId } from '../metrology/characteristics'
import { formatNumber, formatQuantity, type NumberFormat } from '../units/format'
import type { ChartedStatistic, Departure } from './chart-history'
import { chartName, chartUnit, type ResultUnits } from './display-unit'

/** A signal in a sentence: what, which lots, how far from the centre line. */
export function signalSentence(
  signal: Pick<Departure, 'rule' | 'side' | 'departure'> & {
    readonly characteristic: CharacteristicId
    readonly statistic: ChartedStatistic
    /** Codes of the lots of the pattern, in chart order. */
    readonly memberCodes: readonly string[]
    /** Set on a machine’s chart over its products, where the departure is in σ. */
    readonly machineName?: string
  },
  units: ResultUnits,
  decimal?: NumberFormat['decimal'],
): string {
  if (signal.machineName !== undefined) return sentenceOfMachine(signal, signal.machineName, decimal)
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

function sentenceOfMachine(
  signal: Parameters<typeof signalSentence>[0],
  machineName: string,
  decimal: NumberFormat['decimal'],
): string {
  const { departure, memberCodes: codes, side } = signal
  const name = chartName(signal.characteristic, signal.statistic)
  const distance = formatNumber(departure, { decimals: 1, decimal, sign: 'always' })
  return `${name} on ${machineName}: ${codes.length} lots of several products on one side, ${side} their centre lines, ${codes[0] ?? ''} to ${codes.at(-1) ?? ''}, ${distance} σ on average.`
}
