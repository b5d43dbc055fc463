import type { LotSummaryBody } from '../quality/lot-summary'
import type { DatasheetSpread } from './datasheet'

/**
 * Spread of released lots by one-way analysis of variance: within lots √MS_W, between lots
 * √((MS_B − MS_W)/n₀), n₀ = (N − Σn²/N)/(k − 1); a negative component is zero. Values in the unit of the
 * summaries. The statement gives what was seen and its number of lots; it claims no confidence for strings
 * that were not measured. Undefined without lots.
 *
 * Source: one-way random effects, expected mean squares (e.g. NIST/SEMATECH e-Handbook 7.4.3, 3.2.3).
 */
export function lotSpread(
  summaries: readonly LotSummaryBody[],
  show: (value: number) => string,
): DatasheetSpread | undefined {
  const k = summaries.length
  const first = summaries[0]
  if (!first) return undefined
  const N = summaries.reduce((sum, lot) => sum + lot.n, 0)
  const grand = first.mean + summaries.reduce((sum, lot) => sum + lot.n * (lot.mean - first.mean), 0) / N
  const within = summaries.reduce((sum, lot) => sum + lot.m2, 0)
  const between = summaries.reduce((sum, lot) => sum + lot.n * (lot.mean - grand) * (lot.mean - grand), 0)
  const meanSquareWithin = N > k ? within / (N - k) : 0
  const meanSquareBetween = k > 1 ? between / (k - 1) : 0
  const n0 = k > 1 ? (N - summaries.reduce((sum, lot) => sum + lot.n * lot.n, 0) / N) / (k - 1) : N
  const betweenLots = Math.sqrt(Math.max(0, (meanSquareBetween - meanSquareWithin) / n0))
  const withinLots = Math.sqrt(meanSquareWithin)
  const means = summaries.map((lot) => lot.mean)
  const lowestLot = Math.min(...means)
  const highestLot = Math.max(...means)
  const lowestSpecimen = Math.min(...summaries.map((lot) => lot.min))
  const highestSpecimen = Math.max(...summaries.map((lot) => lot.max))
  const lots = `${k} ${k === 1 ? 'lot' : 'lots'}, ${N} ${N === 1 ? 'specimen' : 'specimens'}`
  return {
    lots: k,
    specimens: N,
    lowestLot,
    highestLot,
    lowestSpecimen,
    highestSpecimen,
    betweenLots,
    withinLots,
    statement: `${lots}: lot means from ${show(lowestLot)} to ${show(highestLot)}, specimens from ${show(lowestSpecimen)} to ${show(highestSpecimen)}; standard deviation ${show(betweenLots)} between lots, ${show(withinLots)} within a lot.`,
  }
}
