import { betaTails } from '../statistics/beta-distribution'
import { chiSquareQuantile, chiSquareTails } from '../statistics/chi-square'
import { binomialTails, poissonTails } from '../statistics/counts'
import { erf } from '../statistics/erf'
import { erfc } from '../statistics/erfc'
import { fQuantile, fTails } from '../statistics/f-distribution'
import { lnGamma } from '../statistics/ln-gamma'
import { noncentralTQuantile, noncentralTTails } from '../statistics/noncentral-t'
import { normalCdf, normalUpperTail } from '../statistics/normal'
import { normalDensity } from '../statistics/normal-density'
import { normalQuantile } from '../statistics/normal-quantile'
import { relativeRangeQuantile } from '../statistics/relative-range'
import { tQuantile, tTails } from '../statistics/student-t'
import { studentizedRangeQuantile, studentizedRangeTails } from '../statistics/studentized-range'
import type { Tails } from '../statistics/tails'
import { numberOf, numbersOf, pairsOf, type QuantityTable } from './inputs'
import { degreesOf, rowsOf, zip } from './series-inputs'

/** The names of the cases for both tails. */
const both = (tails: readonly Tails[]) => ({
  cdf: tails.map(({ lower }) => lower),
  sf: tails.map(({ upper }) => upper),
})

export const distributionQuantities: QuantityTable = {
  'normal-cdf': (inputs) => {
    const x = numbersOf(inputs, 'x')
    return { cdf: x.map(normalCdf), sf: x.map(normalUpperTail), pdf: x.map(normalDensity) }
  },
  'normal-quantile': (inputs) => ({ x: numbersOf(inputs, 'p').map(normalQuantile) }),
  'chi-square-cdf': (inputs) =>
    both(zip((x = 0, df = 0) => chiSquareTails(x, df), numbersOf(inputs, 'x'), numbersOf(inputs, 'df'))),
  'chi-square-quantile': (inputs) => ({
    x: zip((p = 0, df = 0) => chiSquareQuantile(p, df), numbersOf(inputs, 'p'), numbersOf(inputs, 'df')),
  }),
  't-cdf': (inputs) =>
    both(zip((x = 0, df = 0) => tTails(x, df), numbersOf(inputs, 'x'), degreesOf(inputs, 'df'))),
  't-quantile': (inputs) => ({
    x: zip((p = 0, df = 0) => tQuantile(p, df), numbersOf(inputs, 'p'), degreesOf(inputs, 'df')),
  }),
  'f-cdf': (inputs) =>
    both(
      zip(
        (x = 0, df1 = 0, df2 = 0) => fTails(x, df1, df2),
        numbersOf(inputs, 'x'),
        numbersOf(inputs, 'df1'),
        numbersOf(inputs, 'df2'),
      ),
    ),
  'f-quantile': (inputs) => ({
    x: zip(
      (p = 0, df1 = 0, df2 = 0) => fQuantile(p, df1, df2),
      numbersOf(inputs, 'p'),
      numbersOf(inputs, 'df1'),
      numbersOf(inputs, 'df2'),
    ),
  }),
  'beta-cdf': (inputs) =>
    both(
      zip(
        (x = 0, a = 0, b = 0) => betaTails(x, a, b),
        numbersOf(inputs, 'x'),
        numbersOf(inputs, 'a'),
        numbersOf(inputs, 'b'),
      ),
    ),
  'erf-and-lgamma': (inputs) => ({
    lgamma: numbersOf(inputs, 'x_lgamma').map(lnGamma),
    erf: numbersOf(inputs, 'x_erf').map(erf),
    erfc: numbersOf(inputs, 'x_erfc').map(erfc),
  }),
  'binomial-and-poisson': (inputs) => {
    const poisson = pairsOf(inputs, 'poisson').map(([k, mean]) => poissonTails(k, mean))
    return {
      binom_cdf: rowsOf(inputs, 'binom').map(([k = 0, n = 0, p = 0]) => binomialTails(k, n, p).lower),
      poisson_cdf: poisson.map(({ lower }) => lower),
      poisson_sf_gt: poisson.map(({ upper }) => upper),
    }
  },
  'noncentral-t-cdf': (inputs) =>
    both(
      zip(
        (t = 0, df = 0, ncp = 0) => noncentralTTails(t, df, ncp),
        numbersOf(inputs, 't'),
        degreesOf(inputs, 'df'),
        numbersOf(inputs, 'ncp'),
      ),
    ),
  'noncentral-t-quantile': (inputs) => ({
    t: zip(
      (p = 0, df = 0, ncp = 0) => noncentralTQuantile(p, df, ncp),
      numbersOf(inputs, 'p'),
      degreesOf(inputs, 'df'),
      numbersOf(inputs, 'ncp'),
    ),
  }),
  'studentized-range-cdf': (inputs) =>
    both(
      zip(
        (q = 0, k = 0, df = 0) => studentizedRangeTails(q, k, df),
        numbersOf(inputs, 'q'),
        numbersOf(inputs, 'k'),
        degreesOf(inputs, 'df'),
      ),
    ),
  'studentized-range-quantile': (inputs) => ({
    q: zip(
      (p = 0, k = 0, df = 0) => studentizedRangeQuantile(p, k, df),
      numbersOf(inputs, 'p'),
      numbersOf(inputs, 'k'),
      degreesOf(inputs, 'df'),
    ),
  }),
  'relative-range-quantile': (inputs) => {
    const n = numberOf(inputs, 'n')
    return { w_quantile: numbersOf(inputs, 'p').map((p) => relativeRangeQuantile(p, n)) }
  },
}
