import { type ChartedSummary, listChartedSummaries } from '@/lib/data/chart-histories'
import type { Tx } from '@/lib/data/database'
import type { LimitBaseline } from '@/lib/data/limit-sets'
import { listSpecificationBodies } from '@/lib/data/specifications'
import type { BaselineLot } from '@/lib/domain/control/propose-limits'
import { problem } from '@/lib/domain/errors'
import { chartValue } from '@/lib/domain/record/chart-value'
import { targetOf } from '@/lib/domain/record/target-of'
import type { ProposeLimitsInput } from '@/lib/input/limits'

export interface ChosenLot extends BaselineLot {
  readonly madeAt: number
  /** What the specification in force for the newest of them asks for, SI: all values are moved to it. */
  readonly target: number | undefined
  /** Why it is left out; empty for lots in the baseline. */
  readonly reason: string
}

/**
 * The lots that limits are to come from, in chart order, those left out marked.
 * @throws LedgerlineError not-found for a lot that has no place on this chart
 */
export async function loadBaseline(
  tx: Tx,
  productId: number,
  input: ProposeLimitsInput,
): Promise<readonly ChosenLot[]> {
  const summaries = await listChartedSummaries(tx, productId, [input.characteristic])
  const bodies = await listSpecificationBodies(tx, productId)
  const targetOfLot = (one: ChartedSummary): number | undefined => {
    const body = bodies.get(one.specificationRevisionId)
    return body && targetOf(body, input.characteristic, input.statistic)
  }
  const charted = summaries.flatMap((one) => {
    const value = chartValue(input.statistic, one)
    return value === undefined ? [] : [{ ...one, value }]
  })
  const placeOf = (code: string, where: string): number => {
    const index = charted.findIndex((one) => one.code === code)
    if (index < 0)
      throw problem('not-found', `Lot ${code} is not on this chart.`, {
        where,
        mend: 'Choose a lot of this product whose plan is complete.',
      })
    return index
  }
  const from = input.firstLotCode === undefined ? 0 : placeOf(input.firstLotCode, 'firstLotCode')
  const to = input.lastLotCode === undefined ? charted.length - 1 : placeOf(input.lastLotCode, 'lastLotCode')
  if (from > to && charted.length > 0)
    throw problem('bad-input', 'The first lot of the baseline was made after the last one.', {
      where: 'firstLotCode',
    })
  for (const { lotCode } of input.leftOut) {
    const index = placeOf(lotCode, 'leftOut')
    if (index < from || index > to)
      throw problem('bad-input', `Lot ${lotCode} is not among the lots of the baseline.`, {
        where: 'leftOut',
      })
  }
  const reasons = new Map(input.leftOut.map((one) => [one.lotCode, one.reason]))
  const baseline = charted.slice(from, to + 1)
  const newest = baseline.at(-1)
  const target = newest && targetOfLot(newest)
  return baseline.map((one): ChosenLot => {
    const own = targetOfLot(one)
    // A baseline that spans a moved target is brought to the newest one, as its limits will be.
    const moved = target === undefined || own === undefined ? 0 : target - own
    return chosen({ ...one, value: one.value + moved }, target, reasons.get(one.code))
  })
}

const chosen = (
  { lotId, code, madeAt, n, value }: ChartedSummary & { readonly value: number },
  target: number | undefined,
  reason: string | undefined,
): ChosenLot => ({
  lotId,
  code,
  madeAt,
  n,
  value,
  target,
  leftOut: reason !== undefined,
  reason: reason ?? '',
})

export const baselineOf = (lots: readonly ChosenLot[]): LimitBaseline => ({
  lots: lots.filter((one) => !one.leftOut).map(({ lotId, code }) => ({ lotId, code })),
  leftOut: lots.filter((one) => one.leftOut).map(({ lotId, code, reason }) => ({ lotId, code, reason })),
})
