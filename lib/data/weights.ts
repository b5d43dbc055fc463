import type { WeightFacts } from '@/lib/domain/metrology/evaluation'
import type { Tx } from './database'
import { type EquipmentStore, inListOrder, searchKeyOf } from './equipment-store'

/** Kilograms of conventional mass. */
export interface WeightValues {
  readonly kind: string
  readonly conventionalMass: number
  readonly uMass: number
  readonly note: string
}

export interface WeightRow extends WeightValues {
  readonly id: number
  readonly code: string
  readonly active: boolean
  readonly version: number
}

const select = {
  id: true,
  code: true,
  kind: true,
  conventionalMass: true,
  uMass: true,
  active: true,
  note: true,
  version: true,
} as const

const data = (code: string, values: WeightValues) => ({
  ...values,
  searchKey: searchKeyOf(code, values.kind),
})

export const weights: EquipmentStore<WeightRow, WeightValues> = {
  list: (tx) => tx.weight.findMany({ select, orderBy: [...inListOrder] }),
  get: async (tx, code) => (await tx.weight.findUnique({ where: { code }, select })) ?? undefined,
  insert: (tx, code, values, at) =>
    tx.weight.create({ data: { code, ...data(code, values), createdAt: new Date(at) }, select }),
  update: async (tx, code, version, values) =>
    (
      await tx.weight.updateMany({
        where: { code, version },
        data: { ...data(code, values), version: { increment: 1 } },
      })
    ).count > 0,
  setActive: async (tx, code, version, active) =>
    (await tx.weight.updateMany({ where: { code, version }, data: { active, version: { increment: 1 } } }))
      .count > 0,
}

export const findWeightsByCodes = (tx: Tx, codes: readonly string[]): Promise<readonly WeightRow[]> =>
  tx.weight.findMany({ where: { code: { in: [...codes] } }, select, orderBy: { code: 'asc' } })

/** What hangs, as a budget sees it. */
export const weightFactsOf = ({ code, kind, conventionalMass, uMass }: WeightRow): WeightFacts => ({
  code,
  kind,
  mass: { value: conventionalMass, u: uMass },
})
