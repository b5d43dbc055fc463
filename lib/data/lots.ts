import type { LotState } from '@/lib/domain/record/lot-state'
import type { LotWriteState } from '@/lib/domain/record/write-state'
import type { Tx } from './database'
import { searchKeyOf } from './equipment-store'

/** A lot with the names of what it is made of and made with. Instants are epoch milliseconds. */
export interface LotRow {
  readonly id: number
  readonly code: string
  readonly state: LotState
  readonly version: number
  readonly evidenceChanged: boolean
  readonly madeAt: number
  /** When the first of its readings was taken. */
  readonly measuredAt: number | undefined
  readonly lengthMetres: number | undefined
  readonly setting: string
  readonly createdAt: number
  readonly createdById: number | undefined
  readonly makerId: number | undefined
  readonly product: {
    readonly id: number
    readonly code: string
    readonly name: string
    readonly construction: string
  }
  readonly specificationRevisionId: number
  readonly machine: { readonly id: number; readonly code: string; readonly name: string } | undefined
  readonly die: { readonly id: number; readonly code: string; readonly name: string } | undefined
}

const named = { select: { id: true, code: true, name: true } } as const

const select = {
  id: true,
  code: true,
  state: true,
  version: true,
  evidenceChanged: true,
  madeAt: true,
  measuredAt: true,
  lengthMetres: true,
  setting: true,
  createdAt: true,
  createdById: true,
  makerId: true,
  product: { select: { id: true, code: true, name: true, construction: true } },
  specificationRevisionId: true,
  machine: named,
  die: named,
} as const

interface Selected
  extends Omit<
    LotRow,
    | 'state'
    | 'madeAt'
    | 'measuredAt'
    | 'createdAt'
    | 'lengthMetres'
    | 'createdById'
    | 'makerId'
    | 'machine'
    | 'die'
  > {
  readonly state: string
  readonly madeAt: Date
  readonly measuredAt: Date | null
  readonly createdAt: Date
  readonly lengthMetres: number | null
  readonly createdById: number | null
  readonly makerId: number | null
  readonly machine: LotRow['machine'] | null
  readonly die: LotRow['die'] | null
}

const rowOf = (row: Selected): LotRow => ({
  ...row,
  // The guard of the table allows no other word.
  state: row.state as LotState,
  madeAt: row.madeAt.getTime(),
  measuredAt: row.measuredAt?.getTime(),
  createdAt: row.createdAt.getTime(),
  lengthMetres: row.lengthMetres ?? undefined,
  createdById: row.createdById ?? undefined,
  makerId: row.makerId ?? undefined,
  machine: row.machine ?? undefined,
  die: row.die ?? undefined,
})

/** A lot as the plan of a further entry needs it. */
export const lotWriteStateOf = (lot: LotRow): LotWriteState['lot'] => ({
  id: lot.id,
  code: lot.code,
  state: lot.state,
  version: lot.version,
  evidenceChanged: lot.evidenceChanged,
  productId: lot.product.id,
  machineId: lot.machine?.id ?? null,
  madeAt: lot.madeAt,
  ...(lot.measuredAt === undefined ? {} : { measuredAt: lot.measuredAt }),
})

export const findLotId = async (tx: Tx, code: string): Promise<number | undefined> =>
  (await tx.lot.findUnique({ where: { code }, select: { id: true } }))?.id

export const findLotByCode = async (tx: Tx, code: string): Promise<LotRow | undefined> => {
  const row = await tx.lot.findUnique({ where: { code }, select })
  return row ? rowOf(row) : undefined
}

export const getLotRow = async (tx: Tx, id: number): Promise<LotRow> =>
  rowOf(await tx.lot.findUniqueOrThrow({ where: { id }, select }))

export interface NewLot {
  readonly code: string
  readonly product: { readonly id: number; readonly code: string; readonly name: string }
  readonly specificationRevisionId: number
  readonly machineId: number | undefined
  readonly dieId: number | undefined
  readonly makerId: number | undefined
  readonly madeAt: number
  readonly lengthMetres: number | undefined
  readonly setting: string
  readonly at: number
  readonly personId: number
}

export const insertLot = async (tx: Tx, lot: NewLot): Promise<LotRow> =>
  rowOf(
    await tx.lot.create({
      data: {
        code: lot.code,
        searchKey: searchKeyOf(lot.code, lot.product.name, lot.product.code),
        productId: lot.product.id,
        specificationRevisionId: lot.specificationRevisionId,
        machineId: lot.machineId ?? null,
        dieId: lot.dieId ?? null,
        makerId: lot.makerId ?? null,
        madeAt: new Date(lot.madeAt),
        lengthMetres: lot.lengthMetres ?? null,
        setting: lot.setting,
        state: 'measuring',
        createdAt: new Date(lot.at),
        createdById: lot.personId,
      },
      select,
    }),
  )

/** Changes state and mark, and raises the version by one. @returns false when the version is another by now */
export const updateLotState = async (
  tx: Tx,
  lot: { readonly id: number; readonly version: number },
  change: {
    readonly state: LotState
    readonly evidenceChanged: boolean
    /** Epoch milliseconds. */
    readonly measuredAt?: number
  },
): Promise<boolean> =>
  (
    await tx.lot.updateMany({
      where: { id: lot.id, version: lot.version },
      data: {
        state: change.state,
        evidenceChanged: change.evidenceChanged,
        ...(change.measuredAt === undefined ? {} : { measuredAt: new Date(change.measuredAt) }),
        version: { increment: 1 },
      },
    })
  ).count > 0

export interface LotFilter {
  readonly search?: string
  readonly states?: readonly LotState[]
  readonly productCode?: string
}

const whereOf = ({ search, states, productCode }: LotFilter) => ({
  ...(search ? { searchKey: { contains: search.toLowerCase() } } : {}),
  ...(states ? { state: { in: [...states] } } : {}),
  ...(productCode ? { product: { code: productCode } } : {}),
})

/** Newest first. */
export const listLotRows = async (
  tx: Tx,
  filter: LotFilter,
  { skip, take }: { readonly skip: number; readonly take: number },
): Promise<readonly (LotRow & { readonly specimenCount: number })[]> =>
  (
    await tx.lot.findMany({
      where: whereOf(filter),
      select: { ...select, _count: { select: { specimens: true } } },
      orderBy: [{ madeAt: 'desc' }, { code: 'desc' }],
      skip,
      take,
    })
  ).map(({ _count, ...row }) => ({ ...rowOf(row), specimenCount: _count.specimens }))

/** Codes by id. */
export const listLotCodes = async (tx: Tx, ids: readonly number[]): Promise<ReadonlyMap<number, string>> => {
  if (ids.length === 0) return new Map()
  const rows = await tx.lot.findMany({ where: { id: { in: [...ids] } }, select: { id: true, code: true } })
  return new Map(rows.map((row) => [row.id, row.code]))
}

/** Marks lots whose decision rests on older evidence. */
export const markLots = async (tx: Tx, ids: readonly number[]): Promise<void> => {
  if (ids.length > 0)
    await tx.lot.updateMany({
      where: { id: { in: [...ids] } },
      data: { evidenceChanged: true, version: { increment: 1 } },
    })
}
