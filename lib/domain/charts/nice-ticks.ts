/**
 * Round values (1, 2 or 5 times a power of ten apart) within a range, about `count` of them, with the decimals
 * they need. A range without extent, or one too narrow for numbers to tell its values apart, gives its one value.
 */
export function niceTicks(
  from: number,
  to: number,
  count: number,
): { readonly values: readonly number[]; readonly step: number; readonly decimals: number } {
  const extent = to - from
  const finest = Math.max(Math.abs(from), Math.abs(to)) * 1e-12
  if (!(extent > Math.max(finest, 1e-290)) || !Number.isFinite(extent) || !(count > 0)) {
    const values = Number.isFinite(from) ? [from] : []
    return { values, step: 0, decimals: 0 }
  }
  const raw = extent / count
  const power = 10 ** Math.floor(Math.log10(raw))
  const times = raw / power
  const step = (times < 1.5 ? 1 : times < 3.5 ? 2 : times < 7.5 ? 5 : 10) * power
  const decimals = Math.max(0, -Math.floor(Math.log10(step) + 1e-9))
  const first = Math.ceil(from / step - 1e-9)
  const last = Math.floor(to / step + 1e-9)
  const values = Array.from({ length: Math.max(0, last - first + 1) }, (_, index) =>
    // Through text, so that 0.1 + 0.2 is shown and placed as 0.3.
    Number(((first + index) * step).toFixed(Math.min(100, decimals))),
  )
  return { values, step, decimals }
}
