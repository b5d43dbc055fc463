import 'server-only'
import { cookies } from 'next/headers'
import { redirect } from 'next/navigation'
import type { ReactNode } from 'react'
import { requireActor } from '@/app/_session'
import { signOutAction } from '@/app/sign-in/actions'
import { getRail } from '@/lib/services/get-rail'
import { Rail } from './Rail'
import { roomsFor } from './rooms'
import { themeCookie, themeOf } from './theme'

/**
 * The frame of every room. Each room folder has its own `layout.tsx` that hands this on, so that the rail, with
 * its counts and rights, is made anew whenever another room is entered.
 */
export async function RoomLayout({ children }: { readonly children: ReactNode }) {
  const actor = await requireActor()
  const rail = await getRail(actor)
  if (rail === undefined) redirect('/set-up/works')
  const theme = themeOf((await cookies()).get(themeCookie)?.value)
  return (
    <div className="shell">
      <a className="skip" href="#main">
        Skip to the page
      </a>
      <Rail
        rooms={roomsFor(actor, rail.waiting)}
        person={actor.name}
        roles={actor.roles.join(', ') || 'no role yet'}
        works={rail.worksName}
        theme={theme}
        signOut={signOutAction}
      />
      <main className="page" id="main" tabIndex={-1}>
        {children}
      </main>
    </div>
  )
}
