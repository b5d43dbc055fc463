'use client'

import { useState } from 'react'
import { type Theme, themeCookie } from './theme'

export type { Theme }

const year_s = 365 * 24 * 3600

/** Kept in a cookie, so that the server draws the first frame in the right colours. */
const keep = (theme: Theme) => {
  const { documentElement } = document
  if (theme === 'system') delete documentElement.dataset.theme
  else documentElement.dataset.theme = theme
  // biome-ignore lint/suspicious/noDocumentCookie: the Cookie Store is missing on plain http in a works' network
  document.cookie = `${themeCookie}=${theme}; path=/; max-age=${year_s}; samesite=lax`
}

const choices: readonly [Theme, string][] = [
  ['light', 'Light'],
  ['dark', 'Dark'],
  ['system', 'As system'],
]

export function ThemeSwitch({ theme }: { readonly theme: Theme }) {
  const [chosen, setChosen] = useState(theme)
  return (
    // biome-ignore lint/a11y/useSemanticElements: a fieldset would need a form around it
    <div className="theme" role="group" aria-label="Colours">
      {choices.map(([id, label]) => (
        <button
          key={id}
          type="button"
          aria-pressed={chosen === id}
          onClick={() => {
            setChosen(id)
            keep(id)
          }}
        >
          {label}
        </button>
      ))}
    </div>
  )
}
