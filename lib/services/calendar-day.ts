import { TZDate } from '@date-fns/tz'

const parts = (day: string): readonly [number, number, number] => {
  const [year = Number.NaN, month = Number.NaN, date = Number.NaN] = day.split('-').map(Number)
  return [year, month - 1, date]
}

/** The first instant of a calendar day `2026-11-27` in a time zone, epoch milliseconds. */
export const startOfDay = (day: string, timeZone: string): number => {
  const [year, month, date] = parts(day)
  return new TZDate(year, month, date, 0, 0, 0, 0, timeZone).getTime()
}

/** The last instant of a calendar day in a time zone: what is due that day is good until then. */
export const endOfDay = (day: string, timeZone: string): number => {
  const [year, month, date] = parts(day)
  return new TZDate(year, month, date + 1, 0, 0, 0, 0, timeZone).getTime() - 1
}
