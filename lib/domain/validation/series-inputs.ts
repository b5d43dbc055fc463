import { type Inputs, listOf } from './inputs'

/** A list of numbers in which null means “none” (a gap, an infinite number). */
export const nullableNumbersOf = (inputs: Inputs, name: string): readonly (number | null)[] =>
  listOf(inputs, name).map((value) => {
    if (value === null) return null
    if (typeof value === 'number' && Number.isFinite(value)) return value
    throw new TypeError(`input “${name}” has to be a list of numbers or nulls, not ${JSON.stringify(value)}`)
  })

/** Degrees of freedom: null is infinite. */
export const degreesOf = (inputs: Inputs, name: string): readonly number[] =>
  nullableNumbersOf(inputs, name).map((value) => value ?? Number.POSITIVE_INFINITY)

/** A list of lists of numbers. */
export const rowsOf = (inputs: Inputs, name: string): readonly (readonly number[])[] =>
  listOf(inputs, name).map((row, index) => {
    if (Array.isArray(row) && row.every((value) => typeof value === 'number' && Number.isFinite(value)))
      return row as readonly number[]
    throw new TypeError(`input “${name}” has to be a list of lists of numbers; entry ${index + 1} is not`)
  })

/** One output a tuple of list inputs: `zip((x, df) => …, xs, dfs)`. Throws when the lists differ in length. */
export function zip<T>(
  compute: (...values: readonly number[]) => T,
  ...lists: readonly (readonly number[])[]
): readonly T[] {
  const [first, ...others] = lists
  if (!first || others.some((list) => list.length !== first.length))
    throw new TypeError('the lists of inputs differ in length')
  return first.map((_, index) => compute(...lists.map((list) => list[index] ?? Number.NaN)))
}
