import { type CharacteristicId, characteristicIds } from '@/lib/domain/metrology/characteristics'
import { MODEL_VERSION } from '@/lib/domain/metrology/model-version'
import type { LotSummaryBody } from '@/lib/domain/quality/lot-summary'
import type { ChartedStatistic, ChartHistory, ChartPoint } from '@/lib/domain/record/chart-history'
import { chartValue } from '@/lib/domain/record/chart-value'
import { targetOf } from '@/lib/domain/record/target-of'
import type { LotWriteState, MachineSignals } from '@/lib/domain/record/write-state'
import type { Tx } from './database'
import { engineOf } from './guarded-client'
import { frozenLimitsOf, type LimitSetRow, listLimitSets } from './limit-sets'
import { listMachineSignals, listProductSignals, type SignalRow, storedSignalOf } from './signals'
import { listSpecificationBodies } from './specifications'

export const isCharacteristic = (text: string): text is CharacteristicId =>
  (characteristicIds as readonly string[]).includes(text)

export const statisticOf = (text: string): ChartedStatistic =>
  text === 'within-lot-sd' ? 'within-lot-sd' : 'mean'

/** The charts of a product that have limit sets, with everything the rules rest on. */
export async function loadChartHistories(tx: Tx, productId: number): Promise<readonly ChartHistory[]> {
  const sets = await listLimitSets(tx, productId)
  if (sets.length === 0) return []
  const summaries = await listChartedSummaries(tx, productId, [
    ...new Set(sets.map((one) => one.characteristic)),
  ])
  const evaluatedAt = await lastEvaluations(tx, productId)
  const signals = await listProductSignals(tx, productId)
  const bodies = await listSpecificationBodies(tx, productId)
  return groupByChart(sets).flatMap(({ characteristic, statistic, limitSets }): ChartHistory[] => {
    if (!isCharacteristic(characteristic)) return []
    const points = summaries
      .filter((one) => one.characteristic === characteristic)
      .flatMap((one): ChartPoint[] => {
        const value = chartValue(statistic, one)
        if (value === undefined) return []
        const body = bodies.get(one.specificationRevisionId)
        const target = body && targetOf(body, characteristic, statistic)
        return [
          {
            lotId: one.lotId,
            code: one.code,
            madeAt: one.madeAt,
            value,
            ...(target === undefined ? {} : { target }),
            ...(one.machineId === undefined ? {} : { machineId: one.machineId }),
            evaluatedAt: evaluatedAt.get(one.lotId) ?? 0,
          },
        ]
      })
    return [
      {
        characteristic,
        statistic,
        points,
        limitSets: limitSets.map(frozenLimitsOf),
        signals: signals
          .filter((one) => one.characteristic === characteristic && one.statistic === statistic)
          .map(storedSignalOf),
      },
    ]
  })
}

/**
 * Charts of everything a machine makes but one product, and the signals of the machine’s own charts: what the
 * rules over products rest on.
 */
export async function loadMachineCharts(
  tx: Tx,
  machineId: number,
  butProductId?: number,
): Promise<NonNullable<LotWriteState['machine']>> {
  const made = await tx.lot.groupBy({
    by: ['productId'],
    where: { machineId, ...(butProductId === undefined ? {} : { productId: { not: butProductId } }) },
    orderBy: { productId: 'asc' },
  })
  const products = []
  for (const { productId } of made)
    products.push({ productId, charts: await loadChartHistories(tx, productId) })
  return { id: machineId, products, signals: signalsByChart(await listMachineSignals(tx, machineId)) }
}

function signalsByChart(rows: readonly SignalRow[]): readonly MachineSignals[] {
  const charts = new Map<string, SignalRow[]>()
  for (const row of rows) {
    const key = `${row.characteristic} ${row.statistic}`
    charts.set(key, [...(charts.get(key) ?? []), row])
  }
  return [...charts.values()].flatMap((signals): MachineSignals[] => {
    const [first] = signals
    return first && isCharacteristic(first.characteristic)
      ? [
          {
            characteristic: first.characteristic,
            statistic: statisticOf(first.statistic),
            signals: signals.map(storedSignalOf),
          },
        ]
      : []
  })
}

function groupByChart(sets: readonly LimitSetRow[]) {
  const charts = new Map<
    string,
    { characteristic: string; statistic: ChartedStatistic; limitSets: LimitSetRow[] }
  >()
  for (const set of sets) {
    const key = `${set.characteristic} ${set.statistic}`
    const chart = charts.get(key) ?? {
      characteristic: set.characteristic,
      statistic: statisticOf(set.statistic),
      limitSets: [],
    }
    chart.limitSets.push(set)
    charts.set(key, chart)
  }
  return [...charts.values()]
}

export interface ChartedSummary extends LotSummaryBody {
  readonly lotId: number
  readonly code: string
  readonly madeAt: number
  readonly characteristic: string
  readonly machineId: number | undefined
  readonly specificationRevisionId: number
}

/** Summaries of the charted lots of a product: those whose plan was complete once. In chart order. */
export const listChartedSummaries = async (
  tx: Tx,
  productId: number,
  characteristicNames: readonly string[],
): Promise<readonly ChartedSummary[]> =>
  (
    await tx.lotSummary.findMany({
      where: {
        productId,
        characteristic: { in: [...characteristicNames] },
        modelVersion: MODEL_VERSION,
        lot: { state: { not: 'measuring' } },
      },
      orderBy: [{ madeAt: 'asc' }, { lot: { code: 'asc' } }],
      select: {
        lotId: true,
        characteristic: true,
        n: true,
        mean: true,
        m2: true,
        min: true,
        max: true,
        uCommon: true,
        uMean: true,
        madeAt: true,
        machineId: true,
        lot: { select: { code: true, specificationRevisionId: true } },
      },
    })
  ).map(({ lot, machineId, madeAt, ...row }) => ({
    ...row,
    ...lot,
    madeAt: madeAt.getTime(),
    machineId: machineId ?? undefined,
  }))

/** When the newest evaluation in force of each lot was made, epoch milliseconds, by lot. */
async function lastEvaluations(tx: Tx, productId: number): Promise<ReadonlyMap<number, number>> {
  // Instants come out as numbers on both engines, so that no time zone comes in.
  const at =
    engineOf(tx) === 'sqlite'
      ? 'MAX(e."at")'
      : 'CAST(EXTRACT(EPOCH FROM MAX(e."at")) * 1000 AS DOUBLE PRECISION)'
  const place = engineOf(tx) === 'sqlite' ? '?' : '$1'
  const rows = await tx.$queryRawUnsafe<{ lotId: number | bigint; at: number | bigint }[]>(
    `SELECT s."lotId" AS "lotId", ${at} AS "at"
     FROM "Specimen" s
     JOIN "Evaluation" e ON e."id" = s."currentEvaluationId"
     JOIN "Lot" l ON l."id" = s."lotId"
     WHERE l."productId" = ${place}
     GROUP BY s."lotId"`,
    productId,
  )
  return new Map(rows.map((row) => [Number(row.lotId), Number(row.at)]))
}
