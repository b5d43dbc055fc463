import { characteristics } from '@/lib/domain/metrology/characteristics'
import { formatQuantity } from '@/lib/domain/units/format'
import type { UnitId } from '@/lib/domain/units/unit'
import type { WaitingSignal } from '@/lib/services/get-today'

const units: Readonly<Record<string, { readonly unit: UnitId; readonly decimals: number }>> = {
  length: { unit: 'µm', decimals: 2 },
  massPerLength: { unit: 'mg/m', decimals: 2 },
  density: { unit: 'kg/m³', decimals: 0 },
  force: { unit: 'N', decimals: 2 },
  ratio: { unit: '%', decimals: 2 },
  cents: { unit: 'cents', decimals: 1 },
}

type Words = Pick<WaitingSignal, 'characteristic' | 'statistic' | 'rule' | 'side' | 'lots' | 'departure'>

const nameOf = ({ characteristic, statistic }: Words): string =>
  statistic === 'within-lot-sd'
    ? `spread within the lot of ${characteristics[characteristic].name.toLowerCase()}`
    : characteristics[characteristic].name.toLowerCase()

/** "mass per metre, weighed beyond its limits", "diameter: nine lots on one side". */
export function signalTitle(signal: Words): string {
  const name = nameOf(signal)
  return signal.rule === 'nine-on-one-side'
    ? `${name}, ${signal.lots} lots ${signal.side} the centre`
    : `${name} ${signal.side} its control limit`
}

/** The size of the departure, in the characteristic's unit. */
export function signalWords(signal: Words): string {
  const { decimals, unit } = units[characteristics[signal.characteristic].dimension] ?? {
    unit: 'ln',
    decimals: 4,
  }
  const size = formatQuantity(signal.departure, unit, {
    decimals,
    sign: 'always',
    difference: true,
    withUnit: true,
  })
  return `${size} from the centre on average over ${signal.lots} ${signal.lots === 1 ? 'lot' : 'lots'}. It never rejects a lot by itself, and it has to be answered before release.`
}
