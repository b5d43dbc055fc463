import 'server-only'
import { headers } from 'next/headers'
import { redirect } from 'next/navigation'
import { cache } from 'react'
import type { Actor } from '@/lib/access/actor'
import { actorFromHeaders } from '@/lib/access/session'

/** Set by `proxy.ts`: where the browser is, for coming back after signing in. */
export const pathHeader = 'x-ledgerline-path'

/** Who is asking, found once for each request. */
export const currentActor = cache(async (): Promise<Actor | undefined> => actorFromHeaders(await headers()))

/** Who is asking; without one the browser is sent to sign in and comes back afterwards. */
export const requireActor = async (): Promise<Actor> => {
  const actor = await currentActor()
  if (actor) return actor
  const path = (await headers()).get(pathHeader) ?? ''
  redirect(path === '' || path === '/today' ? '/sign-in' : `/sign-in?next=${encodeURIComponent(path)}`)
}
