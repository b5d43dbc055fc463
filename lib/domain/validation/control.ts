import { chartConstants } from '../control/chart-constants'
import { individualsLimits } from '../control/individuals-chart'
import { type ControlLimits, subgroupCharts, unequalSubgroupCharts } from '../control/mean-charts'
import { median } from '../statistics/median'
import { normalQuantile } from '../statistics/normal-quantile'
import { sampleStandardDeviation } from '../statistics/sample-standard-deviation'
import { type Inputs, listOf, numberOf, numbersOf, type QuantityTable } from './inputs'

const subgroupsOf = (inputs: Inputs): readonly (readonly number[])[] =>
  listOf(inputs, 'subgroups').map((_, index, all) => numbersOf({ one: all[index] }, 'one'))

/** Places strictly outside, counted from one. */
const outside = (values: readonly number[], { lower, upper }: ControlLimits): readonly number[] =>
  values.flatMap((value, index) => (value > upper || value < lower ? [index + 1] : []))

const shown = ({ centre, lower, upper }: ControlLimits) => ({ center: centre, ucl: upper, lcl: lower })

export const controlQuantities: QuantityTable = {
  'chart-constants': (inputs) => ({ ...chartConstants(numberOf(inputs, 'n')) }),
  'individuals-chart': (inputs) => {
    const x = numbersOf(inputs, 'x')
    const limits = individualsLimits(x)
    if (!limits) return {}
    const ranges = x.slice(1).map((value, index) => Math.abs(value - (x[index] ?? Number.NaN)))
    const { D3, D4 } = chartConstants(2)
    const spread = {
      centre: limits.meanMovingRange,
      lower: D3 * limits.meanMovingRange,
      upper: D4 * limits.meanMovingRange,
    }
    const medianRange = median(ranges) ?? Number.NaN
    return {
      center: limits.centre,
      mr: ranges,
      mrbar: limits.meanMovingRange,
      sigma_mr: limits.sigma,
      ucl: limits.upper,
      lcl: limits.lower,
      mr_ucl: spread.upper,
      mr_lcl: spread.lower,
      mr_median: medianRange,
      sigma_mr_median: medianRange / (Math.SQRT2 * normalQuantile(0.75)),
      sigma_msd: Math.sqrt(ranges.reduce((sum, one) => sum + one * one, 0) / ranges.length / 2),
      sd: sampleStandardDeviation(x),
      out_x: outside(x, limits),
      // The later of the two lots of a range is the one that is meant.
      out_mr: outside(ranges, spread).map((place) => place + 1),
    }
  },
  'mean-charts': (inputs) => {
    const charts = subgroupCharts(subgroupsOf(inputs))
    if (!charts) return {}
    const { byRange, bySd, means, ranges, standardDeviations } = charts
    return {
      subgroup_mean: means,
      subgroup_range: ranges,
      subgroup_sd: standardDeviations,
      xbar_R: { ...shown(byRange.mean), sigma_hat: byRange.sigma },
      R_chart: shown(byRange.spread),
      xbar_S: { ...shown(bySd.mean), sigma_hat: bySd.sigma },
      S_chart: shown(bySd.spread),
      sigma_pooled: charts.pooled,
      sigma_pooled_unbiased: charts.pooledUnbiased,
      out_xbar_R: outside(means, byRange.mean),
      out_R: outside(ranges, byRange.spread),
      out_xbar_S: outside(means, bySd.mean),
      out_S: outside(standardDeviations, bySd.spread),
    }
  },
  'mean-charts-printed': (inputs) => {
    const charts = subgroupCharts(subgroupsOf(inputs))
    return (
      (charts && {
        grand_mean: charts.byRange.mean.centre,
        rbar: charts.byRange.spread.centre,
        xbar_ucl: charts.byRange.mean.upper,
        xbar_lcl: charts.byRange.mean.lower,
        r_ucl: charts.byRange.spread.upper,
      }) ??
      {}
    )
  },
  'mean-charts-unequal': (inputs) => {
    const subgroups = subgroupsOf(inputs)
    const charts = unequalSubgroupCharts(subgroups)
    if (!charts) return {}
    const { centre, limits, pooled } = charts
    const plain = subgroups.map((one) => (3 * pooled) / Math.sqrt(one.length))
    return {
      grand_mean: centre,
      s_pooled: pooled,
      xbar_ucl: limits.map(({ mean }) => mean.upper),
      xbar_lcl: limits.map(({ mean }) => mean.lower),
      s_ucl: limits.map(({ spread }) => spread.upper),
      s_lcl: limits.map(({ spread }) => spread.lower),
      // The same with the pooled standard deviation taken for σ itself; the charts use the former.
      alt_sigma_unbiased_limits: {
        ucl: plain.map((half) => centre + half),
        lcl: plain.map((half) => centre - half),
      },
    }
  },
}
