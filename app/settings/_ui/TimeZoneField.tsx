'use client'

import { FieldFrame } from '@/app/_ui/forms/Field'

interface TimeZoneFieldProps {
  readonly value?: string
  /** Names of the time-zone database as the server knows them: suggested while typing. */
  readonly zones: readonly string[]
}

export function TimeZoneField({ value, zones }: TimeZoneFieldProps) {
  return (
    <FieldFrame
      name="timeZone"
      label="Time zone"
      hint="Such as Europe/Berlin: place of the clock on the wall."
      entry={(attributes, given, key) => (
        <>
          <input
            key={key}
            {...attributes}
            className="input"
            list="time-zones"
            defaultValue={given?.[0] ?? value}
            autoComplete="off"
            spellCheck={false}
          />
          <datalist id="time-zones">
            {zones.map((zone) => (
              <option key={zone} value={zone} />
            ))}
          </datalist>
        </>
      )}
    />
  )
}
