import { type ControlRule, controlRules } from '@/lib/domain/control/find-signals'
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
  /** What the specification asked for when the baseline was made, SI. */
  readonly target: number | undefined
  /** Rules that are asked; undefined for all. */
  readonly rules: readonly ControlRule[] | undefined
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
  target: true,
  rules: true,
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
  ).map(
    ({
      lower,
      upper,
      target,
      rules,
      baseline,
      effectiveFrom,
      frozenAt,
      frozenById,
      supersededAt,
      ...row
    }) => ({
      ...row,
      lower: lower ?? undefined,
      upper: upper ?? undefined,
      target: target ?? undefined,
      rules: rules === null ? undefined : rulesOf(rules),
      // Only our own canonical JSON is ever written there.
      baseline: JSON.parse(baseline) as LimitBaseline,
      effectiveFrom: effectiveFrom.getTime(),
      frozenAt: frozenAt.getTime(),
      frozenById: frozenById ?? undefined,
      supersededAt: supersededAt?.getTime(),
    }),
  )

/** Rules as they stand in the table, names divided by spaces. */
const rulesOf = (text: string): readonly ControlRule[] =>
  (Object.keys(controlRules) as ControlRule[]).filter((rule) => text.split(' ').includes(rule))

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
  ...(row.target === undefined ? {} : { target: row.target }),
  ...(row.rules === undefined ? {} : { rules: row.rules }),
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
      target: set.target ?? null,
      rules: set.rules === undefined ? null : set.rules.join(' '),
      lower: set.lower ?? null,
      upper: set.upper ?? null,
      effectiveFrom: new Date(set.effectiveFrom),
      frozenAt: new Date(set.frozenAt),
    },
    select: { id: true },
  })
  return id
}
