import { TZDate } from '@date-fns/tz'

/** The calendar month in which an instant lies in a time zone: `2026-11`. */
export const monthOf = (at: number, timeZone: string): string => {
  const date = new TZDate(at, timeZone)
  return `${date.getFullYear()}-${String(date.getMonth() + 1).padStart(2, '0')}`
}
