import { formatQuantity } from '@/lib/domain/units/format'
import { fromSi, type UnitId } from '@/lib/domain/units/unit'
import { type GaugeKind, gaugeDimensions, gaugeKinds } from '@/lib/input/equipment'
import type { WorksFacts } from '@/lib/services/get-works'

type Decimal = WorksFacts['numberFormat']

export const gaugeUnit = (kind: string): UnitId =>
  gaugeDimensions[gaugeKinds.find((one) => one === kind) ?? ('micrometer' satisfies GaugeKind)].unit

/** As many digits as the number has, up to seven. */
export const entryOf = (value: number, decimal: Decimal): string => {
  const text = String(Number(value.toPrecision(10)))
  return decimal === 'comma' ? text.replace('.', ',') : text
}

/** An SI value for an entry field in this unit. */
export const entryIn = (si: number, unit: UnitId, decimal: Decimal): string =>
  entryOf(fromSi(si, unit), decimal)

/** "0.1 µm", "0.01 mg", with the digits the value has. */
export const shownSmall = (si: number, unit: UnitId, decimal: Decimal): string =>
  `${entryIn(si, unit, decimal)} ${unit}`

/** "7.4000 kg ± 0.1 mg" (k = 2). */
export const shownMass = (kilograms: number, u: number, decimal: Decimal): string =>
  `${formatQuantity(kilograms, 'kg', { decimal, withUnit: true })} ± ${entryOf(Number((2 * u * 1e6).toPrecision(2)), decimal)} mg`
