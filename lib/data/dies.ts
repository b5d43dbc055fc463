import { type EquipmentStore, inListOrder, searchKeyOf } from './equipment-store'

export interface DieValues {
  readonly name: string
  readonly sizeMetres: number
}

export interface DieRow extends DieValues {
  readonly id: number
  readonly code: string
  readonly active: boolean
  readonly version: number
}

const select = { id: true, code: true, name: true, sizeMetres: true, active: true, version: true } as const

const data = (code: string, values: DieValues) => ({ ...values, searchKey: searchKeyOf(code, values.name) })

export const dies: EquipmentStore<DieRow, DieValues> = {
  list: (tx) => tx.die.findMany({ select, orderBy: [...inListOrder] }),
  get: async (tx, code) => (await tx.die.findUnique({ where: { code }, select })) ?? undefined,
  insert: (tx, code, values, at) =>
    tx.die.create({ data: { code, ...data(code, values), createdAt: new Date(at) }, select }),
  update: async (tx, code, version, values) =>
    (
      await tx.die.updateMany({
        where: { code, version },
        data: { ...data(code, values), version: { increment: 1 } },
      })
    ).count > 0,
  setActive: async (tx, code, version, active) =>
    (await tx.die.updateMany({ where: { code, version }, data: { active, version: { increment: 1 } } }))
      .count > 0,
}
