'use client'

import { FieldFrame, type FieldProps } from './Field'

export interface Option {
  readonly value: string
  readonly label: string
}

interface SelectFieldProps extends FieldProps {
  readonly options: readonly Option[]
  readonly value?: string
  /** First line that stands for nothing chosen. */
  readonly none?: string
}

export function SelectField({ options, value, none, ...field }: SelectFieldProps) {
  return (
    <FieldFrame
      {...field}
      entry={(attributes, given, key) => (
        <select key={key} {...attributes} className="input" defaultValue={given?.[0] ?? value ?? ''}>
          {none === undefined ? null : <option value="">{none}</option>}
          {options.map((option) => (
            <option key={option.value} value={option.value}>
              {option.label}
            </option>
          ))}
        </select>
      )}
    />
  )
}
