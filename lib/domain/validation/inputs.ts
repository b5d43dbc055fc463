/**
 * Reads the inputs of a check case, whose form is only known at run time. Each reader throws a TypeError
 * that names the input: a case that does not fit its quantity is a mistake in the file, not a result.
 */
export type Inputs = Readonly<Record<string, unknown>>

/** What computes one quantity: inputs by name to outputs by name. */
export type QuantityFunction = (inputs: Inputs) => Readonly<Record<string, unknown>>
export type QuantityTable = Readonly<Record<string, QuantityFunction>>

const fail = (name: string, wanted: string, value: unknown): never => {
  throw new TypeError(`input “${name}” has to be ${wanted}, not ${JSON.stringify(value)}`)
}

const asNumber = (name: string, value: unknown): number =>
  typeof value === 'number' && Number.isFinite(value) ? value : fail(name, 'a finite number', value)

export const numberOf = (inputs: Inputs, name: string): number => asNumber(name, inputs[name])

export const optionalNumberOf = (inputs: Inputs, name: string): number | undefined =>
  inputs[name] === undefined || inputs[name] === null ? undefined : numberOf(inputs, name)

export const textOf = <Choice extends string>(
  inputs: Inputs,
  name: string,
  choices: readonly Choice[],
): Choice =>
  choices.find((choice) => choice === inputs[name]) ?? fail(name, choices.join(' or '), inputs[name])

export function listOf(inputs: Inputs, name: string): readonly unknown[] {
  const value = inputs[name]
  return Array.isArray(value) ? value : fail(name, 'a list', value)
}

export const numbersOf = (inputs: Inputs, name: string): readonly number[] =>
  listOf(inputs, name).map((value) => asNumber(name, value))

export const recordsOf = (inputs: Inputs, name: string): readonly Inputs[] =>
  listOf(inputs, name).map((value) =>
    typeof value === 'object' && value !== null && !Array.isArray(value)
      ? (value as Inputs)
      : fail(name, 'a list of records', value),
  )

export const pairsOf = (inputs: Inputs, name: string): readonly (readonly [number, number])[] =>
  listOf(inputs, name).map((value) => {
    if (!Array.isArray(value) || value.length !== 2) return fail(name, 'a list of pairs', value)
    return [asNumber(name, value[0]), asNumber(name, value[1])]
  })
