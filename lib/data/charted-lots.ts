import { MODEL_VERSION } from '@/lib/domain/metrology/model-version'
import type { LotSummaryBody } from '@/lib/domain/quality/lot-summary'
import type { Tx } from './database'

/** A lot as a chart sees it. */
export interface ChartedLotRow {
  readonly id: number
  readonly code: string
  readonly madeAt: number
  readonly setting: string
  readonly makerId: number | undefined
  readonly dieName: string | undefined
  readonly machineName: string | undefined
  readonly specificationNumber: number
  readonly summaries: readonly (LotSummaryBody & { readonly characteristic: string })[]
}

/** Charted lots of a product with their summaries, in chart order. */
export const listChartedLots = async (
  tx: Tx,
  productId: number,
  characteristicNames: readonly string[],
): Promise<readonly ChartedLotRow[]> =>
  (
    await tx.lot.findMany({
      where: { productId, state: { not: 'measuring' } },
      orderBy: [{ madeAt: 'asc' }, { code: 'asc' }],
      select: {
        id: true,
        code: true,
        madeAt: true,
        setting: true,
        makerId: true,
        die: { select: { name: true } },
        machine: { select: { name: true } },
        specificationRevision: { select: { number: true } },
        summaries: {
          where: { modelVersion: MODEL_VERSION, characteristic: { in: [...characteristicNames] } },
          select: {
            characteristic: true,
            n: true,
            mean: true,
            m2: true,
            min: true,
            max: true,
            uCommon: true,
            uMean: true,
          },
        },
      },
    })
  ).map(({ madeAt, makerId, die, machine, specificationRevision, ...row }) => ({
    ...row,
    madeAt: madeAt.getTime(),
    makerId: makerId ?? undefined,
    dieName: die?.name,
    machineName: machine?.name,
    specificationNumber: specificationRevision.number,
  }))

/** Products with how many lots are charted and how many signals are unanswered. */
export async function listDriftRows(tx: Tx) {
  const products = await tx.product.findMany({
    orderBy: [{ active: 'desc' }, { family: 'asc' }, { code: 'asc' }],
    select: { id: true, code: true, name: true, family: true, active: true },
  })
  const lots = await tx.lot.groupBy({
    by: ['productId'],
    where: { state: { not: 'measuring' } },
    _count: { _all: true },
    _max: { madeAt: true },
  })
  const signals = await tx.signal.groupBy({
    by: ['productId'],
    where: { state: 'open' },
    _count: { _all: true },
  })
  const sets = await tx.limitSet.groupBy({
    by: ['productId'],
    where: { supersededAt: null },
    _count: { _all: true },
  })
  return products.map((product) => {
    const charted = lots.find((one) => one.productId === product.id)
    return {
      ...product,
      lots: charted?._count._all ?? 0,
      lastMadeAt: charted?._max.madeAt?.getTime(),
      openSignals: signals.find((one) => one.productId === product.id)?._count._all ?? 0,
      limitSets: sets.find((one) => one.productId === product.id)?._count._all ?? 0,
    }
  })
}
