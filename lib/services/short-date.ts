/** `13 Oct`, the day in the works' time zone: what stands on charts beside a year that is said elsewhere. */
export const shortDate = (instant: number, timeZone: string): string =>
  new Intl.DateTimeFormat('en-GB', { day: 'numeric', month: 'short', timeZone }).format(instant)

/** `Oct 2026`, the month in the works' time zone. */
export const monthAndYear = (instant: number, timeZone: string): string =>
  new Intl.DateTimeFormat('en-GB', { month: 'short', year: 'numeric', timeZone }).format(instant)
