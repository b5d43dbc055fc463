import { type LotSummaryBody, sampleStandardDeviationOf } from '../quality/lot-summary'
import type { ChartedStatistic } from './chart-history'

/** What a chart shows of a lot: undefined where there is too little (a spread of one specimen). */
export const chartValue = (
  statistic: ChartedStatistic,
  summary: LotSummaryBody | undefined,
): number | undefined =>
  summary === undefined ? undefined : statistic === 'mean' ? summary.mean : sampleStandardDeviationOf(summary)
