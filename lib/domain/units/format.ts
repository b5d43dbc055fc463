import { differenceFromSi, fromSi, type UnitId, unit } from './unit'

/** What stands where a value is undefined: too little data is never shown as a number. */
export const UNDEFINED_TEXT = '\u2013'

export interface NumberFormat {
  /** Digits after the decimal sign; negative rounds to tens, hundreds … */
  readonly decimals: number
  readonly decimal?: 'point' | 'comma'
  /** `always` writes + before positive values (deviations). */
  readonly sign?: 'always' | 'negative'
}

/** Digits of a size, never with a power of ten: beyond 1e21 `toFixed` has one, but the number is whole anyway. */
function digitsOf(size: number, decimals: number): string {
  if (size >= 1e21) return BigInt(size).toString()
  if (decimals >= 0) return size.toFixed(Math.min(100, decimals))
  const step = Number(`1e${-decimals}`)
  return (Math.round(size / step) * step).toFixed(0)
}

/**
 * A number as a person reads it: minus U+2212, point or comma, no grouping, never "−0.00".
 * Undefined and non-finite values are an en dash.
 */
export function formatNumber(value: number | undefined, format: NumberFormat): string {
  if (value === undefined || !Number.isFinite(value)) return UNDEFINED_TEXT
  const { decimals, decimal = 'point', sign = 'negative' } = format
  const digits = digitsOf(Math.abs(value), decimals)
  const isZero = !/[1-9]/.test(digits)
  const mark = isZero ? '' : value < 0 ? '\u2212' : sign === 'always' ? '+' : ''
  return mark + (decimal === 'comma' ? digits.replace('.', ',') : digits)
}

export interface QuantityFormat extends Partial<NumberFormat> {
  /** Append the unit's symbol after a no-break space. */
  readonly withUnit?: boolean
  /** The value is a difference or an uncertainty: a temperature's zero does not count. */
  readonly difference?: boolean
}

/** An SI value in a display unit; without `decimals` the unit's own plain number of them. */
export function formatQuantity(si: number | undefined, id: UnitId, format: QuantityFormat = {}): string {
  if (si === undefined || !Number.isFinite(si)) return UNDEFINED_TEXT
  const value = format.difference ? differenceFromSi(si, id) : fromSi(si, id)
  const text = formatNumber(value, { ...format, decimals: format.decimals ?? unit(id).decimals })
  return format.withUnit && text !== UNDEFINED_TEXT ? `${text}\u00a0${id}` : text
}

/**
 * Decimals at which a standard or expanded uncertainty has `significant` digits (two by custom, JCGM 100
 * §7.2.6); undefined when u is zero, negative or not finite. Negative for u of 100 and more.
 */
export function decimalsForUncertainty(u: number, significant = 2): number | undefined {
  if (!(u > 0) || !Number.isFinite(u)) return undefined
  // Rounding first: 0.0996 has its two digits as 0.10, not as 0.100.
  const exponent = Number(u.toExponential(significant - 1).split('e')[1])
  return significant - 1 - exponent
}

/**
 * Value and uncertainty in a display unit, both rounded at the uncertainty's second digit: ["254.03", "0.35"].
 * With an unusable uncertainty the value has the unit's plain decimals and the uncertainty is a dash.
 */
export function formatWithUncertainty(
  si: number | undefined,
  u: number | undefined,
  id: UnitId,
  format: Omit<QuantityFormat, 'decimals' | 'withUnit'> = {},
): { readonly value: string; readonly uncertainty: string } {
  const shownU = u === undefined || !Number.isFinite(u) ? undefined : differenceFromSi(u, id)
  const decimals = shownU === undefined ? undefined : decimalsForUncertainty(shownU)
  if (decimals === undefined) return { value: formatQuantity(si, id, format), uncertainty: UNDEFINED_TEXT }
  return {
    value: formatQuantity(si, id, { ...format, decimals }),
    uncertainty: formatNumber(shownU, { decimals, decimal: format.decimal }),
  }
}
