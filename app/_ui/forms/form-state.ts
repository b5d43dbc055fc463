import type { Problem } from '@/lib/domain/errors'

/** What a form shows after it was sent: kept by `useActionState`, made by `submitted` (app/_submit.ts). */
export interface FormState {
  readonly status: 'fresh' | 'refused' | 'done'
  readonly problems: readonly Problem[]
  /** What was typed, given back so that nothing typed is lost. */
  readonly values: Readonly<Record<string, readonly string[]>>
  /** A sentence after success. */
  readonly message?: string
  /** Differs at each answer, so that fields take the values given back. */
  readonly stamp: number
}

export const freshForm: FormState = { status: 'fresh', problems: [], values: {}, stamp: 0 }

/** Server action of a form, as `useActionState` wants it. */
export type FormAction = (previous: FormState, form: FormData) => Promise<FormState>

/** Problems of one field; those without a field are shown over the form only. */
export const problemsOf = (state: FormState, field: string): readonly Problem[] =>
  state.problems.filter(({ where }) => where === field)
