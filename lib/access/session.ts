import { parseSetCookieHeader, toCookieOptions } from 'better-auth/cookies'
import { database } from '@/lib/data/database'
import { findPersonByUserId, type PersonRow } from '@/lib/data/people'
import { problem } from '@/lib/domain/errors'
import { type Actor, type Role, roles } from './actor'
import { beginAttempt, forgetFailures } from './attempts'
import { askedOnLoopback, clientAddress } from './client-address'
import { signInLibrary } from './sign-in'

/** Accounts of the demo works end so; their passwords are printed, so they serve on this computer only. */
export const demoEmailDomain = '@demo.invalid'

/** A cookie for the entry to set. */
export interface SessionCookie {
  readonly name: string
  readonly value: string
  readonly options: {
    readonly maxAge?: number
    readonly path?: string
    readonly secure?: boolean
    readonly httpOnly?: boolean
    readonly sameSite?: 'strict' | 'lax' | 'none'
  }
}

const isRole = (text: string): text is Role => (roles as readonly string[]).includes(text)

const actorOf = ({ id, name, roles: held }: PersonRow): Actor => ({
  personId: id,
  name,
  roles: roles.filter((role) => held.some((one) => isRole(one) && one === role)),
})

/** Person and roles are read at each call: a role taken away, or a person deactivated, stops the next click. */
const actorOfUser = async (
  user: { readonly id: string; readonly email: string },
  headers: Headers,
): Promise<Actor | undefined> => {
  if (user.email.endsWith(demoEmailDomain) && !askedOnLoopback(headers)) return undefined
  const person = await findPersonByUserId(database().read, user.id)
  return person?.active ? actorOf(person) : undefined
}

/** Who is calling, by the session cookie; undefined for nobody. */
export const actorFromHeaders = async (headers: Headers): Promise<Actor | undefined> => {
  if (!headers.has('cookie')) return undefined
  const session = await signInLibrary(headers).api.getSession({ headers, query: { disableRefresh: true } })
  return session ? actorOfUser(session.user, headers) : undefined
}

export interface SignInAttempt {
  readonly username: string
  readonly password: string
  /** Stay signed in after the browser closes. */
  readonly stay: boolean
}

const wrong = () =>
  problem('not-signed-in', 'Name and password do not belong together.', {
    mend: 'Check both and try again; an administrator can set a new password.',
  })

/**
 * Signs in. The answer to an unknown name, a wrong password and a person who is no longer active is the same.
 * @throws LedgerlineError not-signed-in; busy while the account or the address has to wait
 */
export const signIn = async (
  attempt: SignInAttempt,
  headers: Headers,
): Promise<{ readonly actor: Actor; readonly cookies: readonly SessionCookie[] }> => {
  const username = attempt.username.trim().toLowerCase()
  const address = clientAddress(headers)
  await beginAttempt(username, address, Date.now())
  const library = signInLibrary(headers)
  const { headers: answer, response } = await library.api
    .signInUsername({
      body: { username, password: attempt.password, rememberMe: attempt.stay },
      headers,
      returnHeaders: true,
    })
    .catch((error: unknown) => {
      throw isRefusal(error) ? wrong() : error
    })
  const actor = await actorOfUser(response.user, headers)
  const cookies = cookiesOf(answer)
  if (actor === undefined) {
    await library.api.signOut({ headers: new Headers({ cookie: cookieHeader(cookies) }) })
    throw wrong()
  }
  await forgetFailures(username, address)
  return { actor, cookies }
}

/** Ends the session in the database. @returns the cookies to take back */
export const signOut = async (headers: Headers): Promise<readonly SessionCookie[]> => {
  const { headers: answer } = await signInLibrary(headers).api.signOut({ headers, returnHeaders: true })
  return cookiesOf(answer)
}

/** What the library answers to a name or password that does not fit, as opposed to a failing database. */
const isRefusal = (error: unknown): boolean =>
  error instanceof Error &&
  'statusCode' in error &&
  typeof error.statusCode === 'number' &&
  error.statusCode >= 400 &&
  error.statusCode < 500

const cookiesOf = (headers: Headers): readonly SessionCookie[] =>
  headers.getSetCookie().flatMap((line) =>
    [...parseSetCookieHeader(line)].map(([name, attributes]) => {
      const { maxAge, path, secure, httpOnly, sameSite } = toCookieOptions(attributes)
      return { name, value: attributes.value, options: { maxAge, path, secure, httpOnly, sameSite } }
    }),
  )

const cookieHeader = (cookies: readonly SessionCookie[]): string =>
  cookies.map(({ name, value }) => `${name}=${encodeURIComponent(value)}`).join('; ')
