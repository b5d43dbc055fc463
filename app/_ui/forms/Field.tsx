'use client'

import type { ReactNode } from 'react'
import { useForm } from './ActionForm'
import { problemsOf } from './form-state'

export interface FieldProps {
  readonly name: string
  readonly label: string
  /** What to type, in which form. */
  readonly hint?: ReactNode
  readonly optional?: boolean
  /** Shown behind the entry. */
  readonly unit?: string
  /** Takes the whole width of `.fields`. */
  readonly whole?: boolean
}

/** What an entry element needs to belong to its label, hint and problem. */
export interface EntryAttributes {
  readonly id: string
  readonly name: string
  readonly required: boolean
  readonly 'aria-invalid': true | undefined
  readonly 'aria-describedby': string | undefined
}

interface FrameProps extends FieldProps {
  /** `key` has to go onto the entry, so that it takes the value given back. */
  readonly entry: (
    attributes: EntryAttributes,
    given: readonly string[] | undefined,
    key: number,
  ) => ReactNode
}

/** Label, hint, entry, unit, problem. Use `TextField`, `NumberField`, `SelectField` … rather than this. */
export function FieldFrame({ name, label, hint, optional = false, unit, whole, entry }: FrameProps) {
  const { state } = useForm()
  const problems = problemsOf(state, name)
  const id = `field-${name}`
  const described = [hint ? `${id}-hint` : '', problems.length > 0 ? `${id}-problem` : ''].filter(Boolean)
  const attributes: EntryAttributes = {
    id,
    name,
    required: !optional,
    'aria-invalid': problems.length > 0 ? true : undefined,
    'aria-describedby': described.length > 0 ? described.join(' ') : undefined,
  }
  return (
    <div className={whole ? 'field whole' : 'field'}>
      <label htmlFor={id}>
        {label}
        {optional ? <span className="optional"> optional</span> : null}
      </label>
      {hint ? (
        <span className="hint" id={`${id}-hint`}>
          {hint}
        </span>
      ) : null}
      <span className="control">
        {entry(attributes, state.values[name], state.stamp)}
        {unit ? <span className="unit">{unit}</span> : null}
      </span>
      {problems.length > 0 ? (
        <span className="problem" id={`${id}-problem`}>
          {problems.map(({ message, mend }) => `${message} ${mend ?? ''}`.trim()).join(' ')}
        </span>
      ) : null}
    </div>
  )
}
