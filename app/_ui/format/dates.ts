/** An instant as the services give it: epoch milliseconds, ISO text or Date. */
export type Instant = number | string | Date

const formatter = (timeZone: string, parts: Intl.DateTimeFormatOptions) =>
  new Intl.DateTimeFormat('en-GB', { ...parts, timeZone })

/** `27 Nov 2026`, in the works' time zone. */
export const formatDate = (instant: Instant, timeZone: string): string =>
  formatter(timeZone, { day: 'numeric', month: 'short', year: 'numeric' }).format(new Date(instant))

/** `27 Nov 2026, 09:48`, in the works' time zone. */
export const formatDateTime = (instant: Instant, timeZone: string): string =>
  formatter(timeZone, {
    day: 'numeric',
    month: 'short',
    year: 'numeric',
    hour: '2-digit',
    minute: '2-digit',
    hour12: false,
  }).format(new Date(instant))

/** `Friday 27 November 2026`, in the works' time zone. */
export const formatLongDate = (instant: Instant, timeZone: string): string =>
  formatter(timeZone, { weekday: 'long', day: 'numeric', month: 'long', year: 'numeric' }).format(
    new Date(instant),
  )

/** `2026-11-27`, the calendar day in the works' time zone, for a date field. */
export const dateFieldValue = (instant: Instant, timeZone: string): string => {
  const parts = formatter(timeZone, { day: '2-digit', month: '2-digit', year: 'numeric' }).formatToParts(
    new Date(instant),
  )
  const of = (type: Intl.DateTimeFormatPartTypes) => parts.find((part) => part.type === type)?.value ?? ''
  return `${of('year')}-${of('month')}-${of('day')}`
}
