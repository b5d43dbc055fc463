import { z } from 'zod'

/** Years that a works' ledger can hold; beyond lie only typing errors. */
const EARLIEST = Date.UTC(1900, 0, 1)
const LATEST = Date.UTC(2200, 0, 1)

/** An ISO 8601 instant with an offset, as epoch milliseconds. */
export const instant = (name: string) =>
  z.iso
    .datetime({
      offset: true,
      error: `${name} is not a date and time with an offset, such as 2026-11-25T14:20:00Z.`,
    })
    .transform((text) => Date.parse(text))
    .refine((at) => at >= EARLIEST && at < LATEST, { error: `${name} lies outside the years 1900 to 2200.` })
