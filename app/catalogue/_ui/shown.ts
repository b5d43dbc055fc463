import type { Tolerance } from '@/lib/domain/metrology/specification'
import type { Ranged } from '@/lib/domain/strings/material'
import { noteName } from '@/lib/domain/strings/pitch'
import { formatQuantity, type QuantityFormat } from '@/lib/domain/units/format'
import type { UnitId } from '@/lib/domain/units/unit'
import type { WorksFacts } from '@/lib/services/get-works'

type Decimal = WorksFacts['numberFormat']

/** "254.0 µm, 251.0 to 257.0". */
export const shownTolerance = (
  { target, lower, upper }: Tolerance<number>,
  unit: UnitId,
  format: QuantityFormat,
): string =>
  `${formatQuantity(target, unit, { ...format, withUnit: true })}, ${formatQuantity(lower, unit, format)} to ${formatQuantity(upper, unit, format)}`

/** "7850 (7830–7870)". */
export const shownRange = (
  range: Ranged<number> | undefined,
  unit: UnitId,
  decimals: number,
  decimal: Decimal,
): string =>
  range === undefined
    ? '–'
    : `${formatQuantity(range.value, unit, { decimals, decimal })} (${formatQuantity(range.low, unit, { decimals, decimal })}–${formatQuantity(range.high, unit, { decimals, decimal })})`

/** Decimals of a diameter at which its tenth of a micrometre shows. */
export const diameterDecimals = (unit: UnitId): number =>
  ({ mm: 4, µm: 1, in: 5, thou: 2 })[unit as 'mm' | 'µm' | 'in' | 'thou'] ?? 4

/** "E4 on 648 mm, A4 = 440 Hz". */
export const shownReference = (
  reference: { readonly midi: number; readonly a4: number; readonly length: number },
  { units, numberFormat: decimal }: WorksFacts,
): string =>
  `${noteName(reference.midi)} on ${formatQuantity(reference.length, units.length, {
    decimals: units.length === 'mm' ? 0 : 2,
    decimal,
    withUnit: true,
  })}, A4 = ${formatQuantity(reference.a4, 'Hz', { decimals: 0, decimal, withUnit: true })}`

/** A number for an entry field: no more digits than it has. */
export const entryOf = (value: number, decimal: Decimal): string => {
  const text = String(Number(value.toPrecision(10)))
  return decimal === 'comma' ? text.replace('.', ',') : text
}
