import type { z } from 'zod'
import type { Problem } from '@/lib/domain/errors'
import { ok, type Result, refused } from '@/lib/domain/result'

/** Most problems that one reply names: a person mends the first few and tries again. */
export const MOST_PROBLEMS = 20

/**
 * Parses what came in with a schema. Each problem has the path of its field in `where`. The schema's messages
 * are whole sentences; those that a transform put together as Problems keep their own `mend`.
 */
export function parseInput<Schema extends z.ZodType>(
  schema: Schema,
  input: unknown,
): Result<z.output<Schema>> {
  const parsed = schema.safeParse(input)
  if (parsed.success) return ok(parsed.data)
  return refused(...parsed.error.issues.slice(0, MOST_PROBLEMS).map(problemOf))
}

function problemOf(issue: z.core.$ZodIssue): Problem {
  const where = issue.path.map(String).join('.')
  const mend =
    issue.code === 'custom' && typeof issue.params?.mend === 'string' ? issue.params.mend : undefined
  return {
    code: 'bad-input',
    message: sentence(issue, where),
    ...(where === '' ? {} : { where }),
    ...(mend === undefined ? {} : { mend }),
  }
}

/** Schemas say what is wrong themselves; shape errors, which only a program makes, get the field's name. */
function sentence(issue: z.core.$ZodIssue, where: string): string {
  if (issue.code === 'unrecognized_keys') return `${issue.keys.join(', ')}: not known here.`
  if (issue.code === 'invalid_type' && /^Invalid input/.test(issue.message))
    return `${where || 'The request'}: ${issue.message.replace(/^Invalid input: /, '')}.`
  return /[.!?]$/.test(issue.message) ? issue.message : `${where}: ${issue.message}.`
}
