import { formatNumber, type NumberFormat, UNDEFINED_TEXT } from '@/lib/domain/units/format'

/** Where along a lot, whole metres: "0 – 800", "from 800", "to 800"; a dash where nobody said it. */
export function formatAlong(
  from: number | undefined,
  to: number | undefined,
  decimal: NumberFormat['decimal'],
): string {
  const metre = (value: number): string =>
    formatNumber(value, { decimals: Number.isInteger(value) ? 0 : 1, decimal })
  if (from !== undefined && to !== undefined) return `${metre(from)} – ${metre(to)}`
  if (from !== undefined) return `from ${metre(from)}`
  return to === undefined ? UNDEFINED_TEXT : `to ${metre(to)}`
}
