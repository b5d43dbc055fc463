import { loadChartHistories } from '@/lib/data/chart-histories'
import type { Tx } from '@/lib/data/database'
import { storeSignals } from '@/lib/data/signals'
import { chartDepartures } from '@/lib/domain/record/chart-departures'
import type { ChartHistory } from '@/lib/domain/record/chart-history'
import { reconcileSignals } from '@/lib/domain/record/reconcile-signals'

export interface RulesAsked {
  readonly raised: number
  readonly changed: number
  /** Of the changed ones: no longer found. */
  readonly gone: number
}

/**
 * Asks the rules again on the charts of a product, or on some of them, and stores what has become of its signals.
 * Call it with the product's row locked.
 */
export async function askRules(
  tx: Tx,
  productId: number,
  only: (chart: ChartHistory) => boolean = () => true,
): Promise<RulesAsked> {
  const charts = (await loadChartHistories(tx, productId)).filter(only).map((chart) => ({
    productId,
    characteristic: chart.characteristic,
    statistic: chart.statistic,
    ...reconcileSignals(chartDepartures(chart), chart.signals),
  }))
  await storeSignals(tx, charts)
  const changed = charts.flatMap((chart) => chart.changed)
  return {
    raised: charts.reduce((sum, chart) => sum + chart.raised.length, 0),
    changed: changed.length,
    gone: changed.filter((one) => one.state === 'no-longer-holds').length,
  }
}
