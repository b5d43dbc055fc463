import type { CheckCase } from './check-case'
import { type Comparison, compareOutputs } from './compare'
import type { QuantityTable } from './inputs'

/** What became of one case. `not-known`: no function computes its quantity, which is never a pass. */
export interface CaseResult {
  readonly id: string
  readonly quantity: string
  readonly source: string
  readonly kind: string
  readonly status: 'passed' | 'failed' | 'not-known'
  readonly comparisons: readonly Comparison[]
  /** Why nothing could be compared. */
  readonly error?: string
}

/** Runs one case against the table of quantities; a function that throws fails the case with its message. */
export function runCase(one: CheckCase, quantities: QuantityTable): CaseResult {
  const { expected, id, inputs, kind, quantity, source, tolerance } = one
  const base = { id, quantity, source, kind }
  const compute = Object.hasOwn(quantities, quantity) ? quantities[quantity] : undefined
  if (!compute)
    return { ...base, status: 'not-known', comparisons: [], error: `no function computes “${quantity}”` }
  try {
    const comparisons = compareOutputs(expected, compute(inputs), tolerance)
    const passed = comparisons.length > 0 && comparisons.every((comparison) => comparison.passed)
    return {
      ...base,
      status: passed ? 'passed' : 'failed',
      comparisons,
      ...(comparisons.length === 0 ? { error: 'nothing was compared' } : {}),
    }
  } catch (error) {
    return {
      ...base,
      status: 'failed',
      comparisons: [],
      error: error instanceof Error ? error.message : String(error),
    }
  }
}

export const runCases = (cases: readonly CheckCase[], quantities: QuantityTable): readonly CaseResult[] =>
  cases.map((one) => runCase(one, quantities))

/**
 * The comparison that says most about a case: the first that failed, else the one that used most of its
 * tolerance. Undefined when nothing was compared.
 */
export function decisiveComparison(result: CaseResult): Comparison | undefined {
  const failed = result.comparisons.find((comparison) => !comparison.passed)
  if (failed) return failed
  const share = ({ allowed, deviation }: Comparison): number =>
    deviation === undefined || !allowed ? 0 : deviation / allowed
  return result.comparisons.reduce<Comparison | undefined>(
    (most, one) => (most === undefined || share(one) > share(most) ? one : most),
    undefined,
  )
}
