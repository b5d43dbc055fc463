import { demoProducts } from './products'

/** A lot of the demo before anything of it is measured. */
export interface DemoSchedule {
  readonly code: string
  readonly productCode: string
  readonly micrometres: number
  /** From 0 within the product. */
  readonly index: number
  /** From 0, in working days since the first. */
  readonly day: number
  readonly madeAt: number
  readonly measuredAt: number
  readonly dieCode: string
  readonly maker: 'aldous' | 'imrie'
  readonly lengthMetres: number
}

/** Working days of the demo, ending on the last one, a Friday; times are UTC. */
const WORKING_DAYS = 300
const LAST_DAY = Date.UTC(2026, 10, 27)
const DAY = 86_400_000
const MINUTE = 60_000

/** Start of working day 0 … 299: Mondays to Fridays, counted back from the last. */
function workingDay(index: number): number {
  const back = WORKING_DAYS - 1 - index
  return LAST_DAY - (Math.floor(back / 5) * 7 + (back % 5)) * DAY
}

/** The die that wears, and the one that follows it on Larch 254 (lot numbers from 0). */
export const WORN_DIE = { code: 'D-07', from: 80, lots: 70, perLot: 0.05e-6 } as const
export const NEXT_DIE = 'D-08'

/** A new die on Larch 279 that draws a little wide from its first lot on: nobody has looked into it yet. */
export const WIDE_DIE = { code: 'D-279B', micrometres: 279, from: 50, wider: 1.2e-6 } as const

export function dieOf(micrometres: number, index: number): string {
  if (micrometres === WIDE_DIE.micrometres && index >= WIDE_DIE.from) return WIDE_DIE.code
  if (micrometres !== 254) return `D-${micrometres}`
  if (index < WORN_DIE.from) return 'D-06'
  return index < WORN_DIE.from + WORN_DIE.lots ? WORN_DIE.code : NEXT_DIE
}

/** Every lot of every product, in the order in which they were made. */
export function demoSchedule(): readonly DemoSchedule[] {
  return demoProducts
    .flatMap((product, place) =>
      Array.from({ length: product.lots }, (_, index): DemoSchedule => {
        const share = (index + 0.35 + place * 0.15) / product.lots
        const day = Math.min(WORKING_DAYS - 1, Math.floor(share * WORKING_DAYS))
        const madeAt = workingDay(day) + (6 * 60 + 40 + place * 95 + ((index * 37) % 60)) * MINUTE
        return {
          code: `${product.prefix}-${String(index + 1).padStart(3, '0')}`,
          productCode: product.code,
          micrometres: product.micrometres,
          index,
          day,
          madeAt,
          measuredAt: madeAt + (40 + ((index * 13) % 30)) * MINUTE,
          dieCode: dieOf(product.micrometres, index),
          maker: index % 3 === 2 ? 'imrie' : 'aldous',
          lengthMetres: 1300 + ((index * 53) % 17) * 10,
        }
      }),
    )
    .sort((a, b) => a.madeAt - b.madeAt || (a.code < b.code ? -1 : 1))
}

/** Six working days on which the zero of the micrometer stood 1.5 µm high, for everything measured with it. */
export const ZERO_WEEK = { from: 120, days: 6, error: 1.5e-6 } as const

export const inZeroWeek = (day: number): boolean =>
  day >= ZERO_WEEK.from && day < ZERO_WEEK.from + ZERO_WEEK.days
