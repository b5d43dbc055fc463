/** What waits beside lots, for Today: each list is bounded, its count is not. */
import type { Tx } from './database'

/** Unanswered signals, oldest first. */
export async function listSignalsOfToday(tx: Tx, take: number) {
  const where = { state: 'open' }
  const rows = await tx.signal.findMany({
    where,
    orderBy: [{ raisedAt: 'asc' }, { id: 'asc' }],
    take,
    select: {
      id: true,
      characteristic: true,
      statistic: true,
      rule: true,
      side: true,
      departure: true,
      members: true,
      machineId: true,
      raisedAt: true,
      product: { select: { code: true, name: true } },
    },
  })
  const signals = rows.map(({ members, machineId, raisedAt, ...row }) => ({
    ...row,
    members: JSON.parse(members) as readonly number[],
    machineId: machineId ?? undefined,
    raisedAt: raisedAt.getTime(),
  }))
  return { signals, count: await tx.signal.count({ where }) }
}

/** Codes and states of lots by id. */
export const listLotStates = async (tx: Tx, ids: readonly number[]) =>
  new Map(
    (
      await tx.lot.findMany({
        where: { id: { in: [...new Set(ids)] } },
        select: { id: true, code: true, state: true },
      })
    ).map((row) => [row.id, row]),
  )

const columnOf = {
  micrometer: 'micrometerId',
  balance: 'balanceId',
  rule: 'ruleId',
  counter: 'counterId',
} as const

/** How many readings of lots made from a moment on name each of these gauges, by the gauge's id. */
export async function countReadingsOf(
  tx: Tx,
  gauges: readonly { readonly id: number; readonly kind: string }[],
  madeFrom: number,
): Promise<ReadonlyMap<number, number>> {
  const counts = new Map<number, number>()
  for (const [kind, column] of Object.entries(columnOf)) {
    const ids = gauges.filter((one) => one.kind === kind).map(({ id }) => id)
    if (ids.length === 0) continue
    const rows = await tx.reading.groupBy({
      by: [column],
      where: { [column]: { in: ids }, specimen: { lot: { madeAt: { gte: new Date(madeFrom) } } } },
      _count: { _all: true },
    })
    for (const row of rows) {
      const id = row[column]
      if (id !== null) counts.set(id, row._count._all)
    }
  }
  return counts
}

/** Imports with open rows, oldest first; with how many rows were refused and how many differ. */
export async function listImportsWithOpenRows(tx: Tx, take: number, personId?: number) {
  const where = {
    rows: { some: { state: 'open' } },
    ...(personId === undefined ? {} : { createdById: personId }),
  }
  const imports = await tx.import.findMany({
    where,
    orderBy: [{ createdAt: 'asc' }, { id: 'asc' }],
    take,
    select: { id: true, fileName: true, createdAt: true },
  })
  const rows = await tx.importRow.groupBy({
    by: ['importId', 'kind'],
    where: { importId: { in: imports.map(({ id }) => id) }, state: 'open' },
    _count: { _all: true },
  })
  const countOf = (id: number, kind: string): number =>
    rows.find((row) => row.importId === id && row.kind === kind)?._count._all ?? 0
  return {
    imports: imports.map(({ createdAt, ...one }) => ({
      ...one,
      at: createdAt.getTime(),
      refused: countOf(one.id, 'refused'),
      differing: countOf(one.id, 'differs'),
    })),
    count: await tx.import.count({ where }),
  }
}

/** Imports that failed from a moment on, oldest first. */
export async function listFailedImports(tx: Tx, from: number, take: number) {
  const where = { state: 'failed', createdAt: { gte: new Date(from) } }
  const imports = await tx.import.findMany({
    where,
    orderBy: [{ createdAt: 'asc' }, { id: 'asc' }],
    take,
    select: { id: true, fileName: true, message: true, createdAt: true },
  })
  return {
    imports: imports.map(({ createdAt, ...one }) => ({ ...one, at: createdAt.getTime() })),
    count: await tx.import.count({ where }),
  }
}

/** Products in use without limits in force, and those with provisional ones, each with its charted lots. */
export async function listLimitNeeds(tx: Tx) {
  const product = { id: true, code: true, name: true } as const
  const bare = await tx.product.findMany({
    where: { active: true, limitSets: { none: { supersededAt: null } } },
    select: product,
  })
  const provisional = await tx.limitSet.findMany({
    where: { supersededAt: null, provisional: true, product: { active: true } },
    select: { frozenAt: true, lotCount: true, product: { select: product } },
    orderBy: { frozenAt: 'asc' },
  })
  const ids = new Set([...bare.map(({ id }) => id), ...provisional.map((set) => set.product.id)])
  const lots = await tx.lot.groupBy({
    by: ['productId'],
    where: { productId: { in: [...ids] }, state: { not: 'measuring' } },
    _count: { _all: true },
  })
  const lotsOf = new Map(lots.map((row) => [row.productId, row._count._all]))
  return {
    bare: bare.map((one) => ({ ...one, lots: lotsOf.get(one.id) ?? 0 })),
    provisional: provisional.map(({ frozenAt, lotCount, product: one }) => ({
      ...one,
      frozenAt: frozenAt.getTime(),
      restsOn: lotCount,
      lots: lotsOf.get(one.id) ?? 0,
    })),
  }
}

/** Newest revisions that rest on changed evidence; and revisions superseded from a moment on. */
export async function listRevisionsOfToday(tx: Tx, supersededFrom: number, take: number) {
  const select = {
    number: true,
    publishedAt: true,
    supersededAt: true,
    datasheet: { select: { code: true, product: { select: { name: true, code: true } } } },
  } as const
  const changed = { supersededAt: null, evidenceChanged: true }
  const superseded = { supersededAt: { gte: new Date(supersededFrom) } }
  const rowsOf = (where: typeof changed | typeof superseded) =>
    tx.datasheetRevision.findMany({ where, select, orderBy: [{ publishedAt: 'asc' }, { id: 'asc' }], take })
  const plain = ({
    datasheet,
    publishedAt,
    supersededAt,
    number,
  }: Awaited<ReturnType<typeof rowsOf>>[number]) => ({
    number,
    code: datasheet.code,
    productName: datasheet.product.name,
    productCode: datasheet.product.code,
    publishedAt: publishedAt.getTime(),
    supersededAt: supersededAt?.getTime(),
  })
  return {
    changed: (await rowsOf(changed)).map(plain),
    changedCount: await tx.datasheetRevision.count({ where: changed }),
    superseded: (await rowsOf(superseded)).map(plain),
  }
}

/** Products in use with released lots and no datasheet, with how many lots; and those released from a moment on. */
export async function listSalesNeeds(tx: Tx, releasedFrom: number, take: number) {
  const where = { active: true, datasheets: { none: {} }, lots: { some: { state: 'released' } } }
  const products = await tx.product.findMany({
    where,
    orderBy: { code: 'asc' },
    take,
    select: { id: true, code: true, name: true },
  })
  const lots = await tx.lot.groupBy({
    by: ['productId'],
    where: { productId: { in: products.map(({ id }) => id) }, state: 'released' },
    _count: { _all: true },
  })
  const released = await tx.disposition.findMany({
    where: { verb: 'release', current: true, decidedAt: { gte: new Date(releasedFrom) } },
    orderBy: [{ decidedAt: 'asc' }, { id: 'asc' }],
    take: take * take,
    select: {
      decidedAt: true,
      lot: {
        select: {
          code: true,
          product: {
            select: { code: true, name: true, datasheets: { select: { code: true }, take: 1 } },
          },
        },
      },
    },
  })
  return {
    bare: products.map((one) => ({
      ...one,
      lots: lots.find((row) => row.productId === one.id)?._count._all ?? 0,
    })),
    bareCount: await tx.product.count({ where }),
    released: released.map(({ decidedAt, lot }) => ({
      at: decidedAt.getTime(),
      lotCode: lot.code,
      productCode: lot.product.code,
      productName: lot.product.name,
      datasheetCode: lot.product.datasheets[0]?.code,
    })),
  }
}

/** Active people without a role, by name. */
export async function listPeopleWithoutRole(tx: Tx, take: number) {
  const where = { active: true, roles: { none: {} } }
  const people = await tx.person.findMany({
    where,
    orderBy: [{ searchKey: 'asc' }, { id: 'asc' }],
    take,
    select: { id: true, name: true, createdAt: true },
  })
  return {
    people: people.map(({ createdAt, ...one }) => ({ ...one, at: createdAt.getTime() })),
    count: await tx.person.count({ where }),
  }
}
