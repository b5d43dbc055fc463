'use client'

import { useState } from 'react'
import type { DraftValue } from './draft-store'

interface SetUpField {
  readonly id: string
  readonly label: string
  readonly unit: string
  readonly shown: string
}

interface Props {
  readonly fields: readonly SetUpField[]
  readonly onSet: (field: string, text: string) => string | undefined
  readonly values: Readonly<Record<string, DraftValue>>
}

/** What is the same for all specimens is typed once: cut length, span, temperature. */
export function SetUpBar({ fields, onSet }: Props) {
  const [texts, setTexts] = useState<Readonly<Record<string, string>>>({})
  const [problems, setProblems] = useState<Readonly<Record<string, string>>>({})

  const take = (field: SetUpField) => {
    const text = texts[field.id]
    if (text === undefined || text === field.shown) return
    const problem = onSet(field.id, text)
    setProblems(({ [field.id]: _, ...rest }) => (problem ? { ...rest, [field.id]: problem } : rest))
    if (!problem) setTexts(({ [field.id]: _, ...rest }) => rest)
  }

  return (
    <fieldset className="bench-setup">
      <legend className="visually-hidden">Set-up, the same for all specimens</legend>
      {fields.map((field) => (
        <label key={field.id} htmlFor={`setup-${field.id}`}>
          <span>
            {field.label} <span className="unit">{field.unit}</span>
          </span>
          <input
            id={`setup-${field.id}`}
            className="input"
            inputMode="decimal"
            autoComplete="off"
            value={texts[field.id] ?? field.shown}
            aria-invalid={problems[field.id] ? true : undefined}
            aria-describedby={problems[field.id] ? `setup-${field.id}-problem` : undefined}
            onChange={(event) => setTexts({ ...texts, [field.id]: event.target.value })}
            onBlur={() => take(field)}
            onKeyDown={(event) => {
              if (event.key === 'Enter') {
                event.preventDefault()
                take(field)
              }
            }}
          />
          {problems[field.id] ? (
            <span className="problem" id={`setup-${field.id}-problem`} role="alert">
              {problems[field.id]}
            </span>
          ) : null}
        </label>
      ))}
    </fieldset>
  )
}
