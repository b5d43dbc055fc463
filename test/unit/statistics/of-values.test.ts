/** One battery for every statistic of a list of values: typical, one, none, equal, huge, tiny, frozen input, a slow twin. */
import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { lagOneAutocorrelation, vonNeumannRatio } from '@/lib/domain/statistics/lag-one-autocorrelation'
import { mean } from '@/lib/domain/statistics/mean'
import { meanInterval, standardDeviationInterval } from '@/lib/domain/statistics/mean-interval'
import { median } from '@/lib/domain/statistics/median'
import { medianAbsoluteDeviation } from '@/lib/domain/statistics/median-absolute-deviation'
import { sampleQuantile } from '@/lib/domain/statistics/quantile'
import { sampleStandardDeviation } from '@/lib/domain/statistics/sample-standard-deviation'
import {
  momentExcessKurtosis,
  momentSkewness,
  sampleExcessKurtosis,
  sampleSkewness,
} from '@/lib/domain/statistics/shape'
import { mergeSummaries, summarise, withValue } from '@/lib/domain/statistics/summary'

type Statistic = (values: readonly number[]) => number | undefined

/** What each says of 2, 4, 4, 5, 10; of one value; of equal ones (undefined: nothing can be said). By hand. */
const statistics: readonly (readonly [
  name: string,
  of: Statistic,
  typical: number,
  one: number | undefined,
  equal: number | undefined,
])[] = [
  ['mean', mean, 5, 7, 3],
  ['median', median, 4, 7, 3],
  ['sampleStandardDeviation', sampleStandardDeviation, 3, undefined, 0],
  ['medianAbsoluteDeviation', medianAbsoluteDeviation, 1, 0, 0],
  ['quantile, type 6, of ½', (x) => sampleQuantile(x, 0.5, 6), 4, 7, 3],
  ['quantile, type 8, of ½', (x) => sampleQuantile(x, 0.5, 8), 4, 7, 3],
  // Σ(x − 5)(next − 5) = (−3)(−1) + (−1)(−1) + (−1)·0 + 0·5 = 4 of 36.
  ['lagOneAutocorrelation', lagOneAutocorrelation, 4 / 36, undefined, undefined],
  ['vonNeumannRatio', vonNeumannRatio, (4 + 0 + 1 + 25) / 36, undefined, undefined],
  // m3 = (−27 − 1 − 1 + 0 + 125)/5, m2 = 36/5.
  ['momentSkewness', momentSkewness, 19.2 / 7.2 ** 1.5, undefined, undefined],
  // m4 = (81 + 1 + 1 + 0 + 625)/5.
  ['momentExcessKurtosis', momentExcessKurtosis, 141.6 / 7.2 ** 2 - 3, undefined, undefined],
  ['sampleSkewness', sampleSkewness, (19.2 / 7.2 ** 1.5) * (Math.sqrt(20) / 3), undefined, undefined],
  [
    'sampleExcessKurtosis',
    sampleExcessKurtosis,
    ((6 * (141.6 / 7.2 ** 2 - 3) + 6) * 4) / (3 * 2),
    undefined,
    undefined,
  ],
]

describe.each(statistics)('%s', (_, of, typical, one, equal) => {
  it('says what it says of five values, in any state of their array', () => {
    expect(of(Object.freeze([2, 4, 4, 5, 10]))).toBeCloseTo(typical, 12)
  })

  it('says nothing of no values, and what can be said of one', () => {
    expect(of([])).toBeUndefined()
    expect(of([7])).toBe(one)
  })

  it('says what can be said of equal values', () => {
    const said = of([3, 3, 3, 3])
    if (equal === undefined) expect(said).toBeUndefined()
    else expect(said).toBe(equal)
  })

  it('keeps its digits for huge and for tiny values', () => {
    const values = [2, 4, 4, 5, 10]
    for (const unit of [1e-150, 1e-9, 1e9, 1e150]) {
      const scaled = of(values.map((x) => x * unit))
      const shape = /kew|urtosis|lag|Neumann/.test(_)
      expect((scaled ?? Number.NaN) / (shape ? 1 : unit) / typical).toBeCloseTo(1, 9)
    }
  })
})

const list = fc.array(fc.double({ min: -1e6, max: 1e6, noNaN: true }), { minLength: 2, maxLength: 60 })

describe('the clever ways', () => {
  it('agree with the slow obvious ones on random values', () => {
    fc.assert(
      fc.property(list, (x) => {
        const slowMean = x.reduce((sum, one) => sum + one / x.length, 0)
        const slowSd = Math.sqrt(x.reduce((sum, one) => sum + (one - slowMean) ** 2, 0) / (x.length - 1))
        const scale = Math.max(1e-9, ...x.map(Math.abs))
        expect(Math.abs((mean(x) ?? Number.NaN) - slowMean) / scale).toBeLessThan(1e-12)
        expect(Math.abs((sampleStandardDeviation(x) ?? Number.NaN) - slowSd) / scale).toBeLessThan(1e-11)
        const sorted = [...x].sort((a, b) => a - b)
        const half = sorted.length / 2
        const slowMedian =
          sorted.length % 2 === 1
            ? (sorted[Math.floor(half)] ?? 0)
            : ((sorted[half - 1] ?? 0) + (sorted[half] ?? 0)) / 2
        expect(Math.abs((median(x) ?? Number.NaN) - slowMedian) / scale).toBeLessThan(1e-12)
      }),
    )
  })

  it('put summaries of parts together to the summary of the whole', () => {
    fc.assert(
      fc.property(list, list, (a, b) => {
        const merged = mergeSummaries(summarise(a), summarise(b))
        const whole = summarise([...a, ...b])
        const grown = b.reduce<ReturnType<typeof summarise>>((sum, x) => withValue(sum, x), summarise(a))
        const scale = Math.max(1, ...a.map(Math.abs), ...b.map(Math.abs))
        for (const one of [merged, grown]) {
          expect(one?.n).toBe(a.length + b.length)
          expect(Math.abs((one?.mean ?? Number.NaN) - (whole?.mean ?? 0)) / scale).toBeLessThan(1e-12)
          expect(Math.abs((one?.m2 ?? Number.NaN) - (whole?.m2 ?? 0)) / scale ** 2).toBeLessThan(1e-9)
          expect([one?.min, one?.max]).toEqual([whole?.min, whole?.max])
        }
      }),
    )
  })

  it('give intervals that hold the mean and the standard deviation, wider for more confidence', () => {
    const summary = summarise([2, 4, 4, 5, 10])
    if (!summary) throw new Error('no summary')
    const [narrow, wide] = [meanInterval(summary, 0.8), meanInterval(summary, 0.99)]
    expect(narrow?.[0]).toBeLessThan(5)
    expect(wide?.[0]).toBeLessThan(narrow?.[0] ?? 0)
    expect(wide?.[1]).toBeGreaterThan(narrow?.[1] ?? 0)
    const spread = standardDeviationInterval(summary, 0.95)
    expect(spread?.[0]).toBeLessThan(3)
    expect(spread?.[1]).toBeGreaterThan(3)
    expect(meanInterval({ ...summary, n: 1 }, 0.95)).toBeUndefined()
  })
})
