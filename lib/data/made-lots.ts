import type { LotState } from '@/lib/domain/record/lot-state'
import type { MadeLot } from '@/lib/domain/record/metres-made'
import type { Tx } from './database'

/** A lot that came off a machine or through a die. */
export interface MadeLotRow extends MadeLot {
  readonly code: string
  readonly state: LotState
  readonly productCode: string
  readonly productName: string
}

/** Every lot made on a machine or through a die, newest first. */
export const listMadeLots = async (
  tx: Tx,
  where: { readonly machineId: number } | { readonly dieId: number },
): Promise<readonly MadeLotRow[]> =>
  (
    await tx.lot.findMany({
      where,
      select: {
        code: true,
        state: true,
        madeAt: true,
        lengthMetres: true,
        product: { select: { code: true, name: true } },
      },
      orderBy: [{ madeAt: 'desc' }, { code: 'desc' }],
    })
  ).map(({ product, ...row }) => ({
    ...row,
    // The guard of the table allows no other word.
    state: row.state as LotState,
    madeAt: row.madeAt.getTime(),
    lengthMetres: row.lengthMetres ?? undefined,
    productCode: product.code,
    productName: product.name,
  }))

export interface DrawnRow {
  readonly dieId: number
  readonly lots: number
  readonly metres: number
  readonly withoutLength: number
}

/** Metres drawn through each die that made a lot. */
export const sumDrawn = async (tx: Tx): Promise<readonly DrawnRow[]> =>
  (
    await tx.lot.groupBy({
      by: ['dieId'],
      where: { dieId: { not: null } },
      _sum: { lengthMetres: true },
      _count: { _all: true, lengthMetres: true },
    })
  ).flatMap(({ dieId, _sum, _count }) =>
    dieId === null
      ? []
      : [
          {
            dieId,
            lots: _count._all,
            metres: _sum.lengthMetres ?? 0,
            withoutLength: _count._all - _count.lengthMetres,
          },
        ],
  )
