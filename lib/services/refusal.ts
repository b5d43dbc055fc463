import { LedgerlineError, type Problem, problem } from '@/lib/domain/errors'

/** Sentences that one refusal carries at most; the first of them usually explains the others. */
const MOST_SENTENCES = 5

/** The problems of a refused result as one error: all in its message, the first one's place and mend. */
export function refusal(problems: readonly Problem[]): LedgerlineError {
  const [first, ...others] = problems
  if (first === undefined) return problem('bad-input', 'This was refused without a reason.')
  if (others.length === 0) return new LedgerlineError(first)
  const told = problems.slice(0, MOST_SENTENCES).map((one) => one.message)
  const rest = problems.length - told.length
  return new LedgerlineError({
    ...first,
    message: [...told, ...(rest > 0 ? [`And ${rest} more.`] : [])].join(' '),
    details: Object.assign({}, ...problems.map((one) => one.details ?? {})),
  })
}
