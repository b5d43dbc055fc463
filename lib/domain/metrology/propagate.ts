import type { BudgetLine, Estimate } from './evaluation'
import type { InputValues } from './input-values'

/** One input of a measurement model. */
export interface ModelInput {
  readonly id: string
  readonly name: string
  readonly value: number
  /** Standard uncertainty, in the unit of the value. */
  readonly u: number
  readonly unit: string
  readonly type: 'A' | 'B'
  readonly distribution: BudgetLine['distribution']
  /** The same for all specimens of a lot, so that the mean of the lot does not lessen it. */
  readonly common: boolean
  readonly note?: string
}

export interface Propagated {
  readonly estimate: Estimate
  readonly budget: readonly BudgetLine[]
}

/**
 * Law of propagation of uncertainty for several results of one model at once, with the sensitivities taken
 * as finite differences over one standard uncertainty: contribution_i = |f(x + u_i) − f(x − u_i)| / 2.
 * Results that share inputs are treated right without stating a correlation, because the model is evaluated
 * as a whole. Inputs are independent of each other. Lines below a millionth of the largest are rounding
 * errors of the differences, and are left out.
 *
 * Not for models that bend within ±u (then Monte Carlo, JCGM 101). A result that is missing at the centre, or
 * for an input one standard uncertainty away, is left out: its uncertainty would be told too small.
 *
 * Source: JCGM 100:2008, 5.1.2 and 5.1.3 note 2 (numerical sensitivities).
 */
export function propagate<Result extends string>(
  inputs: readonly ModelInput[],
  model: (values: InputValues) => Readonly<Partial<Record<Result, number>>>,
): Readonly<Partial<Record<Result, Propagated>>> {
  const centre: Record<string, number> = {}
  for (const input of inputs) centre[input.id] = input.value
  const at = model(centre)
  const lines = new Map<Result, BudgetLine[]>()
  for (const id of Object.keys(at) as Result[]) if (Number.isFinite(at[id])) lines.set(id, [])
  for (const input of inputs) {
    if (!(input.u > 0)) continue
    const above = model({ ...centre, [input.id]: input.value + input.u })
    const below = model({ ...centre, [input.id]: input.value - input.u })
    for (const [id, budget] of lines) {
      const high = above[id]
      const low = below[id]
      if (high === undefined || low === undefined) lines.delete(id)
      else budget.push(lineOf(input, Math.abs(high - low) / 2))
    }
  }
  const propagated: Partial<Record<Result, Propagated>> = {}
  for (const [id, all] of lines) {
    const value = at[id]
    if (value === undefined) continue
    const largest = Math.max(0, ...all.map((line) => line.contribution))
    const budget = all.filter((line) => line.contribution > 1e-6 * largest)
    propagated[id] = { estimate: { value, ...combine(budget) }, budget }
  }
  return propagated
}

const lineOf = (input: ModelInput, contribution: number): BudgetLine => ({
  input: input.name,
  value: input.value,
  unit: input.unit,
  u: input.u,
  contribution,
  type: input.type,
  distribution: input.distribution,
  common: input.common,
  ...(input.note === undefined ? {} : { note: input.note }),
})

/** Root sum of squares of a budget, and of its common lines alone. */
export function combine(budget: readonly BudgetLine[]): { readonly u: number; readonly uCommon: number } {
  let all = 0
  let common = 0
  for (const line of budget) {
    all += line.contribution * line.contribution
    if (line.common) common += line.contribution * line.contribution
  }
  return { u: Math.sqrt(all), uCommon: Math.sqrt(common) }
}
