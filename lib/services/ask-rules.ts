import { loadChartHistories, loadMachineCharts } from '@/lib/data/chart-histories'
import type { Tx } from '@/lib/data/database'
import { lockRow } from '@/lib/data/locks'
import { listMachinesOf } from '@/lib/data/machines'
import { storeSignals } from '@/lib/data/signals'
import { chartDepartures } from '@/lib/domain/record/chart-departures'
import type { ChartHistory } from '@/lib/domain/record/chart-history'
import { machineDepartures } from '@/lib/domain/record/machine-departures'
import { reconcileSignals } from '@/lib/domain/record/reconcile-signals'
import type { SignalRows } from '@/lib/domain/record/write-plan'

export interface RulesAsked {
  readonly raised: number
  readonly changed: number
  /** Of the changed ones: no longer found. */
  readonly gone: number
}

type Chart = Pick<ChartHistory, 'characteristic' | 'statistic'>

/**
 * Asks the rules again on the charts of a product, or on some of them, and stores what has become of its signals.
 * Call it with the product's row locked.
 */
export async function askRules(
  tx: Tx,
  productId: number,
  only: (chart: Chart) => boolean = () => true,
): Promise<RulesAsked> {
  const charts = (await loadChartHistories(tx, productId)).filter(only)
  return store(
    tx,
    charts.map((chart) => ({
      productId,
      characteristic: chart.characteristic,
      statistic: chart.statistic,
      ...reconcileSignals(chartDepartures(chart), chart.signals),
    })),
  )
}

/** The same on the charts over products of every machine that makes this product. */
export async function askMachineRules(
  tx: Tx,
  productId: number,
  only: (chart: Chart) => boolean = () => true,
): Promise<RulesAsked> {
  let sum: RulesAsked = { raised: 0, changed: 0, gone: 0 }
  for (const machineId of await listMachinesOf(tx, productId)) {
    await lockRow(tx, 'Machine', machineId)
    const asked = await store(tx, (await machineRows(tx, machineId, productId)).filter(only))
    sum = {
      raised: sum.raised + asked.raised,
      changed: sum.changed + asked.changed,
      gone: sum.gone + asked.gone,
    }
  }
  return sum
}

async function machineRows(tx: Tx, machineId: number, productId: number): Promise<readonly SignalRows[]> {
  const { products, signals } = await loadMachineCharts(tx, machineId)
  const all = products.flatMap(({ charts, productId: id }) =>
    charts.map((chart) => ({ ...chart, productId: id })),
  )
  const keyOf = ({ characteristic, statistic }: Chart): string => `${characteristic} ${statistic}`
  const kinds = new Map([...all, ...signals].map((chart) => [keyOf(chart), chart]))
  return [...kinds].map(([key, { characteristic, statistic }]) => ({
    productId,
    machineId,
    characteristic,
    statistic,
    ...reconcileSignals(
      machineDepartures(
        machineId,
        all.filter((chart) => keyOf(chart) === key),
      ),
      signals.find((one) => keyOf(one) === key)?.signals ?? [],
    ),
  }))
}

async function store(tx: Tx, charts: readonly SignalRows[]): Promise<RulesAsked> {
  await storeSignals(tx, charts)
  const changed = charts.flatMap((chart) => chart.changed)
  return {
    raised: charts.reduce((sum, chart) => sum + chart.raised.length, 0),
    changed: changed.length,
    gone: changed.filter((one) => one.state === 'no-longer-holds').length,
  }
}
