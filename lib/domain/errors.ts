/** The closed list of reasons why something is refused. An edge maps each to its own reply. */
export const problemCodes = [
  'bad-input',
  'not-found',
  'not-signed-in',
  'not-permitted',
  'conflict',
  'already-decided',
  'not-ready',
  'busy',
  'storage',
] as const

export type ProblemCode = (typeof problemCodes)[number]

/** What, where, how to mend: sentences for a person. */
export interface Problem {
  readonly code: ProblemCode
  readonly message: string
  /** Field, row or column that is meant. */
  readonly where?: string
  readonly mend?: string
  /** Values that a person has to choose between, or that explain the refusal. */
  readonly details?: Readonly<Record<string, string | number | boolean | null>>
}

/** Marks a refusal whichever copy of this module it was made by: the bundler puts several into one server. */
const mark = Symbol.for('ledgerline.refusal')

/** Thrown by services. `message` is for the log; `problem` is what the person reads. */
export class LedgerlineError extends Error {
  readonly problem: Problem
  readonly [mark] = true

  static override [Symbol.hasInstance](value: unknown): boolean {
    return typeof value === 'object' && value !== null && mark in value
  }

  constructor(problem: Problem, options?: ErrorOptions) {
    super(`${problem.code}: ${problem.message}`, options)
    this.name = 'LedgerlineError'
    this.problem = problem
  }
}

/** Shorthand for throwing sites: `throw problem('not-found', 'There is no lot LA-999.')`. */
export const problem = (
  code: ProblemCode,
  message: string,
  more: Omit<Problem, 'code' | 'message'> = {},
): LedgerlineError => new LedgerlineError({ code, message, ...more })
