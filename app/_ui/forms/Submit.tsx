'use client'

import type { ReactNode } from 'react'
import { useForm } from './ActionForm'

interface SubmitProps {
  readonly children: ReactNode
  readonly tone?: 'primary' | 'alarm' | 'plain'
  readonly wide?: boolean
  /** Sent with the form, where several buttons do different things. */
  readonly name?: string
  readonly value?: string
}

/** Sends the form; while it is under way a second press does nothing. */
export function Submit({ children, tone = 'primary', wide = false, name, value }: SubmitProps) {
  const { pending } = useForm()
  const classes = ['button', tone === 'plain' ? '' : tone, wide ? 'wide' : ''].filter(Boolean)
  return (
    <button
      type="submit"
      className={classes.join(' ')}
      name={name}
      value={value}
      aria-disabled={pending || undefined}
      onClick={(event) => {
        if (pending) event.preventDefault()
      }}
    >
      {pending ? 'One moment …' : children}
    </button>
  )
}
