import { setImmediate as pause } from 'node:timers/promises'
import type { BulkConnection } from '@/lib/data/bulk/bulk-connection'
import { appendBulkLedger, bulkLedgerHead } from '@/lib/data/bulk/bulk-ledger'
import { bulkTables } from '@/lib/data/bulk/bulk-tables'
import { endImport } from '@/lib/data/bulk/end-import'
import { storeBatch } from '@/lib/data/bulk/store-batch'
import type { Tx } from '@/lib/data/database'
import { isBusy, isSerialisationFailure } from '@/lib/data/db-errors'
import { sha256 } from '@/lib/data/hash'
import { findImport, type ImportFacts } from '@/lib/data/imports'
import type { Problem } from '@/lib/domain/errors'
import { canonicalJson } from '@/lib/domain/record/canonical-json'
import { readBenchRow } from '@/lib/input/bench-file/bench-row'
import type { BenchColumn } from '@/lib/input/bench-file/columns'
import { type ImportOptions, layoutOf } from '@/lib/input/bench-file/layout'
import { placedIn } from '@/lib/input/bench-file/row-problem'
import { BatchPlanner, type Importer, type PlannedBatch, type ReadRow, type SetAside } from './batch-planner'
import { type FileRow, readFileRows } from './file-rows'
import { LinesOfSpecimens } from './lines-of-specimens'

export interface ImportRun {
  readonly read: Tx
  readonly connection: BulkConnection
  readonly importer: Importer
  readonly timeZone: string
  /** The file, and how many rows a batch has at most. */
  readonly path: string
  readonly batchRows?: number
  /** Told after each batch. */
  readonly progress?: (rowsDone: number) => void
  /** Asked before each batch, besides the mark that a person sets. */
  readonly stopAsked?: () => boolean
  readonly now?: () => number
}

/** Rows a transaction: what is lost when the process dies, and how long others wait for the file. */
export const BATCH_ROWS = 200

/** After so many batches that somebody wrote under, a batch is planned while it holds the lock. */
const PATIENT_TRIES = 6
const MOST_TRIES = 40

/**
 * Works through an import from where it stands: rows are read, checked, planned and stored batch by batch, each with
 * its counters and position in one transaction, so that a run that was killed goes on exactly where it stood.
 * @returns how it ended; `stopped` when the process is asked to end: the run goes on at the next start
 */
export async function runImport(id: number, run: ImportRun): Promise<'done' | 'cancelled' | 'stopped'> {
  const facts = await findImport(run.read, id)
  if (!facts) throw new Error(`import ${id} is not there`)
  const options = JSON.parse(facts.options) as ImportOptions
  const planner = new BatchPlanner(run.read, run.connection, run.importer)
  const reader = new RowReader(options, run.timeZone)
  let position = facts.rowsDone
  let batch: FileRow[] = []
  const most = run.batchRows ?? BATCH_ROWS
  for await (const record of readFileRows(run.path, options.delimiter)) {
    if ('headers' in record) {
      reader.begin(record.headers)
      continue
    }
    // Rows that are dealt with are only looked at for what is said twice in the file.
    if (record.row <= facts.rowsDone) {
      reader.read(record)
      continue
    }
    batch.push(record)
    if (batch.length < most) continue
    const ended = await endAsked(id, run)
    if (ended) return ended
    await storeRows(facts, batch, reader, planner, run)
    position = record.row
    batch = []
    run.progress?.(position)
    // Others get their turn at the file.
    await pause()
  }
  const ended = await endAsked(id, run)
  if (ended) return ended
  if (batch.length > 0) await storeRows(facts, batch, reader, planner, run)
  await finish(id, 'done', run)
  return 'done'
}

async function endAsked(id: number, run: ImportRun): Promise<'cancelled' | 'stopped' | undefined> {
  if (run.stopAsked?.()) return 'stopped'
  const [row] = await run.connection.rows<{ readonly cancelAsked: number | boolean }>(
    'SELECT "cancelAsked" FROM "Import" WHERE "id" = ?',
    id,
  )
  if (!row?.cancelAsked) return undefined
  await finish(id, 'cancelled', run)
  return 'cancelled'
}

const finish = (
  id: number,
  state: 'done' | 'cancelled',
  { connection, importer, now = Date.now }: ImportRun,
) => endImport(connection, id, { state, at: now(), personId: importer.personId })

/** Reads and checks rows, and remembers which specimens the file has named already. */
class RowReader {
  private headers: readonly string[] = []
  private columns: readonly BenchColumn[] = []
  /** Where each specimen of the file stands. */
  private readonly lines = new LinesOfSpecimens()

  constructor(
    private readonly options: ImportOptions,
    private readonly timeZone: string,
  ) {}

  begin(headers: readonly string[]): void {
    const layout = layoutOf(headers, this.options.columns)
    if (!layout.ok) throw new Error(layout.problems.map((one) => one.message).join(' '))
    this.headers = headers
    this.columns = layout.value
  }

  /** A row set aside, its problems told by the headers of this file. */
  placed(row: SetAside): SetAside {
    return { ...row, problems: placedIn(row.problems, row.cells, this.headers, this.columns) }
  }

  read(record: FileRow): ReadRow | SetAside {
    const { line, row } = record
    if ('broken' in record)
      return setAside(record, [record.text], '', undefined, [
        { code: 'bad-input', message: record.broken, mend: 'Mend the line, or take it out.' },
      ])
    const bench = readBenchRow(record.cells, {
      headers: this.headers,
      columns: this.columns,
      decimal: this.options.decimal,
      timeZone: this.timeZone,
    })
    if (!bench.ok) return setAside(record, record.cells, '', undefined, bench.problems)
    const { lot, specimen } = bench.value
    const before = this.lines.find(lot, specimen)
    if (before !== undefined)
      return setAside(record, record.cells, lot, specimen, [
        {
          code: 'conflict',
          message: `Specimen ${specimen} of ${lot} stands on line ${before} already.`,
          where: 'specimen',
          mend: 'Correct the number, or keep one of the two rows.',
          details: { value: String(specimen) },
        },
      ])
    this.lines.note(lot, specimen, line)
    return { row, line, cells: record.cells, bench: bench.value }
  }
}

const setAside = (
  { line, row }: FileRow,
  cells: readonly string[],
  lotCode: string,
  specimen: number | undefined,
  problems: readonly Problem[],
): SetAside => ({ row, line, cells, kind: 'refused', lotCode, specimen, problems, entry: '' })

const isSetAside = (one: ReadRow | SetAside): one is SetAside => 'problems' in one

async function storeRows(
  facts: ImportFacts,
  batch: readonly FileRow[],
  reader: RowReader,
  planner: BatchPlanner,
  run: ImportRun,
): Promise<void> {
  const read = batch.map((record) => reader.read(record))
  const good = read.flatMap((one) => (isSetAside(one) ? [] : [one]))
  const bad = read.filter(isSetAside)
  for (let tries = 1; ; tries += 1) {
    const held = tries > PATIENT_TRIES
    const at = (run.now ?? Date.now)()
    try {
      if (held) {
        await run.connection.begin()
        await bulkLedgerHead(run.connection, true)
      }
      const planned = await planner.plan(good, at)
      if (!held) await run.connection.begin()
      const head = await bulkLedgerHead(run.connection, true)
      if (head.count === planned.ledgerCount) {
        const aside = [...bad, ...planned.setAside]
          .map((one) => reader.placed(one))
          .sort((a, b) => a.row - b.row)
        const count = await storePlanned(facts, { batch, aside, planned, at, head }, run)
        await run.connection.commit()
        planner.stored(count)
        return
      }
    } catch (error) {
      await run.connection.rollback()
      planner.forget()
      // On PostgreSQL two transactions may stand in each other's way; one of them begins again.
      if (tries < MOST_TRIES && (isSerialisationFailure(error) || isBusy(error))) continue
      throw error
    }
    // Somebody wrote while the batch was planned: it is planned anew on what they left.
    await run.connection.rollback()
    planner.forget()
  }
}

interface Storing {
  readonly batch: readonly FileRow[]
  readonly aside: readonly SetAside[]
  readonly planned: PlannedBatch
  readonly at: number
  readonly head: Awaited<ReturnType<typeof bulkLedgerHead>>
}

/** Lots, rows set aside, counters, position and ledger entry of a batch. @returns the ledger's new count */
async function storePlanned(
  { id, sha256: file }: ImportFacts,
  { aside, at, batch, head, planned }: Storing,
  { connection, importer }: ImportRun,
): Promise<number> {
  if (planned.lots.length > 0) await storeBatch(connection, planned.lots, planned.equipment)
  await connection.insert(
    bulkTables.importRow,
    aside.map(({ problems, cells, specimen, ...row }) => ({
      ...row,
      importId: id,
      specimen: specimen ?? null,
      problems: canonicalJson(problems),
      cells: canonicalJson(cells.map(storable)),
    })),
  )
  const first = batch[0]?.row ?? 0
  const last = batch.at(-1)?.row ?? 0
  const differing = aside.filter((one) => one.kind === 'differs').length
  await connection.run(
    'UPDATE "Import" SET "rowsDone" = ?, "stored" = "stored" + ?, "alreadyThere" = "alreadyThere" + ?, "differing" = "differing" + ?, "refused" = "refused" + ?, "lotsOpened" = "lotsOpened" + ?, "version" = "version" + 1 WHERE "id" = ?',
    last,
    planned.stored,
    planned.alreadyThere,
    differing,
    aside.length - differing,
    planned.lotsOpened,
    id,
  )
  const readings = planned.lots.flatMap(({ plan }) => plan.readings.map((one) => one.hash))
  const next = await appendBulkLedger(connection, head, {
    at,
    personId: importer.personId,
    verb: 'import-rows',
    subject: `import ${id}`,
    body: {
      file,
      rows: { from: first, to: last },
      stored: planned.stored,
      alreadyThere: planned.alreadyThere,
      differing,
      refused: aside.length - differing,
      lotsOpened: planned.lotsOpened,
      // Over the hashes of all readings of the batch, in the order of the file's lots.
      readings: sha256(readings.join('\n')),
    },
  })
  return next.count
}

/** A cell as it may be stored: what can't be is shown by its replacement sign, and the file itself is kept. */
const storable = (cell: string): string => cell.replace(/(?![\n\r\t])[\p{Cc}\p{Surrogate}]/gu, '\uFFFD')
