import type { LimitSetRow } from '@/lib/data/limit-sets'
import type { CharacteristicId } from '@/lib/domain/metrology/characteristics'
import type { ChartedStatistic } from '@/lib/domain/record/chart-history'

/** A limit set as a person reads it; values SI, instants epoch milliseconds. */
export interface LimitSetView {
  readonly id: number
  readonly characteristic: CharacteristicId
  readonly statistic: ChartedStatistic
  readonly number: number
  readonly centre: number
  readonly sigma: number
  readonly lower: number | undefined
  readonly upper: number | undefined
  readonly sigmaEstimator: string
  readonly lotCount: number
  readonly provisional: boolean
  /** Rules that are asked of it; undefined for all. */
  readonly rules: LimitSetRow['rules']
  readonly firstLotCode: string | undefined
  readonly lastLotCode: string | undefined
  readonly leftOut: readonly { readonly lotCode: string; readonly reason: string }[]
  readonly effectiveFrom: number
  readonly frozenAt: number
  readonly frozenBy: string | undefined
  readonly reason: string
  readonly supersededAt: number | undefined
}

export const limitSetView = (
  row: LimitSetRow,
  chart: { readonly characteristic: CharacteristicId; readonly statistic: ChartedStatistic },
  names: ReadonlyMap<number, string>,
): LimitSetView => ({
  id: row.id,
  characteristic: chart.characteristic,
  statistic: chart.statistic,
  number: row.number,
  centre: row.centre,
  sigma: row.sigma,
  lower: row.lower,
  upper: row.upper,
  sigmaEstimator: row.sigmaEstimator,
  lotCount: row.lotCount,
  provisional: row.provisional,
  rules: row.rules,
  firstLotCode: row.baseline.lots[0]?.code,
  lastLotCode: row.baseline.lots.at(-1)?.code,
  leftOut: row.baseline.leftOut.map(({ code, reason }) => ({ lotCode: code, reason })),
  effectiveFrom: row.effectiveFrom,
  frozenAt: row.frozenAt,
  frozenBy: row.frozenById === undefined ? undefined : names.get(row.frozenById),
  reason: row.reason,
  supersededAt: row.supersededAt,
})
