import type { Actor } from '@/lib/access/actor'
import { permit } from '@/lib/access/permit'
import { isCharacteristic, statisticOf } from '@/lib/data/chart-histories'
import { type ChartedLotRow, listChartedLots } from '@/lib/data/charted-lots'
import { database } from '@/lib/data/database'
import { frozenLimitsOf, type LimitSetRow, listLimitSets } from '@/lib/data/limit-sets'
import { listPersonNames } from '@/lib/data/people-names'
import { findProductByCode } from '@/lib/data/products'
import { listProductSignals } from '@/lib/data/signals'
import { findSpecification, findSpecificationInForce, specificationBodyOf } from '@/lib/data/specifications'
import type { StaffChartInput } from '@/lib/domain/charts/staff-chart'
import { problem } from '@/lib/domain/errors'
import type { SpecificationBody } from '@/lib/domain/metrology/specification'
import { type DriftChart, type DriftLot, staffChartInput } from '@/lib/domain/record/staff-chart-input'
import { type ChartChoice, defaultCharts } from '@/lib/input/drift-view'
import { getWorks, type WorksFacts } from './get-works'
import { type LimitSetView, limitSetView } from './limit-set-view'
import { monthAndYear, shortDate } from './short-date'
import { type SignalView, signalViews } from './signal-views'

export interface DriftView {
  readonly product: { readonly code: string; readonly name: string; readonly construction: string }
  readonly works: WorksFacts
  /** All charted lots in chart order; add a `window` to show some of them. */
  readonly chart: StaffChartInput
  /** Newest first. */
  readonly signals: readonly SignalView[]
  /** Chart by chart, oldest first. */
  readonly limitSets: readonly LimitSetView[]
  readonly specification: { readonly number: number; readonly body: SpecificationBody } | undefined
}

/**
 * The charts of a product on one lot axis, with their limit sets and signals.
 * @throws LedgerlineError not-permitted, not-found
 */
export async function getDrift(
  actor: Actor | undefined,
  productCode: string,
  charts: readonly ChartChoice[] = defaultCharts,
  at: number = Date.now(),
): Promise<DriftView> {
  permit(actor, 'drift.read')
  const { read } = database()
  const product = await findProductByCode(read, productCode)
  if (!product) throw problem('not-found', `There is no product ${productCode}.`)
  const works = await getWorks(actor)
  const lots = await listChartedLots(read, product.id, [...new Set(charts.map((one) => one.characteristic))])
  const sets = await listLimitSets(read, product.id)
  const signals = await signalViews(read, await listProductSignals(read, product.id), works)
  const names = await listPersonNames(read, [
    ...lots.flatMap((lot) => lot.makerId ?? []),
    ...sets.flatMap((set) => set.frozenById ?? []),
  ])
  const newest = lots.at(-1)
  const revision = newest
    ? await findSpecification(read, product.id, newest.specificationNumber)
    : await findSpecificationInForce(read, product.id, at)
  const specification = revision && { number: revision.number, body: specificationBodyOf(revision) }
  return {
    product: { code: product.code, name: product.name, construction: product.construction },
    works,
    chart: staffChartInput({
      title: product.name,
      lots: lots.map((lot, index) => driftLot(lot, lots[index - 1], names, works)),
      charts: charts.map((choice) => driftChart(choice, sets, signals, names, works)),
      specification,
      units: works.units,
      decimal: works.numberFormat,
    }),
    signals,
    limitSets: sets.flatMap((row) =>
      isCharacteristic(row.characteristic)
        ? [
            limitSetView(
              row,
              { characteristic: row.characteristic, statistic: statisticOf(row.statistic) },
              names,
            ),
          ]
        : [],
    ),
    specification,
  }
}

const signed = (instant: number, name: string | undefined, timeZone: string): string =>
  [shortDate(instant, timeZone), ...(name === undefined ? [] : [name])].join(', ')

function driftLot(
  lot: ChartedLotRow,
  before: ChartedLotRow | undefined,
  names: ReadonlyMap<number, string>,
  { timeZone }: WorksFacts,
): DriftLot {
  const month = monthAndYear(lot.madeAt, timeZone)
  const newMonth = before === undefined || month !== monthAndYear(before.madeAt, timeZone)
  return {
    lotId: lot.id,
    code: lot.code,
    madeAt: lot.madeAt,
    label: shortDate(lot.madeAt, timeZone),
    ...(newMonth ? { monthLabel: month } : {}),
    die: lot.dieName,
    machine: lot.machineName,
    setting: lot.setting,
    specificationNumber: lot.specificationNumber,
    summaries: Object.fromEntries(
      lot.summaries.map(({ characteristic, ...summary }) => [characteristic, summary]),
    ),
    detail: signed(lot.madeAt, lot.makerId === undefined ? undefined : names.get(lot.makerId), timeZone),
  }
}

const driftChart = (
  { characteristic, statistic }: ChartChoice,
  sets: readonly LimitSetRow[],
  signals: readonly SignalView[],
  names: ReadonlyMap<number, string>,
  { timeZone }: WorksFacts,
): DriftChart => ({
  characteristic,
  statistic,
  limitSets: sets
    .filter((set) => set.characteristic === characteristic && set.statistic === statistic)
    .map((set) => ({
      ...frozenLimitsOf(set),
      provisional: set.provisional,
      detail: signed(
        set.frozenAt,
        set.frozenById === undefined ? undefined : names.get(set.frozenById),
        timeZone,
      ),
    })),
  signals: signals
    .filter((signal) => signal.characteristic === characteristic && signal.statistic === statistic)
    .map(({ id, rule, side, memberIds, state, sentence }) => ({
      id,
      rule,
      side,
      members: memberIds,
      state,
      sentence,
    })),
})
