import 'server-only'
import { cookies } from 'next/headers'
import type { SessionCookie } from '@/lib/access/session'

/** Hands the session's cookies to the browser; from an action or a route only. */
export const setSessionCookies = async (given: readonly SessionCookie[]): Promise<void> => {
  const store = await cookies()
  for (const { name, value, options } of given) store.set(name, value, { ...options })
}
