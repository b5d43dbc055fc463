import type { ChartSignal, StaffChartInput, StaveInput } from '../charts/staff-chart'
import { MEAN_RANGE_OF_TWO } from '../control/spread-constants'
import { characteristics } from '../metrology/characteristics'
import { limitsFor } from './chart-departures'
import { limitsAt } from './chart-history'
import { chartValue } from './chart-value'
import { chartName } from './display-unit'
import { driftBarLines } from './drift-bar-lines'
import type { DriftChart, DriftLot, DriftSignal } from './staff-chart-input'

/** One chart over the products of a machine; limit sets say whose they are. */
export interface MachineDriftChart extends DriftChart {
  /** Runs over several products. */
  readonly machineSignals: readonly DriftSignal[]
}

export interface MachineDriftFacts {
  readonly title: string
  /** In the order of the chart. */
  readonly lots: readonly DriftLot[]
  readonly charts: readonly MachineDriftChart[]
  readonly decimal: 'point' | 'comma'
}

/** Fewest neighbouring pairs that a spread is estimated from where no limits are frozen. */
const FEWEST_RANGES = 19

/**
 * The chart of a machine over its products: each lot in standard deviations of its own product from that product's
 * centre line, so that all products stand on one stave. Products without limits stand there as open notes, from their
 * target and in the relative spread of the machine's other lots; nothing is judged by them. Source: ISO 7870-8.
 */
export function machineChartInput(facts: MachineDriftFacts): StaffChartInput {
  const names = new Map(facts.lots.map((lot) => [lot.productId, lot.productName]))
  return {
    title: facts.title,
    decimal: facts.decimal,
    lots: facts.lots.map(({ code, label, lotId, madeAt, monthLabel }) => ({
      lotId,
      code,
      madeAt,
      label,
      ...(monthLabel === undefined ? {} : { monthLabel }),
    })),
    staves: facts.charts.map((chart) => staveOf(chart, facts.lots)),
    barLines: driftBarLines(facts.lots, facts.charts, (lot) =>
      names.size > 1 ? `${lot.productName}: ` : '',
    ),
  }
}

interface Standardised {
  readonly z: number
  /** Whether a frozen limit set stands behind it. */
  readonly judged: boolean
  readonly leftOut: boolean
}

function staveOf(chart: MachineDriftChart, lots: readonly DriftLot[]): StaveInput {
  const { characteristic, statistic } = chart
  const relative = relativeSpread(chart, lots)
  const points = lots.map((lot) => standardised(chart, lot, relative))
  const indexOf = new Map(lots.map((lot, index) => [lot.lotId, index]))
  const drawn = (signal: DriftSignal): ChartSignal[] => {
    const members = signal.members.flatMap((lotId) => indexOf.get(lotId) ?? []).sort((a, b) => a - b)
    return members.length === 0 ? [] : [{ ...signal, members }]
  }
  const judged = points.some((point) => point?.judged)
  return {
    key: `${characteristic} ${statistic}`,
    label: chartName(characteristic, statistic),
    unitLabel: 'σ of each product from its centre',
    decimals: 1,
    signed: true,
    oneSided: characteristics[characteristic].oneSided || statistic === 'within-lot-sd',
    values: points.map((point) => point?.z),
    leftOut: points.flatMap((point, index) => (point && (point.leftOut || !point.judged) ? [index] : [])),
    limitSets: judged
      ? [
          {
            fromIndex: 0,
            toIndex: lots.length - 1,
            number: 0,
            centre: 0,
            sigma: 1,
            provisional: chart.limitSets.some((set) => set.provisional),
          },
        ]
      : [],
    signals: [
      // A run of one product weaves through the lots of the others: it is drawn while somebody has to look at it.
      ...chart.signals
        .filter(({ rule, state }) => rule === 'beyond-the-limits' || state === 'open')
        .flatMap(drawn),
      ...chart.machineSignals.flatMap(drawn),
    ],
  }
}

function standardised(
  { characteristic, limitSets, statistic }: MachineDriftChart,
  lot: DriftLot,
  relative: number | undefined,
): Standardised | undefined {
  const value = chartValue(statistic, lot.summaries[characteristic])
  if (value === undefined) return undefined
  const set = limitsAt(
    limitSets.filter((one) => one.productId === lot.productId),
    lot.madeAt,
  )
  if (set && set.sigma > 0) {
    const target = lot.targets[`${characteristic} ${statistic}`]
    const { centre, sigma } = limitsFor(set, target === undefined ? {} : { target })
    return { z: (value - centre) / sigma, judged: true, leftOut: set.leftOut.includes(lot.lotId) }
  }
  const departure = departureOf(characteristic, statistic, lot, value)
  return departure === undefined || relative === undefined
    ? undefined
    : { z: departure / relative, judged: false, leftOut: false }
}

/** How far a lot lies from its target, relative to it; ratios, whose target is none, as they are. */
function departureOf(
  characteristic: MachineDriftChart['characteristic'],
  statistic: MachineDriftChart['statistic'],
  lot: DriftLot,
  value: number,
): number | undefined {
  if (statistic !== 'mean') return undefined
  const target = lot.targets[`${characteristic} ${statistic}`]
  if (target !== undefined && target > 0) return value / target - 1
  return characteristics[characteristic].dimension === 'ratio' ? value : undefined
}

/** Relative σ from the moving ranges of neighbouring lots of one product; undefined for too few. */
function relativeSpread(chart: MachineDriftChart, lots: readonly DriftLot[]): number | undefined {
  const before = new Map<number, number>()
  let [sum, count] = [0, 0]
  for (const lot of lots) {
    const value = chartValue(chart.statistic, lot.summaries[chart.characteristic])
    const departure =
      value === undefined ? undefined : departureOf(chart.characteristic, chart.statistic, lot, value)
    if (departure === undefined) continue
    const last = before.get(lot.productId)
    if (last !== undefined) {
      sum += Math.abs(departure - last)
      count += 1
    }
    before.set(lot.productId, departure)
  }
  return count < FEWEST_RANGES || sum === 0 ? undefined : sum / count / MEAN_RANGE_OF_TWO
}
