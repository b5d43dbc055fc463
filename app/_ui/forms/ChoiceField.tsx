'use client'

import { useForm } from './ActionForm'
import { problemsOf } from './form-state'

export interface Choice {
  readonly value: string
  readonly label: string
  readonly note?: string
}

interface ChoiceFieldProps {
  readonly name: string
  readonly legend: string
  readonly choices: readonly Choice[]
  /** Values chosen at first. */
  readonly chosen?: readonly string[]
  /** One of them, or any number of them. */
  readonly several?: boolean
}

/** Radio buttons, or with `several` check boxes, under one legend. */
export function ChoiceField({ name, legend, choices, chosen = [], several = false }: ChoiceFieldProps) {
  const { state } = useForm()
  const problems = problemsOf(state, name)
  const given = state.status === 'fresh' ? chosen : (state.values[name] ?? [])
  return (
    <fieldset
      className="field whole"
      id={`field-${name}`}
      aria-describedby={problems.length > 0 ? `field-${name}-problem` : undefined}
    >
      <legend className="label">{legend}</legend>
      {choices.map(({ value, label, note }) => (
        <label className="choice" key={`${value} ${state.stamp}`}>
          <input
            type={several ? 'checkbox' : 'radio'}
            name={name}
            value={value}
            defaultChecked={given.includes(value)}
          />
          <span>
            {label}
            {note ? <small>{note}</small> : null}
          </span>
        </label>
      ))}
      {problems.length > 0 ? (
        <span className="problem" id={`field-${name}-problem`}>
          {problems.map(({ message, mend }) => `${message} ${mend ?? ''}`.trim()).join(' ')}
        </span>
      ) : null}
    </fieldset>
  )
}

interface CheckFieldProps {
  readonly name: string
  readonly label: string
  readonly note?: string
  readonly checked?: boolean
}

/** One yes or no; sends `yes` when ticked, nothing when not. */
export function CheckField({ name, label, note, checked = false }: CheckFieldProps) {
  const { state } = useForm()
  const ticked = state.status === 'fresh' ? checked : state.values[name]?.[0] === 'yes'
  return (
    <label className="choice whole" key={state.stamp}>
      <input type="checkbox" id={`field-${name}`} name={name} value="yes" defaultChecked={ticked} />
      <span>
        {label}
        {note ? <small>{note}</small> : null}
      </span>
    </label>
  )
}
