import type { Tx } from './database'
import { searchKeyOf } from './equipment-store'

export interface ProductValues {
  readonly name: string
  readonly family: string
  readonly construction: string
}

export interface ProductRow extends ProductValues {
  readonly id: number
  readonly code: string
  readonly active: boolean
}

const select = { id: true, code: true, name: true, family: true, construction: true, active: true } as const

export const listProductRows = (tx: Tx): Promise<readonly ProductRow[]> =>
  tx.product.findMany({ select, orderBy: [{ active: 'desc' }, { family: 'asc' }, { code: 'asc' }] })

export const findProductByCode = async (tx: Tx, code: string): Promise<ProductRow | undefined> =>
  (await tx.product.findUnique({ where: { code }, select })) ?? undefined

export const insertProduct = (tx: Tx, code: string, values: ProductValues, at: number): Promise<ProductRow> =>
  tx.product.create({
    data: {
      code,
      ...values,
      searchKey: searchKeyOf(code, values.name, values.family),
      createdAt: new Date(at),
    },
    select,
  })

export const setProductActiveRow = async (tx: Tx, id: number, active: boolean): Promise<void> => {
  await tx.product.update({ where: { id }, data: { active }, select: { id: true } })
}
