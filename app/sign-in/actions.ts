'use server'

import { headers } from 'next/headers'
import { redirect } from 'next/navigation'
import { setSessionCookies } from '@/app/_cookies'
import { fieldsOf, refusedForm } from '@/app/_submit'
import type { FormState } from '@/app/_ui/forms/form-state'
import { signIn, signOut } from '@/lib/access/session'
import { LedgerlineError } from '@/lib/domain/errors'
import { parseSignIn } from '@/lib/input/person'
import { nextPath } from './next-path'

export async function signInAction(_: FormState, form: FormData): Promise<FormState> {
  const fields = fieldsOf(form)
  const parsed = parseSignIn(fields)
  if (!parsed.ok) return refusedForm(form, parsed)
  try {
    const { cookies } = await signIn(parsed.value, await headers())
    await setSessionCookies(cookies)
  } catch (error) {
    if (!(error instanceof LedgerlineError)) throw error
    return refusedForm(form, error)
  }
  redirect(nextPath(fields.next))
}

export async function signOutAction(): Promise<void> {
  await setSessionCookies(await signOut(await headers()))
  redirect('/sign-in')
}
