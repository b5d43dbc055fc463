import type { Actor } from '@/lib/access/actor'
import { hertz, metres } from '@/lib/domain/units/quantity'
import { publishDatasheet } from '@/lib/services/publish-datasheet'
import { productOf } from './products'

/** A lot off the worn die that one customer takes, knowing what it is. */
export const CONCESSION = {
  lot: 'LA-146',
  reason:
    'Concession for Brackwater Lutherie: 600 m of this lot, until 26 February 2027. Heavier than its target by what the die has worn; told with its tension and accepted in writing.',
  answer: 'Told to the customer with its number.',
} as const

/** Tension tables that sales publishes, each on the evening of a working day. */
export const demoDatasheets: readonly {
  readonly day: number
  readonly productCode: string
  readonly revision: number
  /** Semitones about the reference note. */
  readonly around: number
  readonly lengths: readonly number[]
}[] = [
  { day: 148, productCode: 'LARCH-254', revision: 1, around: 3, lengths: [0.61, 0.628, 0.648] },
  { day: 226, productCode: 'ROWAN-1060', revision: 1, around: 3, lengths: [0.628, 0.648] },
  { day: 262, productCode: 'ALDER-820', revision: 1, around: 2, lengths: [0.63, 0.65] },
  { day: 293, productCode: 'LARCH-254', revision: 2, around: 3, lengths: [0.61, 0.628, 0.648] },
  { day: 294, productCode: 'YEW-1400', revision: 1, around: 2, lengths: [0.762, 0.8636] },
]

/** Publishes one of them from the lots that are released by then. */
export async function publishDemoDatasheet(
  sales: Actor,
  { around, lengths, productCode, revision }: (typeof demoDatasheets)[number],
  at: number,
): Promise<void> {
  const { basis, reference } = productOf(productCode).specification
  await publishDatasheet(
    sales,
    {
      productCode,
      notes: Array.from({ length: 2 * around + 1 }, (_, step) => reference.midi - around + step),
      lengths: lengths.map((one) => metres(one)),
      a4: hertz(440),
      basis,
      forceUnit: 'N',
      supersedes: revision - 1,
    },
    at,
  )
}
