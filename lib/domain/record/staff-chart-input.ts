import type {
  ChartLimitSet,
  ChartLot,
  ChartSignal,
  ChartTolerance,
  StaffChartInput,
  StaveInput,
} from '../charts/staff-chart'
import { type CharacteristicId, characteristics } from '../metrology/characteristics'
import type { SpecificationBody } from '../metrology/specification'
import type { LotSummaryBody } from '../quality/lot-summary'
import { limitsOf } from '../quality/tolerances'
import { differenceFromSi, fromSi } from '../units/unit'
import {
  type ChartedStatistic,
  type FrozenLimits,
  limitsAt,
  type StoredSignal,
  targetShift,
} from './chart-history'
import { chartValue } from './chart-value'
import { chartName, chartUnit, type ResultUnits } from './display-unit'
import { driftBarLines } from './drift-bar-lines'

export interface DriftLot extends ChartLot {
  readonly productId: number
  readonly productName: string
  /** What its specification asks for, SI, by `characteristic statistic`. */
  readonly targets: Readonly<Record<string, number>>
  /** Codes of what went into it, by role. */
  readonly materials: Readonly<Record<string, string>>
  readonly die: string | undefined
  readonly machine: string | undefined
  readonly setting: string
  readonly specificationNumber: number
  readonly summaries: Readonly<Partial<Record<CharacteristicId, LotSummaryBody>>>
  /** "13 Oct, T. Aldous": stands under a bar line at this lot. */
  readonly detail: string
}

export interface DriftLimits extends FrozenLimits {
  /** Whose they are, on a chart over several products. */
  readonly productId?: number
  readonly provisional: boolean
  /** "2 Sep, M. Orrin". */
  readonly detail: string
}

export type DriftSignal = Pick<StoredSignal, 'id' | 'rule' | 'side' | 'members' | 'state'> & {
  readonly sentence: string
}

export interface DriftChart {
  readonly characteristic: CharacteristicId
  readonly statistic: ChartedStatistic
  readonly limitSets: readonly DriftLimits[]
  readonly signals: readonly DriftSignal[]
}

export interface DriftFacts {
  readonly title: string
  /** In chart order. */
  readonly lots: readonly DriftLot[]
  readonly charts: readonly DriftChart[]
  /** The revision whose tolerance lines are drawn. */
  readonly specification: { readonly number: number; readonly body: SpecificationBody } | undefined
  readonly units: ResultUnits
  readonly decimal: 'point' | 'comma'
}

/** A product's charts as the staff chart takes them: display units, lot indices, bar lines where something changed. */
export function staffChartInput(facts: DriftFacts): StaffChartInput {
  return {
    title: facts.title,
    decimal: facts.decimal,
    lots: facts.lots.map(({ lotId, code, madeAt, label, monthLabel }) => ({
      lotId,
      code,
      madeAt,
      label,
      ...(monthLabel === undefined ? {} : { monthLabel }),
    })),
    staves: facts.charts.map((chart) => staveOf(chart, facts)),
    barLines: driftBarLines(facts.lots, facts.charts),
  }
}

function staveOf(chart: DriftChart, facts: DriftFacts): StaveInput {
  const { characteristic, statistic } = chart
  const { unit, decimals } = chartUnit(characteristic, statistic, facts.units)
  const show = statistic === 'mean' ? fromSi : differenceFromSi
  const optional = (value: number | undefined) => (value === undefined ? undefined : show(value, unit))
  const indexOf = new Map(facts.lots.map((lot, index) => [lot.lotId, index]))
  const sets = facts.lots.map((lot) => limitsAt(chart.limitSets, lot.madeAt))
  const tolerance = toleranceOf(chart, facts, optional)
  return {
    key: `${characteristic} ${statistic}`,
    label: chartName(characteristic, statistic),
    unitLabel: `${unit}, ${statistic === 'mean' ? 'lot means' : 'standard deviation'}`,
    decimals,
    signed: characteristics[characteristic].dimension === 'ratio',
    oneSided: characteristics[characteristic].oneSided || statistic === 'within-lot-sd',
    values: facts.lots.map((lot) => optional(chartValue(statistic, lot.summaries[characteristic]))),
    leftOut: facts.lots.flatMap((lot, index) => (sets[index]?.leftOut.includes(lot.lotId) ? [index] : [])),
    limitSets: segments(
      facts.lots.map((lot, index) => shiftedSet(sets[index], lot, `${characteristic} ${statistic}`)),
      chart.limitSets,
      optional,
      (sigma) => differenceFromSi(sigma, unit),
    ),
    ...(tolerance ? { tolerance } : {}),
    signals: chart.signals.flatMap(({ members, ...signal }): ChartSignal[] => {
      const drawn = members.flatMap((lotId) => indexOf.get(lotId) ?? []).sort((a, b) => a - b)
      return drawn.length === 0 ? [] : [{ ...signal, members: drawn }]
    }),
  }
}

function toleranceOf(
  { characteristic, statistic }: DriftChart,
  { specification }: DriftFacts,
  show: (value: number | undefined) => number | undefined,
): ChartTolerance | undefined {
  const limits =
    specification && statistic === 'mean' ? limitsOf(specification.body, characteristic) : undefined
  if (!specification || !limits) return undefined
  return {
    lower: show(limits.lower),
    upper: show(limits.upper),
    label: `specification revision ${specification.number}`,
  }
}

interface ShiftedSet {
  readonly set: FrozenLimits
  /** How far a moved target takes it, SI. */
  readonly shift: number
}

const shiftedSet = (
  set: FrozenLimits | undefined,
  { targets }: DriftLot,
  chart: string,
): ShiftedSet | undefined => {
  const target = targets[chart]
  return set && { set, shift: targetShift(set, target === undefined ? {} : { target }) }
}

/** Runs of lots that one limit set holds for, and one target. */
function segments(
  sets: readonly (ShiftedSet | undefined)[],
  all: readonly DriftLimits[],
  show: (value: number | undefined) => number | undefined,
  spread: (sigma: number) => number,
): readonly ChartLimitSet[] {
  const found: (ShiftedSet & { readonly fromIndex: number; toIndex: number })[] = []
  sets.forEach((one, index) => {
    const last = found.at(-1)
    if (!one) return
    if (last && last.set.id === one.set.id && last.shift === one.shift && last.toIndex === index - 1)
      last.toIndex = index
    else found.push({ ...one, fromIndex: index, toIndex: index })
  })
  const moved = (value: number | undefined, shift: number) =>
    value === undefined ? undefined : value + shift
  return found.map(({ fromIndex, set, shift, toIndex }) => ({
    fromIndex,
    toIndex,
    number: set.number,
    centre: show(set.centre + shift) ?? set.centre,
    sigma: spread(set.sigma),
    lower: show(moved(set.lower, shift)),
    upper: show(moved(set.upper, shift)),
    provisional: all.find((one) => one.id === set.id)?.provisional ?? false,
  }))
}
