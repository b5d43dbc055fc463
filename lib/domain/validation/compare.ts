import { ln } from '../units/elementary'
import type { CaseTolerance, CheckCase } from './check-case'

/** One expected value beside what was got for it. */
export interface Comparison {
  /** Dotted path into `expected`; list elements by their index from 0. */
  readonly path: string
  readonly expected: unknown
  readonly got: unknown
  readonly tolerance: CaseTolerance | undefined
  /** |got − expected|, or cents where the tolerance is in cents; absent for texts and truth values. */
  readonly deviation?: number
  /** The largest deviation that passes. */
  readonly allowed?: number
  readonly passed: boolean
}

/**
 * The tolerance of a path: the entry of that path or of the longest beginning of it, else `*`. Undefined when
 * nothing is said: then a number has to be equal.
 */
export function toleranceOf(tolerance: CheckCase['tolerance'], path: string): CaseTolerance | undefined {
  let found = tolerance['*']
  let length = -1
  for (const [key, one] of Object.entries(tolerance)) {
    if (key.length > length && (path === key || path.startsWith(`${key}.`))) {
      found = one
      length = key.length
    }
  }
  return found
}

/**
 * Compares outputs with what a case expects: numbers within max(abs, rel·|expected|) or within cents, lists
 * and nested objects element by element, texts, truth values and nulls exactly. Outputs that the case does not
 * expect are ignored; a missing one fails, and so does anything that is not a finite number where one is due.
 */
export function compareOutputs(
  expected: unknown,
  got: unknown,
  tolerance: CheckCase['tolerance'],
  path = '',
): readonly Comparison[] {
  const below = (name: string | number) => (path === '' ? String(name) : `${path}.${name}`)
  if (Array.isArray(expected)) {
    const list: readonly unknown[] = Array.isArray(got) ? got : []
    const length = Array.isArray(got) ? got.length : undefined
    return [
      ...(length === expected.length ? [] : [exactly(below('length'), expected.length, length)]),
      ...expected.flatMap((one, index) => compareOutputs(one, list[index], tolerance, below(index))),
    ]
  }
  if (typeof expected === 'object' && expected !== null) {
    const record = typeof got === 'object' && got !== null ? (got as Readonly<Record<string, unknown>>) : {}
    return Object.entries(expected).flatMap(([name, one]) =>
      compareOutputs(one, Object.hasOwn(record, name) ? record[name] : undefined, tolerance, below(name)),
    )
  }
  return [
    typeof expected === 'number'
      ? nearly(path, expected, got, toleranceOf(tolerance, path))
      : exactly(path, expected, got),
  ]
}

const exactly = (path: string, expected: unknown, got: unknown): Comparison => ({
  path,
  expected,
  got,
  tolerance: undefined,
  passed: got === expected,
})

function nearly(
  path: string,
  expected: number,
  got: unknown,
  tolerance: CaseTolerance | undefined,
): Comparison {
  const { abs = 0, cents, rel = 0 } = tolerance ?? {}
  const base = { path, expected, got, tolerance }
  if (typeof got !== 'number' || !Number.isFinite(got)) return { ...base, passed: false }
  const difference = Math.abs(got - expected)
  const within = Math.max(abs, rel * Math.abs(expected))
  if (cents !== undefined && difference > within) {
    const deviation = Math.abs((1200 * ln(got / expected)) / Math.LN2)
    return { ...base, deviation, allowed: cents, passed: deviation <= cents }
  }
  return { ...base, deviation: difference, allowed: within, passed: difference <= within }
}
