import type { FrozenLimits } from '@/lib/domain/record/chart-history'
import type { Tx } from './database'

/** What a limit set came from. */
export interface LimitBaseline {
  readonly lots: readonly { readonly lotId: number; readonly code: string }[]
  readonly leftOut: readonly { readonly lotId: number; readonly code: string; readonly reason: string }[]
}

export interface LimitSetRow {
  readonly id: number
  readonly productId: number
  readonly characteristic: string
  readonly statistic: string
  readonly number: number
  readonly centre: number
  readonly sigma: number
  readonly lower: number | undefined
  readonly upper: number | undefined
  readonly sigmaEstimator: string
  readonly lotCount: number
  readonly provisional: boolean
  readonly baseline: LimitBaseline
  readonly effectiveFrom: number
  readonly frozenAt: number
  readonly frozenById: number | undefined
  readonly reason: string
  readonly supersededAt: number | undefined
}

const select = {
  id: true,
  productId: true,
  characteristic: true,
  statistic: true,
  number: true,
  centre: true,
  sigma: true,
  lower: true,
  upper: true,
  sigmaEstimator: true,
  lotCount: true,
  provisional: true,
  baseline: true,
  effectiveFrom: true,
  frozenAt: true,
  frozenById: true,
  reason: true,
  supersededAt: true,
} as const

/** All limit sets of a product, chart by chart, oldest first. */
export const listLimitSets = async (tx: Tx, productId: number): Promise<readonly LimitSetRow[]> =>
  (
    await tx.limitSet.findMany({
      where: { productId },
      select,
      orderBy: [{ characteristic: 'asc' }, { statistic: 'asc' }, { number: 'asc' }],
    })
  ).map(({ lower, upper, baseline, effectiveFrom, frozenAt, frozenById, supersededAt, ...row }) => ({
    ...row,
    lower: lower ?? undefined,
    upper: upper ?? undefined,
    // Only our own canonical JSON is ever written there.
    baseline: JSON.parse(baseline) as LimitBaseline,
    effectiveFrom: effectiveFrom.getTime(),
    frozenAt: frozenAt.getTime(),
    frozenById: frozenById ?? undefined,
    supersededAt: supersededAt?.getTime(),
  }))

/** A limit set as the rules need it. */
export const frozenLimitsOf = (row: LimitSetRow): FrozenLimits => ({
  id: row.id,
  number: row.number,
  centre: row.centre,
  sigma: row.sigma,
  lower: row.lower,
  upper: row.upper,
  effectiveFrom: row.effectiveFrom,
  frozenAt: row.frozenAt,
  leftOut: row.baseline.leftOut.map((lot) => lot.lotId),
})

export type NewLimitSet = Omit<LimitSetRow, 'id' | 'baseline' | 'supersededAt' | 'frozenById'> & {
  /** Canonical JSON of LimitBaseline. */
  readonly baseline: string
  readonly frozenById: number
}

/** Freezes a set; the one before it is superseded. @returns the new set's id */
export async function insertLimitSet(tx: Tx, set: NewLimitSet): Promise<number> {
  const { productId, characteristic, statistic } = set
  await tx.limitSet.updateMany({
    where: { productId, characteristic, statistic, supersededAt: null },
    data: { supersededAt: new Date(set.frozenAt) },
  })
  const { id } = await tx.limitSet.create({
    data: {
      ...set,
      lower: set.lower ?? null,
      upper: set.upper ?? null,
      effectiveFrom: new Date(set.effectiveFrom),
      frozenAt: new Date(set.frozenAt),
    },
    select: { id: true },
  })
  return id
}
