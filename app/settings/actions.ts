'use server'

import { submitted, valuesOf } from '@/app/_submit'
import type { FormState } from '@/app/_ui/forms/form-state'
import { parseChangePerson, parseNewPerson, parseOwnPassword, passwordField } from '@/lib/input/person'
import { parseWorks } from '@/lib/input/works'
import { changeOwnPassword } from '@/lib/services/change-own-password'
import { changePerson } from '@/lib/services/change-person'
import { createPerson } from '@/lib/services/create-person'
import { setPassword } from '@/lib/services/set-password'
import { updateWorks } from '@/lib/services/update-works'

export async function updateWorksAction(_: FormState, form: FormData): Promise<FormState> {
  return submitted(form, {
    parse: parseWorks,
    serve: (actor, input) => updateWorks(actor, input),
    goTo: () => '/settings?saved=yes',
  })
}

export async function createPersonAction(_: FormState, form: FormData): Promise<FormState> {
  return submitted(form, {
    parse: (fields) => parseNewPerson(fields, valuesOf(form, 'roles')),
    serve: (actor, input) => createPerson(actor, input),
    goTo: () => '/settings/people',
  })
}

export async function changePersonAction(id: number, _: FormState, form: FormData): Promise<FormState> {
  return submitted(form, {
    parse: (fields) => parseChangePerson(fields, valuesOf(form, 'roles')),
    serve: (actor, input) => changePerson(actor, id, input),
    goTo: () => '/settings/people',
  })
}

export async function setPasswordAction(id: number, _: FormState, form: FormData): Promise<FormState> {
  return submitted(form, {
    parse: passwordField,
    serve: (actor, password) => setPassword(actor, id, password),
    done: () => 'The new password is set. Whoever used the old one is signed out.',
  })
}

export async function changeOwnPasswordAction(_: FormState, form: FormData): Promise<FormState> {
  return submitted(form, {
    parse: parseOwnPassword,
    serve: (actor, input) => changeOwnPassword(actor, input),
    goTo: () => '/sign-in',
  })
}
