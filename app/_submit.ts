import 'server-only'
import { revalidatePath } from 'next/cache'
import { redirect } from 'next/navigation'
import type { Actor } from '@/lib/access/actor'
import { LedgerlineError } from '@/lib/domain/errors'
import type { Result } from '@/lib/domain/result'
import { currentActor } from './_session'
import type { FormState } from './_ui/forms/form-state'

/** The fields of a form: the last value under each name, texts only. */
export type FormFields = Readonly<Record<string, string>>

/** Names the framework adds for itself begin with $. */
const isOurs = (name: string): boolean => !name.startsWith('$')

const texts = (form: FormData): [string, string][] =>
  [...form.entries()].flatMap(([name, value]) =>
    isOurs(name) && typeof value === 'string' ? [[name, value] as [string, string]] : [],
  )

export const fieldsOf = (form: FormData): FormFields => Object.fromEntries(texts(form))

/** All values under one name, for check boxes. */
export const valuesOf = (form: FormData, name: string): readonly string[] =>
  texts(form).flatMap(([one, value]) => (one === name ? [value] : []))

/** Never given back: a password is typed again. */
const secret = /password|^current$/i

const givenBack = (form: FormData): FormState['values'] => {
  const values: Record<string, string[]> = {}
  for (const [name, value] of texts(form)) {
    if (!secret.test(name)) values[name] = [...(values[name] ?? []), value]
  }
  return values
}

export const refusedForm = (form: FormData, error: LedgerlineError | Result<never>): FormState => ({
  status: 'refused',
  problems: error instanceof LedgerlineError ? [error.problem] : error.ok ? [] : error.problems,
  values: givenBack(form),
  stamp: Date.now(),
})

interface Submission<Input, Reply> {
  /** From fields to what the service takes; problems carry the field's name in `where`. */
  readonly parse: (fields: FormFields, form: FormData) => Result<Input>
  readonly serve: (actor: Actor | undefined, input: Input) => Promise<Reply>
  /** The sentence after success … */
  readonly done?: (reply: Reply) => string
  /** … or where to go instead. */
  readonly goTo?: (reply: Reply) => string
}

/**
 * The order of every form's action: actor, parse, service (which permits), fresh pages, reply. A refusal comes
 * back as the form's state with everything that was typed.
 */
export const submitted = async <Input, Reply>(
  form: FormData,
  { parse, serve, done, goTo }: Submission<Input, Reply>,
): Promise<FormState> => {
  const actor = await currentActor()
  const parsed = parse(fieldsOf(form), form)
  if (!parsed.ok) return refusedForm(form, parsed)
  let reply: Reply
  try {
    reply = await serve(actor, parsed.value)
  } catch (error) {
    if (!(error instanceof LedgerlineError)) throw error
    return refusedForm(form, error)
  }
  // Pages and the rail's counts are read anew.
  revalidatePath('/', 'layout')
  if (goTo) redirect(goTo(reply))
  return { status: 'done', problems: [], values: givenBack(form), message: done?.(reply), stamp: Date.now() }
}
