import type { BarLineInput } from '../charts/staff-chart'
import { limitsAt } from './chart-history'
import type { DriftChart, DriftLot } from './staff-chart-input'

const kindOfRole = {
  core: 'coil',
  'wrap-1': 'spool',
  'wrap-2': 'spool',
  resin: 'resin',
} as const

/**
 * What is different at a lot from the one before of the same product: limit set, specification, die, machine, coil,
 * spool, resin, setting. `named` puts the product's name before the reason, on a chart over several products.
 */
export function driftBarLines(
  lots: readonly DriftLot[],
  charts: readonly Pick<DriftChart, 'limitSets'>[],
  named: (lot: DriftLot) => string = () => '',
): readonly BarLineInput[] {
  const last = new Map<number, DriftLot>()
  return lots.flatMap((lot, atIndex): BarLineInput[] => {
    const before = last.get(lot.productId)
    last.set(lot.productId, lot)
    if (!before) return []
    const line = (kind: BarLineInput['kind'], reason: string, detail = lot.detail): BarLineInput => ({
      atIndex,
      kind,
      reason: `${named(lot)}${reason}`,
      detail,
    })
    return [
      ...(lot.die !== before.die
        ? [line('die', lot.die === undefined ? 'no die named' : `${lot.die} in`)]
        : []),
      ...(lot.machine !== before.machine ? [line('machine', lot.machine ?? 'no machine named')] : []),
      ...(['core', 'wrap-1', 'wrap-2', 'resin'] as const).flatMap((role) => {
        const [now, then] = [lot.materials[role], before.materials[role]]
        return now === then
          ? []
          : [line(kindOfRole[role], now === undefined ? `no ${kindOfRole[role]} named` : `${now} in`)]
      }),
      ...(lot.setting !== before.setting
        ? [line('setting', lot.setting === '' ? 'usual setting' : lot.setting)]
        : []),
      ...(lot.specificationNumber !== before.specificationNumber
        ? [line('specification', `specification revision ${lot.specificationNumber}`)]
        : []),
      ...limitSetLine(charts, before, lot).map(({ detail, reason }) => line('limit-set', reason, detail)),
    ]
  })
}

function limitSetLine(
  charts: readonly Pick<DriftChart, 'limitSets'>[],
  before: DriftLot,
  lot: DriftLot,
): readonly { readonly reason: string; readonly detail: string }[] {
  const changed = charts.flatMap(({ limitSets }) => {
    const own = limitSets.filter((one) => one.productId === undefined || one.productId === lot.productId)
    const set = limitsAt(own, lot.madeAt)
    return set && set.id !== limitsAt(own, before.madeAt)?.id
      ? [own.find((one) => one.id === set.id) ?? []].flat()
      : []
  })
  const [first] = changed
  if (!first) return []
  const same = changed.every((one) => one.number === first.number)
  return [{ reason: same ? `limit set ${first.number}` : 'new limit sets', detail: first.detail }]
}
