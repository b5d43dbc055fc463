import { z } from 'zod'
import { characteristicIds } from '@/lib/domain/metrology/characteristics'
import { chartedStatistics } from '@/lib/domain/record/chart-history'
import { instant } from './instant'
import { codeText, paragraphs } from './plain-text'

const leftOut = z.strictObject({
  lotCode: codeText('Lot'),
  reason: paragraphs('Reason', { min: 3, max: 500 }),
})

const baseline = {
  productCode: codeText('Product'),
  characteristic: z.enum(characteristicIds),
  statistic: z.enum(chartedStatistics),
  /** First and last lot of the baseline in chart order, both included; without them all lots there are. */
  firstLotCode: codeText('First lot').optional(),
  lastLotCode: codeText('Last lot').optional(),
  leftOut: z.array(leftOut).max(500).default([]),
  /** Neighbouring lots are alike by nature; without it the lots themselves say so. */
  alike: z.boolean().optional(),
}

export const proposeLimitsSchema = z.strictObject(baseline)

export const freezeLimitsSchema = z.strictObject({
  ...baseline,
  /** From which lot on, by the time it was made; without it the first limit set holds from its first lot on,
   * a later one from the first lot made after its baseline. */
  effectiveFrom: instant('In force from').optional(),
  reason: paragraphs('Reason', { min: 0, max: 1000 }).default(''),
  /** Number of the limit set in force that was on the screen, 0 for none. */
  supersedes: z.int().min(0),
})

export type ProposeLimitsInput = z.output<typeof proposeLimitsSchema>
export type FreezeLimitsInput = z.output<typeof freezeLimitsSchema>
