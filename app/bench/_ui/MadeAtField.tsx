'use client'

import { FieldFrame } from '@/app/_ui/forms/Field'

/** Date and time in the works' own time. */
export function MadeAtField({ now }: { readonly now: string }) {
  return (
    <FieldFrame
      name="madeAt"
      label="Made"
      hint="Date and time at the works"
      entry={(attributes, given, key) => (
        <input
          key={key}
          {...attributes}
          className="input"
          type="datetime-local"
          defaultValue={given?.[0] ?? now}
        />
      )}
    />
  )
}
