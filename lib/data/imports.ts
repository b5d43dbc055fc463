import type { Tx } from './database'

export const importStates = ['draft', 'queued', 'running', 'done', 'cancelled', 'failed'] as const

export type ImportState = (typeof importStates)[number]

export interface ImportCounts {
  readonly rowsDone: number
  readonly stored: number
  readonly alreadyThere: number
  readonly differing: number
  readonly refused: number
  readonly lotsOpened: number
}

export interface ImportFacts extends ImportCounts {
  readonly id: number
  readonly fileName: string
  readonly sha256: string
  readonly bytes: number
  readonly format: 'csv' | 'xlsx'
  readonly state: ImportState
  /** Canonical JSON of ImportOptions. */
  readonly options: string
  readonly rowCount: number | undefined
  readonly cancelAsked: boolean
  readonly message: string
  readonly createdAt: number
  readonly createdById: number
  readonly startedAt: number | undefined
  readonly endedAt: number | undefined
  readonly version: number
}

const select = {
  id: true,
  fileName: true,
  sha256: true,
  bytes: true,
  format: true,
  state: true,
  options: true,
  rowCount: true,
  rowsDone: true,
  stored: true,
  alreadyThere: true,
  differing: true,
  refused: true,
  lotsOpened: true,
  cancelAsked: true,
  message: true,
  createdAt: true,
  createdById: true,
  startedAt: true,
  endedAt: true,
  version: true,
} as const

interface Selected
  extends Omit<ImportFacts, 'format' | 'state' | 'rowCount' | 'createdAt' | 'startedAt' | 'endedAt'> {
  readonly format: string
  readonly state: string
  readonly rowCount: number | null
  readonly createdAt: Date
  readonly startedAt: Date | null
  readonly endedAt: Date | null
}

const factsOf = (row: Selected): ImportFacts => ({
  ...row,
  // The guards of the table allow no other words.
  format: row.format as ImportFacts['format'],
  state: row.state as ImportState,
  rowCount: row.rowCount ?? undefined,
  createdAt: row.createdAt.getTime(),
  startedAt: row.startedAt?.getTime(),
  endedAt: row.endedAt?.getTime(),
})

export const findImport = async (tx: Tx, id: number): Promise<ImportFacts | undefined> => {
  const row = await tx.import.findUnique({ where: { id }, select })
  return row ? factsOf(row) : undefined
}

/** Newest first. */
export const listImportRows = async (tx: Tx, take = 100): Promise<readonly ImportFacts[]> =>
  (await tx.import.findMany({ select, orderBy: [{ createdAt: 'desc' }, { id: 'desc' }], take })).map(factsOf)

/** The import that is worked on next: one under way, else the one that waits longest. */
export const nextImport = async (tx: Tx): Promise<ImportFacts | undefined> => {
  for (const state of ['running', 'queued']) {
    const row = await tx.import.findFirst({ where: { state }, select, orderBy: { id: 'asc' } })
    if (row) return factsOf(row)
  }
  return undefined
}

/** Earlier runs of the same file, newest first. */
export const listImportsOfFile = async (tx: Tx, sha256: string): Promise<readonly ImportFacts[]> =>
  (await tx.import.findMany({ where: { sha256 }, select, orderBy: { id: 'desc' }, take: 20 })).map(factsOf)

export interface NewImport {
  readonly fileName: string
  readonly sha256: string
  readonly bytes: number
  readonly format: 'csv' | 'xlsx'
  readonly options: string
  readonly at: number
  readonly personId: number
}

export const insertImport = async (tx: Tx, { at, personId, ...row }: NewImport): Promise<ImportFacts> =>
  factsOf(
    await tx.import.create({
      data: { ...row, state: 'draft', createdAt: new Date(at), createdById: personId },
      select,
    }),
  )

/** @returns false when it has another version by now, or is in none of these states */
export const changeImport = async (
  tx: Tx,
  {
    id,
    states,
    version,
  }: { readonly id: number; readonly states: readonly ImportState[]; readonly version?: number },
  data: {
    readonly state?: ImportState
    readonly options?: string
    readonly cancelAsked?: boolean
    readonly startedAt?: Date
    readonly endedAt?: Date
    readonly message?: string
  },
): Promise<boolean> =>
  (
    await tx.import.updateMany({
      where: { id, state: { in: [...states] }, ...(version === undefined ? {} : { version }) },
      data: { ...data, version: { increment: 1 } },
    })
  ).count > 0

export interface ImportRowFacts {
  readonly id: number
  readonly row: number
  readonly line: number
  readonly kind: 'refused' | 'differs'
  readonly lotCode: string
  readonly specimen: number | undefined
  /** Canonical JSON of Problem[]. */
  readonly problems: string
  readonly cells: string
  readonly entry: string
  readonly state: 'open' | 'kept-stored' | 'took-file'
  readonly reason: string
  readonly decidedAt: number | undefined
  readonly decidedById: number | undefined
}

const rowSelect = {
  id: true,
  row: true,
  line: true,
  kind: true,
  lotCode: true,
  specimen: true,
  problems: true,
  cells: true,
  entry: true,
  state: true,
  reason: true,
  decidedAt: true,
  decidedById: true,
} as const

interface SelectedRow
  extends Omit<ImportRowFacts, 'kind' | 'state' | 'specimen' | 'decidedAt' | 'decidedById'> {
  readonly kind: string
  readonly state: string
  readonly specimen: number | null
  readonly decidedAt: Date | null
  readonly decidedById: number | null
}

const rowFactsOf = (row: SelectedRow): ImportRowFacts => ({
  ...row,
  kind: row.kind as ImportRowFacts['kind'],
  state: row.state as ImportRowFacts['state'],
  specimen: row.specimen ?? undefined,
  decidedAt: row.decidedAt?.getTime(),
  decidedById: row.decidedById ?? undefined,
})

/** Rows of an import that were set aside, in the order of the file. */
export const listSetAside = async (
  tx: Tx,
  importId: number,
  kind: ImportRowFacts['kind'],
  { after = 0, take }: { readonly after?: number; readonly take: number },
): Promise<readonly ImportRowFacts[]> =>
  (
    await tx.importRow.findMany({
      where: { importId, kind, row: { gt: after } },
      select: rowSelect,
      orderBy: { row: 'asc' },
      take,
    })
  ).map(rowFactsOf)

export const countSetAside = (
  tx: Tx,
  importId: number,
  kind: ImportRowFacts['kind'],
  state: ImportRowFacts['state'],
): Promise<number> => tx.importRow.count({ where: { importId, kind, state } })

/** Rows of one import by their ids. */
export const findSetAside = async (
  tx: Tx,
  importId: number,
  ids: readonly number[],
): Promise<readonly ImportRowFacts[]> =>
  (
    await tx.importRow.findMany({
      where: { importId, id: { in: [...ids] } },
      select: rowSelect,
      orderBy: { row: 'asc' },
    })
  ).map(rowFactsOf)

/** Answers rows that are still open. @returns how many were */
export const decideSetAside = async (
  tx: Tx,
  ids: readonly number[],
  decision: {
    readonly state: 'kept-stored' | 'took-file'
    readonly reason: string
    readonly at: number
    readonly personId: number
  },
): Promise<number> =>
  (
    await tx.importRow.updateMany({
      where: { id: { in: [...ids] }, state: 'open' },
      data: {
        state: decision.state,
        reason: decision.reason,
        decidedAt: new Date(decision.at),
        decidedById: decision.personId,
      },
    })
  ).count
