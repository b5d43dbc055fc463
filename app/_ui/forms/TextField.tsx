'use client'

import type { HTMLInputAutoCompleteAttribute } from 'react'
import { FieldFrame, type FieldProps } from './Field'

interface TextFieldProps extends FieldProps {
  readonly value?: string
  readonly type?: 'text' | 'password' | 'date' | 'search'
  readonly autoComplete?: HTMLInputAutoCompleteAttribute
  readonly maxLength?: number
  /** For codes: no capitals by themselves, no spelling. */
  readonly plain?: boolean
  readonly readOnly?: boolean
}

export function TextField({
  value,
  type = 'text',
  autoComplete = 'off',
  maxLength,
  plain = false,
  readOnly,
  ...field
}: TextFieldProps) {
  return (
    <FieldFrame
      {...field}
      entry={(attributes, given, key) => (
        <input
          key={key}
          {...attributes}
          className="input"
          type={type}
          defaultValue={type === 'password' ? undefined : (given?.[0] ?? value)}
          autoComplete={autoComplete}
          maxLength={maxLength}
          readOnly={readOnly}
          {...(plain ? { autoCapitalize: 'none', autoCorrect: 'off', spellCheck: false } : {})}
        />
      )}
    />
  )
}

/** A measured number: native text entry with the numeric keypad; comma and point both count, a unit may follow. */
export function NumberField({ value, ...field }: FieldProps & { readonly value?: string }) {
  return (
    <FieldFrame
      {...field}
      entry={(attributes, given, key) => (
        <input
          key={key}
          {...attributes}
          className="input number"
          inputMode="decimal"
          defaultValue={given?.[0] ?? value}
          autoComplete="off"
          spellCheck={false}
        />
      )}
    />
  )
}

export function TextAreaField({
  value,
  maxLength,
  ...field
}: FieldProps & { readonly value?: string; readonly maxLength?: number }) {
  return (
    <FieldFrame
      {...field}
      entry={(attributes, given, key) => (
        <textarea
          key={key}
          {...attributes}
          className="input"
          defaultValue={given?.[0] ?? value}
          maxLength={maxLength}
        />
      )}
    />
  )
}
