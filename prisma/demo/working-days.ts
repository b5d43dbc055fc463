/** Working days of the demo, ending on the last one, a Friday; times are UTC. */
export const WORKING_DAYS = 300
const LAST_DAY = Date.UTC(2026, 10, 27)
const DAY = 86_400_000

/** Start of working day 0 … 299: Mondays to Fridays, counted back from the last. */
export function workingDay(index: number): number {
  const back = WORKING_DAYS - 1 - index
  return LAST_DAY - (Math.floor(back / 5) * 7 + (back % 5)) * DAY
}

/** The working day that a lot of a product is made on: spread evenly over all of them. */
export const dayOfLot = (index: number, place: number, lots: number): number =>
  Math.min(WORKING_DAYS - 1, Math.floor(((index + 0.35 + place * 0.15) / lots) * WORKING_DAYS))
