import { formatNumber } from '../units/format'

export interface ReadoutFormat {
  readonly decimal?: 'point' | 'comma'
}

/** A value of a stave as it is shown: its decimals, and its sign where deviations are charted. */
export const valueText = (
  value: number | undefined,
  stave: { readonly decimals: number; readonly signed?: boolean },
  format: ReadoutFormat = {},
): string =>
  formatNumber(value, {
    decimals: stave.decimals,
    decimal: format.decimal,
    sign: stave.signed ? 'always' : 'negative',
  })

/** Distance from the centre line, "+1.3 σ"; a dash without limits. */
export function sigmasText(sigmas: number | undefined, format: ReadoutFormat = {}): string {
  const text = formatNumber(sigmas, { decimals: 1, decimal: format.decimal, sign: 'always' })
  return sigmas === undefined ? text : `${text}\u00a0σ`
}
