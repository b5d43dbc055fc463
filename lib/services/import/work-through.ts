import { join } from 'node:path'
import type { Role } from '@/lib/access/actor'
import { may } from '@/lib/access/permit'
import type { BulkConnection, BulkValue } from '@/lib/data/bulk/bulk-connection'
import { endImport } from '@/lib/data/bulk/end-import'
import type { Tx } from '@/lib/data/database'
import { type ImportFacts, nextImport } from '@/lib/data/imports'
import { getPerson } from '@/lib/data/people'
import { getWorks } from '@/lib/data/works'
import { LedgerlineError } from '@/lib/domain/errors'
import type { ImportOptions } from '@/lib/input/bench-file/layout'
import { readFileRows } from './file-rows'
import { runImport } from './run-import'

/** What the thread tells the server: how far, how fast. Nothing of it is stored. */
export interface ImportProgress {
  readonly importId: number
  readonly rowsDone: number
  /** Over the last seconds of this run. */
  readonly rowsPerSecond: number
}

export interface Workplace {
  readonly connection: BulkConnection
  readonly read: Tx
  readonly dataDir: string
  readonly stopAsked: () => boolean
  readonly progress: (progress: ImportProgress) => void
}

/** Where the text of a file lies, named by the hash of what was sent. */
export const importPath = (dataDir: string, sha256: string): string =>
  join(dataDir, 'imports', `${sha256}.csv`)

/**
 * Works through the next import that waits, or goes on with one that was interrupted.
 * @returns whether there was one
 */
export async function workThrough(place: Workplace): Promise<boolean> {
  const next = await nextImport(place.read)
  if (!next) return false
  try {
    if (await begin(next, place)) await run(next, place)
  } catch (error) {
    const known = sentenceOf(error)
    if (known === undefined) console.error(error)
    await fail(next, known ?? UNFORESEEN, place)
  }
  return true
}

/**
 * Gives up the import under way, where its thread has ended over and over without storing a row: others wait.
 * @returns whether there was one
 */
export async function giveUpRunning(place: Pick<Workplace, 'connection' | 'read'>): Promise<boolean> {
  const next = await nextImport(place.read)
  if (next?.state !== 'running') return false
  await fail(next, GIVEN_UP, place)
  return true
}

async function run(next: ImportFacts, { connection, dataDir, progress, read, stopAsked }: Workplace) {
  const person = await getPerson(read, next.createdById)
  const works = await getWorks(read)
  if (!person || !works) throw new Error(`import ${next.id} has no person or no works`)
  const actor = { personId: person.id, name: person.name, roles: person.roles as readonly Role[] }
  let seen = { at: Date.now(), rows: next.rowsDone }
  let rowsPerSecond = 0
  await runImport(next.id, {
    read,
    connection,
    importer: { personId: person.id, mayAddToDecided: may(actor, 'readings.supersede-any') },
    timeZone: works.timeZone,
    path: importPath(dataDir, next.sha256),
    stopAsked,
    progress: (rowsDone) => {
      const elapsed = Date.now() - seen.at
      if (elapsed > 500) {
        const now = ((rowsDone - seen.rows) / elapsed) * 1000
        rowsPerSecond = rowsPerSecond === 0 ? now : 0.7 * rowsPerSecond + 0.3 * now
        seen = { at: Date.now(), rows: rowsDone }
      }
      progress({ importId: next.id, rowsDone, rowsPerSecond })
    },
  })
}

/**
 * Marks the import as under way and counts the rows of its file, once.
 * @returns whether it goes on: not when somebody put it away meanwhile, nor when the server is told to stop
 */
async function begin(next: ImportFacts, { connection, dataDir, stopAsked }: Workplace): Promise<boolean> {
  const underWay = await changed(
    connection,
    'UPDATE "Import" SET "state" = ?, "startedAt" = ? WHERE "id" = ? AND "state" IN (\'queued\', \'running\')',
    'running',
    connection.instant(next.startedAt ?? Date.now()),
    next.id,
  )
  if (!underWay || next.rowCount !== undefined) return underWay
  const { delimiter } = JSON.parse(next.options) as ImportOptions
  let rowCount = 0
  for await (const record of readFileRows(importPath(dataDir, next.sha256), delimiter)) {
    if ('row' in record) rowCount = record.row
    if (rowCount % 1000 === 0 && stopAsked()) return false
  }
  return changed(connection, 'UPDATE "Import" SET "rowCount" = ? WHERE "id" = ?', rowCount, next.id)
}

async function changed(
  connection: BulkConnection,
  sql: string,
  ...parameters: readonly BulkValue[]
): Promise<boolean> {
  await connection.begin()
  try {
    const count = await connection.run(sql, ...parameters)
    await connection.commit()
    return count > 0
  } catch (error) {
    await connection.rollback()
    throw error
  }
}

const UNFORESEEN =
  'Something unforeseen happened; the server’s log says more. What is imported so far is kept.'

const GIVEN_UP =
  'The rows that come next ended the import’s thread several times. What is imported so far is kept. Divide the file, and send the rest again.'

/** What a person reads when a run can't go on; undefined when nobody has foreseen why. */
function sentenceOf(error: unknown): string | undefined {
  if (error instanceof LedgerlineError) return `${error.problem.message} ${error.problem.mend ?? ''}`.trim()
  const code = (error as { readonly code?: unknown } | null)?.code
  if (code === 'ENOENT') return 'The file is no longer in the data folder. Send it again.'
  if (code === 'SQLITE_FULL' || code === 'ENOSPC') return 'The disk is full. What is imported so far is kept.'
  return undefined
}

async function fail(
  next: ImportFacts,
  message: string,
  { connection }: Pick<Workplace, 'connection'>,
): Promise<void> {
  await connection.rollback()
  await endImport(connection, next.id, {
    state: 'failed',
    message,
    at: Date.now(),
    personId: next.createdById,
  })
}
