import { ok, type Result, refused } from '../result'
import type { Inputs } from './inputs'

/** How near a number has to come; with both `rel` and `abs` meeting either is enough. */
export interface CaseTolerance {
  readonly rel?: number
  readonly abs?: number
  /** For frequencies: hundredths of an equal-tempered semitone. */
  readonly cents?: number
}

/** One check case: a quantity, its inputs, what is expected of it, and where the expectation comes from. */
export interface CheckCase {
  readonly id: string
  readonly quantity: string
  readonly source: string
  /** computed · published · practice (common practice, no source) · memory */
  readonly kind: string
  readonly inputs: Inputs
  readonly expected: Inputs
  /** By output name, by dotted path into `expected`, or `*` for all; the longest match counts. */
  readonly tolerance: Readonly<Record<string, CaseTolerance>>
}

const isRecord = (value: unknown): value is Readonly<Record<string, unknown>> =>
  typeof value === 'object' && value !== null && !Array.isArray(value)

const toleranceNames = ['rel', 'abs', 'cents']

function isTolerance(value: unknown): value is CaseTolerance {
  return (
    isRecord(value) &&
    Object.entries(value).every(
      ([name, size]) =>
        toleranceNames.includes(name) && typeof size === 'number' && Number.isFinite(size) && size >= 0,
    )
  )
}

/** Reads one entry of a file of check cases, or says in a sentence what is wrong with it. */
export function parseCase(value: unknown, where: string): Result<CheckCase> {
  const wrong = (message: string) => refused({ code: 'bad-input', message, where })
  if (!isRecord(value)) return wrong('A check case has to be an object.')
  const { expected, id, inputs, kind, quantity, source, tolerance } = value
  if (typeof id !== 'string' || id === '') return wrong('A check case needs an id.')
  if (typeof quantity !== 'string' || quantity === '') return wrong(`Case ${id} names no quantity.`)
  if (!isRecord(inputs)) return wrong(`Case ${id} has no inputs.`)
  if (!isRecord(expected) || Object.keys(expected).length === 0)
    return wrong(`Case ${id} expects nothing, so it cannot fail.`)
  if (!isRecord(tolerance)) return wrong(`Case ${id} has no tolerance.`)
  for (const [path, one] of Object.entries(tolerance))
    if (!isTolerance(one))
      return wrong(
        `Case ${id}: the tolerance of ${path} may hold rel, abs and cents, numbers not below zero.`,
      )
  return ok({
    id,
    quantity,
    source: typeof source === 'string' ? source : '',
    kind: typeof kind === 'string' ? kind : '',
    inputs,
    expected,
    tolerance: tolerance as CheckCase['tolerance'],
  })
}
