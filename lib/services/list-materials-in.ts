import type { Actor } from '@/lib/access/actor'
import { permit } from '@/lib/access/permit'
import { database } from '@/lib/data/database'
import {
  countMaterialInRows,
  listMaterialInRows,
  listMaterialsInUse as listRowsInUse,
  type MaterialInRow,
} from '@/lib/data/materials-in'
import type { MaterialInKind } from '@/lib/domain/record/material-in'
import { type ListMaterialsInInput, MATERIALS_A_PAGE } from '@/lib/input/material-in'

/** As the list shows it, and as the API gives it. */
export interface MaterialInItem {
  readonly code: string
  readonly name: string
  readonly kind: MaterialInKind
  readonly material: string | undefined
  readonly heat: string
  readonly supplier: string
  readonly parentCode: string | undefined
  readonly sizeMetres: number | undefined
  readonly lengthMetres: number | undefined
  readonly massKilograms: number | undefined
  readonly receivedAt: number | undefined
  readonly active: boolean
  readonly lots: number
}

export interface MaterialInList {
  readonly materials: readonly MaterialInItem[]
  readonly count: number
  readonly page: number
  readonly pages: number
}

/** Coils, spools and batches, those in use first, a page at a time. @throws LedgerlineError not-permitted */
export async function listMaterialsIn(
  actor: Actor | undefined,
  input: ListMaterialsInInput,
): Promise<MaterialInList> {
  permit(actor, 'materials-in.read')
  const { read } = database()
  const filter = {
    search: input.search,
    kind: input.kind,
    ...(input.inUse === undefined ? {} : { active: input.inUse === 'yes' }),
  }
  const count = await countMaterialInRows(read, filter)
  const pages = Math.max(1, Math.ceil(count / MATERIALS_A_PAGE))
  const page = Math.min(input.page, pages)
  const rows = await listMaterialInRows(read, filter, {
    skip: (page - 1) * MATERIALS_A_PAGE,
    take: MATERIALS_A_PAGE,
  })
  return { materials: rows.map(itemOf), count, page, pages }
}

const itemOf = (row: MaterialInRow & { readonly lotCount: number }): MaterialInItem => ({
  code: row.code,
  name: row.name,
  kind: row.kind,
  material: row.material?.name,
  heat: row.heat,
  supplier: row.supplier,
  parentCode: row.parent?.code,
  sizeMetres: row.sizeMetres,
  lengthMetres: row.lengthMetres,
  massKilograms: row.massKilograms,
  receivedAt: row.receivedAt,
  active: row.active,
  lots: row.lotCount,
})

/** What a lot can be said to be made of now. */
export interface MaterialInChoice {
  readonly code: string
  readonly name: string
  readonly kind: MaterialInKind
  readonly heat: string
}

/** Everything in use, by kind, the newest first. @throws LedgerlineError not-permitted */
export async function listMaterialsInUse(actor: Actor | undefined): Promise<readonly MaterialInChoice[]> {
  permit(actor, 'materials-in.read')
  return (await listRowsInUse(database().read)).map(({ code, name, kind, heat }) => ({
    code,
    name,
    kind,
    heat,
  }))
}
