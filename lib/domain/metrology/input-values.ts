/** Values of a model's inputs by id. Offsets and relative errors are zero at the centre. */
export type InputValues = Readonly<Record<string, number>>

/** An offset: zero where nothing is said. */
export const offset = (inputs: InputValues, id: string): number => inputs[id] ?? 0
