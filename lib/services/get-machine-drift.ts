import type { Actor } from '@/lib/access/actor'
import { permit } from '@/lib/access/permit'
import { listChartedLots } from '@/lib/data/charted-lots'
import { database } from '@/lib/data/database'
import { type LimitSetRow, listLimitSets } from '@/lib/data/limit-sets'
import { machines } from '@/lib/data/machines'
import { listPersonNames } from '@/lib/data/people-names'
import { listMachineSignals, listProductSignals, type SignalRow } from '@/lib/data/signals'
import { listSpecificationBodies } from '@/lib/data/specifications'
import type { StaffChartInput } from '@/lib/domain/charts/staff-chart'
import { problem } from '@/lib/domain/errors'
import type { SpecificationBody } from '@/lib/domain/metrology/specification'
import { machineChartInput } from '@/lib/domain/record/machine-chart-input'
import { type ChartChoice, defaultCharts } from '@/lib/input/drift-view'
import { driftLimits, driftLots, driftSignals, inOrder } from './drift-facts'
import type { DriftOptions } from './get-drift'
import { getWorks, type WorksFacts } from './get-works'
import { type SignalView, signalViews } from './signal-views'

export interface MachineDriftView {
  readonly machine: { readonly code: string; readonly name: string }
  readonly works: WorksFacts
  readonly chart: StaffChartInput
  /** Of the machine over its products, and of its lots on their products' charts; newest first. */
  readonly signals: readonly SignalView[]
  /** Products on the chart, with how many lots, and whether they have limits. */
  readonly products: readonly {
    readonly code: string
    readonly name: string
    readonly lots: number
    readonly limits: boolean
  }[]
}

/**
 * The charts of a machine over all its products: each lot in standard deviations from its own product's centre.
 * @throws LedgerlineError not-permitted, not-found
 */
export async function getMachineDrift(
  actor: Actor | undefined,
  machineCode: string,
  charts: readonly ChartChoice[] = defaultCharts,
  { order = 'made' }: DriftOptions = {},
): Promise<MachineDriftView> {
  permit(actor, 'drift.read')
  const { read } = database()
  const machine = await machines.get(read, machineCode)
  if (!machine) throw problem('not-found', `There is no machine ${machineCode}.`)
  const works = await getWorks(actor)
  const rows = await listChartedLots(read, { machineId: machine.id }, [
    ...new Set(charts.map((one) => one.characteristic)),
  ])
  const products = [...new Map(rows.map((row) => [row.product.id, row.product])).values()]
  const lotIds = new Set(rows.map((row) => row.id))
  const sets: LimitSetRow[] = []
  const signalRows: SignalRow[] = [...(await listMachineSignals(read, machine.id))]
  const bodies = new Map<number, SpecificationBody>()
  for (const { id } of products) {
    sets.push(...(await listLimitSets(read, id)))
    for (const [revisionId, body] of await listSpecificationBodies(read, id)) bodies.set(revisionId, body)
    // Of a product that several machines make, what concerns this one.
    const own = await listProductSignals(read, id)
    signalRows.push(...own.filter((row) => row.members.some((lotId) => lotIds.has(lotId))))
  }
  signalRows.sort((a, b) => b.raisedAt - a.raisedAt || b.id - a.id)
  const signals = await signalViews(read, signalRows, works)
  const names = await listPersonNames(read, [
    ...rows.flatMap((lot) => lot.makerId ?? []),
    ...sets.flatMap((set) => set.frozenById ?? []),
  ])
  return {
    machine: { code: machine.code, name: machine.name },
    works,
    chart: machineChartInput({
      title: machine.name,
      decimal: works.numberFormat,
      lots: driftLots(inOrder(rows, order), { bodies, names, order, works }),
      charts: charts.map((choice) => ({
        ...choice,
        limitSets: driftLimits(sets, choice, names, works),
        signals: driftSignals(
          signals.filter((one) => one.machine === undefined),
          choice,
        ),
        machineSignals: driftSignals(
          signals.filter((one) => one.machine !== undefined),
          choice,
        ),
      })),
    }),
    signals,
    products: products.map(({ code, id, name }) => ({
      code,
      name,
      lots: rows.filter((row) => row.product.id === id).length,
      limits: sets.some((set) => set.productId === id),
    })),
  }
}
