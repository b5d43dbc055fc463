/**
 * Arithmetic mean, by differences from the first value: numbers that differ only in their last digits (a mass
 * in nanograms, a diameter in metres) keep those digits. Undefined for no values.
 *
 * Source: definition; the way of summing after the remarks of NIST StRD on SmLs07 to SmLs09.
 */
export function mean(values: readonly number[]): number | undefined {
  const first = values[0]
  if (first === undefined) return undefined
  let sum = 0
  for (const value of values) sum += value - first
  return first + sum / values.length
}
