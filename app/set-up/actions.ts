'use server'

import { headers } from 'next/headers'
import { redirect } from 'next/navigation'
import { setSessionCookies } from '@/app/_cookies'
import { fieldsOf, refusedForm, submitted, valuesOf } from '@/app/_submit'
import type { FormState } from '@/app/_ui/forms/form-state'
import { signIn } from '@/lib/access/session'
import { LedgerlineError } from '@/lib/domain/errors'
import { ok } from '@/lib/domain/result'
import { parseFirstAccount } from '@/lib/input/person'
import { parseNewWorks } from '@/lib/input/works'
import { createFirstAccount } from '@/lib/services/create-first-account'
import { createWorks } from '@/lib/services/create-works'
import { loadDemoWorks } from '@/lib/services/load-demo-works'

export async function createFirstAccountAction(_: FormState, form: FormData): Promise<FormState> {
  const parsed = parseFirstAccount(fieldsOf(form), valuesOf(form, 'roles'))
  if (!parsed.ok) return refusedForm(form, parsed)
  const { username, password } = parsed.value
  try {
    const caller = await headers()
    await createFirstAccount(parsed.value, caller)
    const { cookies } = await signIn({ username, password, stay: false }, caller)
    await setSessionCookies(cookies)
  } catch (error) {
    if (!(error instanceof LedgerlineError)) throw error
    return refusedForm(form, error)
  }
  redirect('/set-up/works')
}

export async function createWorksAction(_: FormState, form: FormData): Promise<FormState> {
  return submitted(form, {
    parse: parseNewWorks,
    serve: (actor, input) => createWorks(actor, input),
    goTo: () => '/today',
  })
}

export async function loadDemoAction(_: FormState, form: FormData): Promise<FormState> {
  return submitted(form, {
    parse: () => ok(undefined),
    serve: (actor) => loadDemoWorks(actor),
    goTo: () => '/set-up/works',
  })
}
