import { ok, type Result, refused } from '@/lib/domain/result'
import { collect } from './collect'
import { checkField, type FormFields, textField, versionField } from './form-fields'
import { plainText } from './plain-text'

/** The roles, as lib/access knows them; a test holds the two lists together. */
export const roleChoices = ['bench', 'quality', 'sales', 'administrator'] as const

export type RoleChoice = (typeof roleChoices)[number]

export const leastPassword = 10
export const mostPassword = 128

export interface NewPersonInput {
  readonly name: string
  /** Lower case. */
  readonly username: string
  readonly password: string
  readonly roles: readonly RoleChoice[]
}

export interface FirstAccountInput extends NewPersonInput {
  /** As printed by the start; empty where none is asked for. */
  readonly code: string
}

export interface ChangePersonInput {
  readonly version: number
  readonly name: string
  readonly roles: readonly RoleChoice[]
  readonly active: boolean
}

const nameField = (fields: FormFields) => textField(fields, 'name', plainText('Name', { max: 80 }))

const usernameField = (fields: FormFields): Result<string> => {
  const text = (fields.username ?? '').trim().toLowerCase()
  return /^[a-z0-9](?:[a-z0-9._-]{0,28}[a-z0-9])$/.test(text)
    ? ok(text)
    : refused({
        code: 'bad-input',
        message: text === '' ? 'Sign-in name is empty.' : `“${text}” can’t be a sign-in name.`,
        where: 'username',
        mend: 'Use 2 to 30 letters from a to z, digits, and . _ - between them.',
      })
}

/** A new password, typed twice. Taken as it is: spaces count. */
export const passwordField = (fields: FormFields): Result<string> => {
  const password = fields.password ?? ''
  const wrong = (message: string, mend: string, where = 'password') =>
    refused({ code: 'bad-input' as const, message, where, mend })
  if (password.length < leastPassword)
    return wrong(
      `The password has ${password.length} characters, and at least ${leastPassword} are needed.`,
      'Three or four words in a row are good and easy to type.',
    )
  if (password.length > mostPassword)
    return wrong(`The password has more than ${mostPassword} characters.`, 'Take a shorter one.')
  if (password !== fields.passwordAgain)
    return wrong('The two passwords differ.', 'Type the same one twice.', 'passwordAgain')
  return ok(password)
}

/** Roles that were ticked; what is none of ours is refused. */
const rolesField = (ticked: readonly string[]): Result<readonly RoleChoice[]> => {
  const stray = ticked.find((role) => !(roleChoices as readonly string[]).includes(role))
  return stray === undefined
    ? ok(roleChoices.filter((role) => ticked.includes(role)))
    : refused({ code: 'bad-input', message: `“${stray}” is not a role.`, where: 'roles' })
}

const needRole = (result: Result<readonly RoleChoice[]>): Result<readonly RoleChoice[]> =>
  result.ok && result.value.length === 0
    ? refused({
        code: 'bad-input',
        message: 'No role is ticked; without one a person can do nothing.',
        where: 'roles',
        mend: 'Tick at least one.',
      })
    : result

export const parseNewPerson = (fields: FormFields, ticked: readonly string[]): Result<NewPersonInput> =>
  collect({
    name: nameField(fields),
    username: usernameField(fields),
    password: passwordField(fields),
    roles: needRole(rolesField(ticked)),
  })

/** The first account is an administrator whatever is ticked. */
export const parseFirstAccount = (fields: FormFields, ticked: readonly string[]): Result<FirstAccountInput> =>
  collect({
    name: nameField(fields),
    username: usernameField(fields),
    password: passwordField(fields),
    roles: rolesField(ticked),
    code: textField(fields, 'code', plainText('Code', { min: 0, max: 40 })),
  })

export const parseChangePerson = (fields: FormFields, ticked: readonly string[]): Result<ChangePersonInput> =>
  collect({
    version: versionField(fields),
    name: nameField(fields),
    roles: rolesField(ticked),
    active: checkField(fields, 'active'),
  })

export interface SignInInput {
  readonly username: string
  readonly password: string
  readonly stay: boolean
}

/** Whatever was typed is tried, so that the answer tells nothing about which names exist. */
export const parseSignIn = (fields: FormFields): Result<SignInInput> => {
  const username = (fields.username ?? '').trim()
  const password = fields.password ?? ''
  const missing = [
    ...(username === '' ? [{ where: 'username', message: 'The sign-in name is empty.' }] : []),
    ...(password === '' ? [{ where: 'password', message: 'The password is empty.' }] : []),
  ]
  if (missing.length > 0) return refused(...missing.map((one) => ({ code: 'bad-input' as const, ...one })))
  if (username.length > 60 || password.length > 200)
    return refused({ code: 'bad-input', message: 'Name or password is far too long.', where: 'username' })
  return ok({ username, password, stay: fields.stay === 'yes' })
}

export interface OwnPasswordInput {
  readonly current: string
  readonly password: string
}

export const parseOwnPassword = (fields: FormFields): Result<OwnPasswordInput> =>
  collect({
    current: ok((fields.current ?? '').slice(0, mostPassword)),
    password: passwordField(fields),
  })
