import { type BarLine, type BarLineInput, barLineKinds, type LotWindow } from './staff-chart'

/**
 * Bar lines within a window, one per place: reasons that fall together are told together. A change before the
 * window's first lot is told at its left edge.
 */
export function barLinesWithin(inputs: readonly BarLineInput[], window: LotWindow): BarLine[] {
  const places = new Map<number, BarLineInput[]>()
  for (const input of inputs) {
    if (!(input.atIndex >= window.from && input.atIndex <= window.to)) continue
    const together = places.get(input.atIndex)
    if (together) together.push(input)
    else places.set(input.atIndex, [input])
  }
  return [...places.entries()]
    .sort(([a], [b]) => a - b)
    .map(([atIndex, together]) => {
      const sorted = together.toSorted((a, b) => barLineKinds.indexOf(a.kind) - barLineKinds.indexOf(b.kind))
      return {
        atIndex,
        double: sorted.some(({ kind }) => kind === 'limit-set'),
        kinds: sorted.map(({ kind }) => kind),
        reason: sorted.map(({ reason }) => reason).join(', '),
        detail: [...new Set(sorted.map(({ detail }) => detail).filter((detail) => detail !== ''))].join('; '),
      }
    })
}
