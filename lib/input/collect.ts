import type { Problem } from '@/lib/domain/errors'
import { ok, type Result } from '@/lib/domain/result'

type Values<Parts> = {
  readonly [Name in keyof Parts]: Parts[Name] extends Result<infer Value> ? Value : never
}

/** All parts or all that is wrong with any of them: a person mends a form in one go. */
export function collect<Parts extends Readonly<Record<string, Result<unknown>>>>(
  parts: Parts,
): Result<Values<Parts>> {
  const problems: Problem[] = []
  const values: Record<string, unknown> = {}
  for (const [name, part] of Object.entries(parts)) {
    if (part.ok) values[name] = part.value
    else problems.push(...part.problems)
  }
  return problems.length > 0 ? { ok: false, problems } : ok(values as Values<Parts>)
}
