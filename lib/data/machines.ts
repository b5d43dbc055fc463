import type { Tx } from './database'
import { type EquipmentStore, inListOrder, searchKeyOf } from './equipment-store'

export interface MachineValues {
  readonly name: string
  readonly kind: string
}

export interface MachineRow extends MachineValues {
  readonly id: number
  readonly code: string
  readonly active: boolean
  readonly version: number
}

const select = { id: true, code: true, name: true, kind: true, active: true, version: true } as const

const data = (code: string, values: MachineValues) => ({
  ...values,
  searchKey: searchKeyOf(code, values.name),
})

export const machines: EquipmentStore<MachineRow, MachineValues> = {
  list: (tx) => tx.machine.findMany({ select, orderBy: [...inListOrder] }),
  get: async (tx, code) => (await tx.machine.findUnique({ where: { code }, select })) ?? undefined,
  insert: (tx, code, values, at) =>
    tx.machine.create({ data: { code, ...data(code, values), createdAt: new Date(at) }, select }),
  update: async (tx, code, version, values) =>
    (
      await tx.machine.updateMany({
        where: { code, version },
        data: { ...data(code, values), version: { increment: 1 } },
      })
    ).count > 0,
  setActive: async (tx, code, version, active) =>
    (await tx.machine.updateMany({ where: { code, version }, data: { active, version: { increment: 1 } } }))
      .count > 0,
}

/** Ids of the machines that lots of a product were made on. */
export const listMachinesOf = async (tx: Tx, productId: number): Promise<readonly number[]> =>
  (
    await tx.lot.groupBy({
      by: ['machineId'],
      where: { productId, machineId: { not: null } },
      orderBy: { machineId: 'asc' },
    })
  ).flatMap(({ machineId }) => machineId ?? [])

/** Codes and names by id. */
export const listMachineNames = async (
  tx: Tx,
  ids: readonly number[],
): Promise<ReadonlyMap<number, { readonly code: string; readonly name: string }>> => {
  if (ids.length === 0) return new Map()
  const rows = await tx.machine.findMany({
    where: { id: { in: [...ids] } },
    select: { id: true, code: true, name: true },
  })
  return new Map(rows.map(({ id, ...row }) => [id, row]))
}
