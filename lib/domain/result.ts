import type { Problem } from './errors'

/** Expected bad input is a value, not an exception: either the value, or what is wrong, in sentences. */
export type Result<T> =
  | { readonly ok: true; readonly value: T }
  | { readonly ok: false; readonly problems: readonly Problem[] }

export const ok = <T>(value: T): Result<T> => ({ ok: true, value })

export const refused = (...problems: readonly Problem[]): { ok: false; problems: readonly Problem[] } => ({
  ok: false,
  problems,
})
