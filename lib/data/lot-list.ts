import { MODEL_VERSION } from '@/lib/domain/metrology/model-version'
import { type LotListItem, listedCharacteristics } from '@/lib/domain/record/lot-columns'
import type { LotState } from '@/lib/domain/record/lot-state'
import type { Tx } from './database'
import { countOpenSignals } from './lot-selection'
import { listPersonNames } from './people-names'

/** Lots read at a time: far fewer than a statement may have parameters. */
const AT_A_TIME = 500

const listed: string[] = [...listedCharacteristics]

const select = {
  id: true,
  code: true,
  state: true,
  evidenceChanged: true,
  madeAt: true,
  measuredAt: true,
  lengthMetres: true,
  makerId: true,
  product: { select: { code: true, name: true, family: true } },
  machine: { select: { name: true } },
  die: { select: { name: true } },
  materials: {
    orderBy: { place: 'asc' },
    select: { role: true, materialIn: { select: { code: true } } },
  },
  summaries: {
    where: { modelVersion: MODEL_VERSION, characteristic: { in: listed } },
    select: { characteristic: true, n: true, mean: true, m2: true },
  },
  _count: { select: { specimens: true } },
} as const

/** From the inside out. */
const roles = ['core', 'wrap-1', 'wrap-2', 'resin']
const inside = (role: string): number => roles.indexOf(role)

/**
 * Lots as a list shows them, in the order of their ids here. The number of queries does not depend on how many lots
 * there are, up to some hundreds at a time.
 */
export async function listLotItems(tx: Tx, ids: readonly number[]): Promise<readonly LotListItem[]> {
  const items: LotListItem[] = []
  for (let first = 0; first < ids.length; first += AT_A_TIME)
    items.push(...(await readItems(tx, ids.slice(first, first + AT_A_TIME))))
  return items
}

async function readItems(tx: Tx, ids: readonly number[]): Promise<readonly LotListItem[]> {
  const rows = await tx.lot.findMany({ where: { id: { in: [...ids] } }, select })
  const signals = await countOpenSignals(tx, ids)
  const names = await listPersonNames(
    tx,
    rows.flatMap(({ makerId }) => makerId ?? []),
  )
  const byId = new Map(
    rows.map((row): [number, LotListItem] => [
      row.id,
      {
        code: row.code,
        // The guard of the table allows no other word.
        state: row.state as LotState,
        productCode: row.product.code,
        productName: row.product.name,
        family: row.product.family,
        machine: row.machine?.name,
        die: row.die?.name,
        materials: row.materials
          .map(({ role, materialIn }) => ({ role, code: materialIn.code }))
          .sort((a, b) => inside(a.role) - inside(b.role)),
        maker: row.makerId === null ? undefined : names.get(row.makerId),
        madeAt: row.madeAt.getTime(),
        measuredAt: row.measuredAt?.getTime(),
        lengthMetres: row.lengthMetres ?? undefined,
        specimens: row._count.specimens,
        evidenceChanged: row.evidenceChanged,
        openSignals: signals.get(row.id) ?? 0,
        summaries: Object.fromEntries(
          row.summaries.map(({ characteristic, ...summary }) => [characteristic, summary]),
        ),
      },
    ]),
  )
  return ids.flatMap((id) => byId.get(id) ?? [])
}

/** What lots can be chosen by: products with their families; machines and dies, those in use first. */
export const listLotChoiceRows = async (tx: Tx) => ({
  products: await tx.product.findMany({
    select: { code: true, name: true, family: true },
    orderBy: [{ active: 'desc' }, { family: 'asc' }, { code: 'asc' }],
  }),
  machines: await tx.machine.findMany({
    select: { code: true, name: true },
    orderBy: [{ active: 'desc' }, { code: 'asc' }],
  }),
  dies: await tx.die.findMany({
    select: { code: true, name: true },
    orderBy: [{ active: 'desc' }, { code: 'asc' }],
  }),
})
