import type { MaterialBody } from '@/lib/domain/strings/material'
import type { Tx } from './database'
import { searchKeyOf } from './equipment-store'

export interface MaterialValues {
  readonly name: string
  /** Canonical JSON of MaterialBody. */
  readonly body: string
  readonly kind: MaterialBody['kind']
  /** How sure the values are. */
  readonly standing: string
  readonly source: string
}

export interface MaterialRow extends Omit<MaterialValues, 'kind'> {
  readonly id: number
  readonly code: string
  readonly kind: string
  readonly builtIn: boolean
  readonly version: number
}

const select = {
  id: true,
  code: true,
  name: true,
  kind: true,
  body: true,
  standing: true,
  source: true,
  builtIn: true,
  version: true,
} as const

const data = (code: string, values: MaterialValues) => ({
  ...values,
  searchKey: searchKeyOf(code, values.name),
})

export const listMaterialRows = (tx: Tx): Promise<readonly MaterialRow[]> =>
  tx.material.findMany({ select, orderBy: [{ kind: 'asc' }, { name: 'asc' }] })

export const findMaterialByCode = async (tx: Tx, code: string): Promise<MaterialRow | undefined> =>
  (await tx.material.findUnique({ where: { code }, select })) ?? undefined

export const insertMaterial = (
  tx: Tx,
  code: string,
  values: MaterialValues,
  { builtIn, at }: { readonly builtIn: boolean; readonly at: number },
): Promise<MaterialRow> =>
  tx.material.create({ data: { code, ...data(code, values), builtIn, createdAt: new Date(at) }, select })

/** @returns false when the row has another version by now, or is not there */
export const updateMaterialRow = async (
  tx: Tx,
  code: string,
  version: number,
  values: MaterialValues,
): Promise<boolean> =>
  (
    await tx.material.updateMany({
      where: { code, version },
      data: { ...data(code, values), version: { increment: 1 } },
    })
  ).count > 0

/** The body as it was stored; only our own canonical JSON is ever written there. */
export const materialBodyOf = ({ body }: Pick<MaterialRow, 'body'>): MaterialBody =>
  JSON.parse(body) as MaterialBody
