import type { LotState } from '@/lib/domain/record/lot-state'
import type { LotMaterialRole, MaterialInKind } from '@/lib/domain/record/material-in'
import type { Tx } from './database'

/** What went into a lot, as what and where along it. */
export interface LotMaterialRow {
  readonly lotId: number
  readonly role: LotMaterialRole
  /** From 1 within the role, along the lot. */
  readonly place: number
  readonly fromMetre: number | undefined
  readonly toMetre: number | undefined
  readonly materialInId: number
  readonly code: string
  readonly name: string
  readonly kind: MaterialInKind
  readonly heat: string
  /** The coil that a spool was wound from. */
  readonly parentCode: string | undefined
}

export interface NewLotMaterial {
  readonly role: LotMaterialRole
  readonly place: number
  readonly materialInId: number
  readonly fromMetre: number | undefined
  readonly toMetre: number | undefined
}

export const insertLotMaterials = async (
  tx: Tx,
  lotId: number,
  links: readonly NewLotMaterial[],
): Promise<void> => {
  if (links.length > 0)
    await tx.lotMaterial.createMany({
      data: links.map((link) => ({
        lotId,
        role: link.role,
        place: link.place,
        materialInId: link.materialInId,
        fromMetre: link.fromMetre ?? null,
        toMetre: link.toMetre ?? null,
      })),
    })
}

/** Takes all links of a lot away; the ledger keeps what they were. */
export const deleteLotMaterials = async (tx: Tx, lotId: number): Promise<void> => {
  await tx.lotMaterial.deleteMany({ where: { lotId } })
}

/** Links in one question: engines allow some thousand values in a list. */
const AT_ONCE = 500

/** The links of lots, by the lot's id, by role and place; lots without any are left out. */
export async function listLotMaterials(
  tx: Tx,
  lotIds: readonly number[],
): Promise<ReadonlyMap<number, readonly LotMaterialRow[]>> {
  const found = new Map<number, LotMaterialRow[]>()
  for (let from = 0; from < lotIds.length; from += AT_ONCE) {
    const rows = await tx.lotMaterial.findMany({
      where: { lotId: { in: lotIds.slice(from, from + AT_ONCE) } },
      select: {
        lotId: true,
        role: true,
        place: true,
        fromMetre: true,
        toMetre: true,
        materialIn: {
          select: {
            id: true,
            code: true,
            name: true,
            kind: true,
            heat: true,
            parent: { select: { code: true } },
          },
        },
      },
      orderBy: [{ lotId: 'asc' }, { role: 'asc' }, { place: 'asc' }],
    })
    for (const { materialIn, ...row } of rows) {
      const links = found.get(row.lotId) ?? []
      found.set(row.lotId, links)
      links.push({
        lotId: row.lotId,
        // The guards of the tables allow no other words.
        role: row.role as LotMaterialRole,
        kind: materialIn.kind as MaterialInKind,
        place: row.place,
        fromMetre: row.fromMetre ?? undefined,
        toMetre: row.toMetre ?? undefined,
        materialInId: materialIn.id,
        code: materialIn.code,
        name: materialIn.name,
        heat: materialIn.heat,
        parentCode: materialIn.parent?.code,
      })
    }
  }
  return found
}

/** A lot that a material went into. */
export interface MadeOfRow {
  readonly lotCode: string
  readonly state: LotState
  readonly madeAt: number
  readonly lengthMetres: number | undefined
  readonly productCode: string
  readonly productName: string
  readonly role: LotMaterialRole
  readonly place: number
  readonly fromMetre: number | undefined
  readonly toMetre: number | undefined
  /** Which of the materials asked for. */
  readonly code: string
}

export const countMadeOf = (tx: Tx, materialInIds: readonly number[]): Promise<number> =>
  tx.lotMaterial.count({ where: { materialInId: { in: [...materialInIds] } } })

/** Lots made of any of these materials, newest first. */
export const listMadeOf = async (
  tx: Tx,
  materialInIds: readonly number[],
  take: number,
): Promise<readonly MadeOfRow[]> =>
  (
    await tx.lotMaterial.findMany({
      where: { materialInId: { in: [...materialInIds] } },
      select: {
        role: true,
        place: true,
        fromMetre: true,
        toMetre: true,
        materialIn: { select: { code: true } },
        lot: {
          select: {
            code: true,
            state: true,
            madeAt: true,
            lengthMetres: true,
            product: { select: { code: true, name: true } },
          },
        },
      },
      orderBy: [{ lot: { madeAt: 'desc' } }, { lot: { code: 'desc' } }, { role: 'asc' }, { place: 'asc' }],
      take,
    })
  ).map(({ lot, materialIn, ...row }) => ({
    lotCode: lot.code,
    state: lot.state as LotState,
    madeAt: lot.madeAt.getTime(),
    lengthMetres: lot.lengthMetres ?? undefined,
    productCode: lot.product.code,
    productName: lot.product.name,
    role: row.role as LotMaterialRole,
    place: row.place,
    fromMetre: row.fromMetre ?? undefined,
    toMetre: row.toMetre ?? undefined,
    code: materialIn.code,
  }))
