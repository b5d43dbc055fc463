import type { MaterialInKind } from '@/lib/domain/record/material-in'
import type { Tx } from './database'
import { dateOrNull, type EquipmentStore, inListOrder, searchKeyOf } from './equipment-store'

/** A coil, spool or resin batch. Instants are epoch milliseconds, the rest is SI. */
export interface MaterialInFacts {
  readonly name: string
  readonly kind: MaterialInKind
  readonly heat: string
  readonly supplier: string
  readonly sizeMetres: number | undefined
  readonly lengthMetres: number | undefined
  readonly massKilograms: number | undefined
  readonly receivedAt: number | undefined
  readonly note: string
}

export interface MaterialInValues extends MaterialInFacts {
  readonly materialId: number | undefined
  readonly parentId: number | undefined
}

export interface MaterialInRow extends MaterialInFacts {
  readonly id: number
  readonly code: string
  readonly active: boolean
  readonly version: number
  /** What it is said to be, in the catalogue. */
  readonly material: { readonly id: number; readonly code: string; readonly name: string } | undefined
  /** The coil that it was wound from. */
  readonly parent: { readonly id: number; readonly code: string; readonly name: string } | undefined
}

const named = { select: { id: true, code: true, name: true } } as const

const select = {
  id: true,
  code: true,
  name: true,
  kind: true,
  heat: true,
  supplier: true,
  sizeMetres: true,
  lengthMetres: true,
  massKilograms: true,
  receivedAt: true,
  note: true,
  active: true,
  version: true,
  material: named,
  parent: named,
} as const

type Maybe = 'sizeMetres' | 'lengthMetres' | 'massKilograms' | 'material' | 'parent'

type Selected = Omit<MaterialInRow, Maybe | 'kind' | 'receivedAt'> & {
  readonly [Name in Maybe]: Exclude<MaterialInRow[Name], undefined> | null
} & { readonly kind: string; readonly receivedAt: Date | null }

const rowOf = (row: Selected): MaterialInRow => ({
  ...row,
  // The guard of the table allows no other word.
  kind: row.kind as MaterialInKind,
  sizeMetres: row.sizeMetres ?? undefined,
  lengthMetres: row.lengthMetres ?? undefined,
  massKilograms: row.massKilograms ?? undefined,
  receivedAt: row.receivedAt?.getTime(),
  material: row.material ?? undefined,
  parent: row.parent ?? undefined,
})

/** Found by code, name, heat and supplier. */
const data = (code: string, values: MaterialInValues) => ({
  name: values.name,
  kind: values.kind,
  heat: values.heat,
  supplier: values.supplier,
  note: values.note,
  materialId: values.materialId ?? null,
  parentId: values.parentId ?? null,
  sizeMetres: values.sizeMetres ?? null,
  lengthMetres: values.lengthMetres ?? null,
  massKilograms: values.massKilograms ?? null,
  receivedAt: dateOrNull(values.receivedAt),
  searchKey: searchKeyOf(code, values.name, values.heat, values.supplier),
})

export const materialsIn: EquipmentStore<MaterialInRow, MaterialInValues> = {
  list: async (tx) => (await tx.materialIn.findMany({ select, orderBy: [...inListOrder] })).map(rowOf),
  get: async (tx, code) => {
    const row = await tx.materialIn.findUnique({ where: { code }, select })
    return row ? rowOf(row) : undefined
  },
  insert: async (tx, code, values, at) =>
    rowOf(
      await tx.materialIn.create({ data: { code, ...data(code, values), createdAt: new Date(at) }, select }),
    ),
  update: async (tx, code, version, values) =>
    (
      await tx.materialIn.updateMany({
        where: { code, version },
        data: { ...data(code, values), version: { increment: 1 } },
      })
    ).count > 0,
  setActive: async (tx, code, version, active) =>
    (
      await tx.materialIn.updateMany({
        where: { code, version },
        data: { active, version: { increment: 1 } },
      })
    ).count > 0,
}

export interface MaterialInFilter {
  readonly search?: string
  readonly kind?: MaterialInKind
  readonly active?: boolean
}

const whereOf = ({ search, kind, active }: MaterialInFilter) => ({
  ...(search ? { searchKey: { contains: search.toLowerCase() } } : {}),
  ...(kind === undefined ? {} : { kind }),
  ...(active === undefined ? {} : { active }),
})

/** In use before put away; in each the newest entered first. */
export const listMaterialInRows = async (
  tx: Tx,
  filter: MaterialInFilter,
  { skip, take }: { readonly skip: number; readonly take: number },
): Promise<readonly (MaterialInRow & { readonly lotCount: number })[]> =>
  (
    await tx.materialIn.findMany({
      where: whereOf(filter),
      select: { ...select, _count: { select: { lots: true } } },
      orderBy: [{ active: 'desc' }, { createdAt: 'desc' }, { code: 'asc' }],
      skip,
      take,
    })
  ).map(({ _count, ...row }) => ({ ...rowOf(row), lotCount: _count.lots }))

export const countMaterialInRows = (tx: Tx, filter: MaterialInFilter): Promise<number> =>
  tx.materialIn.count({ where: whereOf(filter) })

/** By kind, the newest entered first. */
export const listMaterialsInUse = async (tx: Tx): Promise<readonly MaterialInRow[]> =>
  (
    await tx.materialIn.findMany({
      where: { active: true },
      select,
      orderBy: [{ kind: 'asc' }, { createdAt: 'desc' }, { code: 'asc' }],
    })
  ).map(rowOf)

/** Those with these codes, in no order. */
export const findMaterialsIn = async (tx: Tx, codes: readonly string[]): Promise<readonly MaterialInRow[]> =>
  codes.length === 0
    ? []
    : (await tx.materialIn.findMany({ where: { code: { in: [...codes] } }, select })).map(rowOf)

/** Spools wound from a coil, by code. */
export const listWoundFrom = async (tx: Tx, parentId: number): Promise<readonly MaterialInRow[]> =>
  (await tx.materialIn.findMany({ where: { parentId }, select, orderBy: { code: 'asc' } })).map(rowOf)

/** Whether a lot or a spool names it. */
export const isMaterialInNamed = async (tx: Tx, id: number): Promise<boolean> =>
  (await tx.lotMaterial.count({ where: { materialInId: id } })) > 0 ||
  (await tx.materialIn.count({ where: { parentId: id } })) > 0
