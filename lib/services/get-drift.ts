import type { Actor } from '@/lib/access/actor'
import { permit } from '@/lib/access/permit'
import { isCharacteristic, statisticOf } from '@/lib/data/chart-histories'
import { listChartedLots } from '@/lib/data/charted-lots'
import { database } from '@/lib/data/database'
import { listLimitSets } from '@/lib/data/limit-sets'
import { listPersonNames } from '@/lib/data/people-names'
import { findProductByCode } from '@/lib/data/products'
import { listProductSignals } from '@/lib/data/signals'
import {
  findSpecification,
  findSpecificationInForce,
  listSpecificationBodies,
  specificationBodyOf,
} from '@/lib/data/specifications'
import type { StaffChartInput } from '@/lib/domain/charts/staff-chart'
import { problem } from '@/lib/domain/errors'
import type { SpecificationBody } from '@/lib/domain/metrology/specification'
import { staffChartInput } from '@/lib/domain/record/staff-chart-input'
import { type ChartChoice, type DriftOrder, defaultCharts } from '@/lib/input/drift-view'
import { driftLimits, driftLots, driftSignals, inOrder } from './drift-facts'
import { getWorks, type WorksFacts } from './get-works'
import { type LimitSetView, limitSetView } from './limit-set-view'
import { type SignalView, signalViews } from './signal-views'

export interface DriftView {
  readonly product: { readonly code: string; readonly name: string; readonly construction: string }
  readonly works: WorksFacts
  /** All charted lots in the order asked for; add a `window` to show some of them. */
  readonly chart: StaffChartInput
  /** Newest first. */
  readonly signals: readonly SignalView[]
  /** Chart by chart, oldest first. */
  readonly limitSets: readonly LimitSetView[]
  readonly specification: { readonly number: number; readonly body: SpecificationBody } | undefined
}

export interface DriftOptions {
  /** As the lots were made, unless said. */
  readonly order?: DriftOrder
  readonly at?: number
}

/**
 * The charts of a product on one lot axis, with their limit sets and signals.
 * @throws LedgerlineError not-permitted, not-found
 */
export async function getDrift(
  actor: Actor | undefined,
  productCode: string,
  charts: readonly ChartChoice[] = defaultCharts,
  { at = Date.now(), order = 'made' }: DriftOptions = {},
): Promise<DriftView> {
  permit(actor, 'drift.read')
  const { read } = database()
  const product = await findProductByCode(read, productCode)
  if (!product) throw problem('not-found', `There is no product ${productCode}.`)
  const works = await getWorks(actor)
  const lots = await listChartedLots(read, { productId: product.id }, [
    ...new Set(charts.map((one) => one.characteristic)),
  ])
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
  const bodies = await listSpecificationBodies(read, product.id)
  return {
    product: { code: product.code, name: product.name, construction: product.construction },
    works,
    chart: staffChartInput({
      title: product.name,
      lots: driftLots(inOrder(lots, order), { bodies, names, order, works }),
      charts: charts.map((choice) => ({
        ...choice,
        limitSets: driftLimits(sets, choice, names, works),
        signals: driftSignals(signals, choice),
      })),
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
