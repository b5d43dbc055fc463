/** What charts of products and of machines take from the store, brought into the form of the core. */
import type { ChartedLotRow } from '@/lib/data/charted-lots'
import { frozenLimitsOf, type LimitSetRow } from '@/lib/data/limit-sets'
import { characteristicIds } from '@/lib/domain/metrology/characteristics'
import type { SpecificationBody } from '@/lib/domain/metrology/specification'
import type { DriftLimits, DriftLot, DriftSignal } from '@/lib/domain/record/staff-chart-input'
import { targetOf } from '@/lib/domain/record/target-of'
import type { ChartChoice, DriftOrder } from '@/lib/input/drift-view'
import type { WorksFacts } from './get-works'
import { monthAndYear, shortDate } from './short-date'
import type { SignalView } from './signal-views'

/** Lots as they were made, or by when the first of their readings was taken; lots alike by their codes. */
export const inOrder = (lots: readonly ChartedLotRow[], order: DriftOrder): readonly ChartedLotRow[] =>
  order === 'made'
    ? lots
    : [...lots].sort(
        (a, b) => timeOf(a, order) - timeOf(b, order) || (a.code < b.code ? -1 : a.code > b.code ? 1 : 0),
      )

const timeOf = (lot: ChartedLotRow, order: DriftOrder): number =>
  order === 'measured' ? (lot.measuredAt ?? lot.madeAt) : lot.madeAt

interface LotFacts {
  readonly bodies: ReadonlyMap<number, SpecificationBody>
  readonly names: ReadonlyMap<number, string>
  readonly order: DriftOrder
  readonly works: WorksFacts
}

export const driftLots = (
  lots: readonly ChartedLotRow[],
  { bodies, names, order, works: { timeZone } }: LotFacts,
): readonly DriftLot[] => {
  const targets = new Map([...bodies].map(([id, body]) => [id, targetsOf(body)]))
  return lots.map((lot, index): DriftLot => {
    const at = timeOf(lot, order)
    const before = lots[index - 1]
    const month = monthAndYear(at, timeZone)
    const newMonth = before === undefined || month !== monthAndYear(timeOf(before, order), timeZone)
    return {
      lotId: lot.id,
      code: lot.code,
      madeAt: lot.madeAt,
      label: shortDate(at, timeZone),
      ...(newMonth ? { monthLabel: month } : {}),
      productId: lot.product.id,
      productName: lot.product.name,
      targets: targets.get(lot.specificationRevisionId) ?? {},
      materials: lot.materials,
      die: lot.dieName,
      machine: lot.machineName,
      setting: lot.setting,
      specificationNumber: lot.specificationNumber,
      summaries: Object.fromEntries(
        lot.summaries.map(({ characteristic, ...summary }) => [characteristic, summary]),
      ),
      detail: signed(at, lot.makerId === undefined ? undefined : names.get(lot.makerId), timeZone),
    }
  })
}

const targetsOf = (body: SpecificationBody): Readonly<Record<string, number>> =>
  Object.fromEntries(
    characteristicIds.flatMap((id) => {
      const target = targetOf(body, id, 'mean')
      return target === undefined ? [] : [[`${id} mean`, target]]
    }),
  )

const signed = (instant: number, name: string | undefined, timeZone: string): string =>
  [shortDate(instant, timeZone), ...(name === undefined ? [] : [name])].join(', ')

/** Limit sets of one chart. */
export const driftLimits = (
  sets: readonly LimitSetRow[],
  { characteristic, statistic }: ChartChoice,
  names: ReadonlyMap<number, string>,
  { timeZone }: WorksFacts,
): readonly DriftLimits[] =>
  sets
    .filter((set) => set.characteristic === characteristic && set.statistic === statistic)
    .map((set) => ({
      ...frozenLimitsOf(set),
      productId: set.productId,
      provisional: set.provisional,
      detail: signed(
        set.frozenAt,
        set.frozenById === undefined ? undefined : names.get(set.frozenById),
        timeZone,
      ),
    }))

/** Signals of one chart. */
export const driftSignals = (
  signals: readonly SignalView[],
  { characteristic, statistic }: ChartChoice,
): readonly DriftSignal[] =>
  signals
    .filter((signal) => signal.characteristic === characteristic && signal.statistic === statistic)
    .map(({ id, memberIds, rule, sentence, side, state }) => ({
      id,
      rule,
      side,
      members: memberIds,
      state,
      sentence,
    }))
