import type {
  BarLineInput,
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
import { type ChartedStatistic, type FrozenLimits, limitsAt, type StoredSignal } from './chart-history'
import { chartValue } from './chart-value'
import { chartName, chartUnit, type ResultUnits } from './display-unit'

export interface DriftLot extends ChartLot {
  readonly die: string | undefined
  readonly machine: string | undefined
  readonly setting: string
  readonly specificationNumber: number
  readonly summaries: Readonly<Partial<Record<CharacteristicId, LotSummaryBody>>>
  /** "13 Oct, T. Aldous": stands under a bar line at this lot. */
  readonly detail: string
}

export interface DriftLimits extends FrozenLimits {
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
    barLines: barLines(facts),
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
    limitSets: segments(sets, chart.limitSets, optional, (sigma) => differenceFromSi(sigma, unit)),
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

/** Runs of lots that one limit set holds for. */
function segments(
  sets: readonly (FrozenLimits | undefined)[],
  all: readonly DriftLimits[],
  show: (value: number | undefined) => number | undefined,
  spread: (sigma: number) => number,
): readonly ChartLimitSet[] {
  const found: { set: FrozenLimits; fromIndex: number; toIndex: number }[] = []
  sets.forEach((set, index) => {
    const last = found.at(-1)
    if (!set) return
    if (last && last.set.id === set.id && last.toIndex === index - 1) last.toIndex = index
    else found.push({ set, fromIndex: index, toIndex: index })
  })
  return found.map(({ set, fromIndex, toIndex }) => ({
    fromIndex,
    toIndex,
    number: set.number,
    centre: show(set.centre) ?? set.centre,
    sigma: spread(set.sigma),
    lower: show(set.lower),
    upper: show(set.upper),
    provisional: all.find((one) => one.id === set.id)?.provisional ?? false,
  }))
}

/** Something is different from the lot before: die, machine, setting, specification, or the limits of a chart. */
function barLines(facts: DriftFacts): readonly BarLineInput[] {
  return facts.lots.flatMap((lot, atIndex): BarLineInput[] => {
    const before = facts.lots[atIndex - 1]
    if (!before) return []
    const line = (kind: BarLineInput['kind'], reason: string, detail = lot.detail): BarLineInput => ({
      atIndex,
      kind,
      reason,
      detail,
    })
    return [
      ...(lot.die !== before.die
        ? [line('die', lot.die === undefined ? 'no die named' : `${lot.die} in`)]
        : []),
      ...(lot.machine !== before.machine ? [line('machine', lot.machine ?? 'no machine named')] : []),
      ...(lot.setting !== before.setting
        ? [line('setting', lot.setting === '' ? 'usual setting' : lot.setting)]
        : []),
      ...(lot.specificationNumber !== before.specificationNumber
        ? [line('specification', `specification revision ${lot.specificationNumber}`)]
        : []),
      ...limitSetLine(facts, before, lot, atIndex),
    ]
  })
}

function limitSetLine(
  { charts }: DriftFacts,
  before: DriftLot,
  lot: DriftLot,
  atIndex: number,
): readonly BarLineInput[] {
  const changed = charts.flatMap(({ limitSets }) => {
    const set = limitsAt(limitSets, lot.madeAt)
    return set && set.id !== limitsAt(limitSets, before.madeAt)?.id
      ? [limitSets.find((one) => one.id === set.id) ?? []].flat()
      : []
  })
  const [first] = changed
  if (!first) return []
  const same = changed.every((one) => one.number === first.number)
  return [
    {
      atIndex,
      kind: 'limit-set',
      reason: same ? `limit set ${first.number}` : 'new limit sets',
      detail: first.detail,
    },
  ]
}
