import { chiSquareTails } from '../statistics/chi-square'
import {
  autocorrelationBound,
  lagOneAutocorrelation,
  vonNeumannRatio,
} from '../statistics/lag-one-autocorrelation'
import { meanInterval, standardDeviationInterval } from '../statistics/mean-interval'
import { median } from '../statistics/median'
import { medianAbsoluteDeviation } from '../statistics/median-absolute-deviation'
import { sampleQuantile } from '../statistics/quantile'
import { sampleStandardDeviation } from '../statistics/sample-standard-deviation'
import {
  momentExcessKurtosis,
  momentSkewness,
  sampleExcessKurtosis,
  sampleSkewness,
} from '../statistics/shape'
import { summarise } from '../statistics/summary'
import { numbersOf, type QuantityTable } from './inputs'

/** Probabilities of the quantiles that the cases ask for. */
const PROBABILITIES = [0.00135, 0.01, 0.05, 0.1, 0.25, 0.5, 0.75, 0.9, 0.95, 0.99, 0.99865]

export const summaryQuantities: QuantityTable = {
  descriptive: (inputs) => {
    const x = numbersOf(inputs, 'x')
    const summary = summarise(x)
    const sd = sampleStandardDeviation(x)
    return {
      ...summary,
      sd,
      lag1: lagOneAutocorrelation(x),
      median: median(x),
      mad_raw: medianAbsoluteDeviation(x),
      range: summary && summary.max - summary.min,
      se_mean: sd === undefined ? undefined : sd / Math.sqrt(x.length),
      mean_ci95: summary && meanInterval(summary, 0.95),
      sd_ci95: summary && standardDeviationInterval(summary, 0.95),
      skewness_g1: momentSkewness(x),
      skewness_G1: sampleSkewness(x),
      excess_kurtosis_g2: momentExcessKurtosis(x),
      excess_kurtosis_G2: sampleExcessKurtosis(x),
      quantile_probs: PROBABILITIES,
      quantiles_type6: PROBABILITIES.map((p) => sampleQuantile(x, p, 6)),
      quantiles_type7: PROBABILITIES.map((p) => sampleQuantile(x, p, 7)),
      quantiles_type8: PROBABILITIES.map((p) => sampleQuantile(x, p, 8)),
    }
  },
  autocorrelation: (inputs) => {
    const y = numbersOf(inputs, 'y')
    const n = y.length
    const r1 = lagOneAutocorrelation(y)
    if (r1 === undefined) return {}
    const ljungBox = (n * (n + 2) * r1 * r1) / (n - 1)
    return {
      r1,
      bound_95: autocorrelationBound(n),
      significant_bartlett: Math.abs(r1) > autocorrelationBound(n),
      z_mean_corrected: (r1 + 1 / n) * Math.sqrt(n),
      ljung_box_Q1: ljungBox,
      ljung_box_p: chiSquareTails(ljungBox, 1).upper,
      von_neumann_ratio: vonNeumannRatio(y),
    }
  },
}
