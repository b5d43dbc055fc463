import type { StaffChartInput } from '../charts/staff-chart'
import type { BaselineLot, LimitProposal } from '../control/propose-limits'
import { type CharacteristicId, characteristics } from '../metrology/characteristics'
import { differenceFromSi, fromSi } from '../units/unit'
import type { ChartedStatistic } from './chart-history'
import { chartName, chartUnit, type ResultUnits } from './display-unit'

export interface ProposalFacts {
  readonly characteristic: CharacteristicId
  readonly statistic: ChartedStatistic
  /** In chart order, with the day as it is shown. */
  readonly lots: readonly (BaselineLot & { readonly madeAt: number; readonly label: string })[]
  /** Undefined: the lots are shown without limits. */
  readonly proposal: LimitProposal | undefined
  /** The number that the set would get. */
  readonly number: number
  readonly units: ResultUnits
  readonly decimal: 'point' | 'comma'
}

/** Baseline lots on one stave with the limits that they would give; lots left out stand as open notes. */
export function proposalChart(facts: ProposalFacts): StaffChartInput {
  const { characteristic, statistic, lots, proposal } = facts
  const { unit, decimals } = chartUnit(characteristic, statistic, facts.units)
  const show = (value: number): number =>
    statistic === 'mean' ? fromSi(value, unit) : differenceFromSi(value, unit)
  return {
    title: chartName(characteristic, statistic),
    decimal: facts.decimal,
    lots: lots.map(({ lotId, code, madeAt, label }) => ({ lotId, code, madeAt, label })),
    barLines: [],
    ...(lots.length > 0 ? { window: { from: 0, to: lots.length - 1 } } : {}),
    staves: [
      {
        key: `${characteristic} ${statistic}`,
        label: chartName(characteristic, statistic),
        unitLabel: `${unit}, ${statistic === 'mean' ? 'lot means' : 'standard deviation'}`,
        decimals,
        signed: characteristics[characteristic].dimension === 'ratio',
        oneSided: characteristics[characteristic].oneSided || statistic === 'within-lot-sd',
        values: lots.map((lot) => show(lot.value)),
        leftOut: lots.flatMap((lot, index) => (lot.leftOut ? [index] : [])),
        limitSets: proposal
          ? [
              {
                fromIndex: 0,
                toIndex: lots.length - 1,
                number: facts.number,
                centre: show(proposal.centre),
                sigma: differenceFromSi(proposal.sigma, unit),
                ...(proposal.lower === undefined ? {} : { lower: show(proposal.lower) }),
                upper: show(proposal.upper),
                provisional: proposal.provisional,
              },
            ]
          : [],
        signals: [],
      },
    ],
  }
}
