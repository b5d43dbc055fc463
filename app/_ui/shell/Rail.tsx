'use client'

import Link from 'next/link'
import { usePathname } from 'next/navigation'
import { useEffect, useState } from 'react'
import type { RoomLink } from './rooms'
import { type Theme, ThemeSwitch } from './ThemeSwitch'
import { Wordmark } from './Wordmark'

interface RailProps {
  readonly rooms: readonly (readonly RoomLink[])[]
  readonly person: string
  readonly roles: string
  readonly works: string
  readonly theme: Theme
  readonly signOut: () => Promise<void>
}

const within = (path: string, href: string): boolean => path === href || path.startsWith(`${href}/`)

/** Navigation between rooms; on a phone a bar with a menu. */
export function Rail({ rooms, person, roles, works, theme, signOut }: RailProps) {
  const path = usePathname()
  const [open, setOpen] = useState(false)
  // biome-ignore lint/correctness/useExhaustiveDependencies: the menu folds when the path changes, whatever it is
  useEffect(() => setOpen(false), [path])
  const current = rooms.flat().find(({ href }) => within(path, href))
  return (
    <header className="rail">
      <Link className="wordmark" href="/today" prefetch={false}>
        <Wordmark />
      </Link>
      <button
        type="button"
        className="menu-button"
        aria-expanded={open}
        aria-controls="rooms"
        onClick={() => setOpen(!open)}
      >
        <span className="visually-hidden">Menu, now in </span>
        {current?.label ?? 'Rooms'}
        <span aria-hidden="true">{open ? '▴' : '▾'}</span>
      </button>
      <div className="menu" id="rooms">
        <nav aria-label="Rooms">
          {rooms.map((group) => (
            <ul key={group[0]?.href}>
              {group.map(({ href, label, waiting }) => (
                <li key={href}>
                  <Link
                    href={href}
                    prefetch={false}
                    aria-current={within(path, href) ? (path === href ? 'page' : 'true') : undefined}
                  >
                    {label}
                    {waiting && waiting.count > 0 ? (
                      <span title={waiting.meaning}>
                        <span aria-hidden="true">{waiting.count}</span>
                        <span className="visually-hidden">, {waiting.meaning}</span>
                      </span>
                    ) : null}
                  </Link>
                </li>
              ))}
            </ul>
          ))}
        </nav>
        <div className="who">
          <b>{person}</b>
          {roles}
          <br />
          {works}
          <ThemeSwitch theme={theme} />
          <form action={signOut}>
            <button type="submit" className="button quiet">
              Sign out
            </button>
          </form>
        </div>
      </div>
    </header>
  )
}
