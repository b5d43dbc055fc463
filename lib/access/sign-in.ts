/**
 * Passwords and sessions, and nothing else: no sign-up, no e-mail, no roles (those are Person's), no cookie
 * that answers for the database. Its own routes are not served: signing in goes through `signIn`, with our
 * slowing around it.
 */
import { prismaAdapter } from 'better-auth/adapters/prisma'
import { betterAuth } from 'better-auth/minimal'
import { username } from 'better-auth/plugins/username'
import { requireEnvironment } from '@/lib/data/env'
import { type SignInClient, signInClient } from '@/lib/data/sign-in-client'
import { isHttps } from './client-address'
import { hashPassword, isPassword, leastPasswordLength, mostPasswordLength } from './password'
import { sessionSecret } from './session-secret'

const day_s = 24 * 3600

/** Without "keep me signed in" the browser forgets the cookie when it closes, and the library after a day. */
export const sessionDays = 7

const open = (client: SignInClient, https: boolean) => {
  const { dataDir, engine } = requireEnvironment()
  return betterAuth({
    appName: 'Ledgerline',
    // Only a name: no address is ever built from it, and its routes are not served.
    baseURL: https ? 'https://localhost' : 'http://localhost',
    secret: sessionSecret(dataDir),
    database: prismaAdapter(client, { provider: engine }),
    emailAndPassword: {
      enabled: true,
      disableSignUp: true,
      minPasswordLength: leastPasswordLength,
      maxPasswordLength: mostPasswordLength,
      password: { hash: hashPassword, verify: isPassword },
    },
    session: {
      expiresIn: sessionDays * day_s,
      // A page can't set a cookie: a session ends when it was said to, and reading writes nothing.
      disableSessionRefresh: true,
      cookieCache: { enabled: false },
    },
    plugins: [
      username({
        minUsernameLength: 2,
        maxUsernameLength: 30,
        usernameValidator: (name) => /^[a-z0-9](?:[a-z0-9._-]*[a-z0-9])?$/i.test(name),
      }),
    ],
    rateLimit: { enabled: false },
    telemetry: { enabled: false },
    logger: { level: 'error' },
    advanced: {
      cookiePrefix: 'ledgerline',
      useSecureCookies: https,
      ipAddress: { disableIpTracking: true },
      defaultCookieAttributes: { sameSite: 'lax', httpOnly: true, path: '/' },
    },
  })
}

type Instance = ReturnType<typeof open>

const key = Symbol.for('ledgerline.sign-in')

/** Once for each protocol: cookies of an https page carry `Secure`. */
export const signInLibrary = (headers: Headers): Instance => {
  const holder = globalThis as typeof globalThis & {
    [key]?: { readonly client: SignInClient; readonly byProtocol: Map<boolean, Instance> }
  }
  const client = signInClient()
  if (holder[key]?.client !== client) holder[key] = { client, byProtocol: new Map() }
  const { byProtocol } = holder[key]
  const https = isHttps(headers)
  const instance = byProtocol.get(https) ?? open(client, https)
  byProtocol.set(https, instance)
  return instance
}
