/** Back-ups of the embedded engine, taken while the server runs. */
import { existsSync, mkdirSync, renameSync, rmSync, statSync, writeFileSync } from 'node:fs'
import { basename, dirname, join } from 'node:path'
import { problem } from '@/lib/domain/errors'
import { openSqlite } from './connections'
import { flushToDisk, hashOfFile, removeDatabaseFiles } from './file-copies'
import type { LedgerHead } from './ledger'
import { contentOfFile } from './ledger-anchor'
import { soundnessOfFile } from './soundness'

/** Lies beside a back-up as `NAME.json`. Its ledger is an anchor: a chain that does not pass through it was forged. */
export interface BackupNote {
  readonly file: string
  /** ISO 8601, UTC. */
  readonly madeAt: string
  readonly bytes: number
  readonly sha256: string
  readonly ledger: LedgerHead
  /** Newest migration in it. */
  readonly migration: string
}

export interface Backup extends BackupNote {
  readonly path: string
}

export const noteOf = (path: string): string => `${path}.json`

/** `ledgerline-20261201-143005.db`, in UTC. */
export const backupName = (at: Date): string =>
  `ledgerline-${at.toISOString().replace(/[-:]/g, '').replace('T', '-').slice(0, 15)}.db`

/**
 * Copies the database as it is at one moment, checks the copy, and writes its note beside it. The server may go
 * on writing.
 * @param path the database file
 * @param folder where the back-up goes; made when it is missing
 * @throws LedgerlineError when there is no database, or the copy does not pass its check; nothing is left then
 */
export const backUp = async (path: string, folder: string, at: Date): Promise<Backup> => {
  if (!existsSync(path)) throw problem('not-found', `There is no database at ${path}.`)
  mkdirSync(folder, { recursive: true, mode: 0o700 })
  const target = join(folder, backupName(at))
  if (existsSync(target)) throw problem('conflict', `${basename(target)} exists already.`)
  const part = `${target}.part`
  try {
    await copyWhole(path, part)
    const faults = await soundnessOfFile(part)
    if (faults !== undefined) throw problem('storage', `The back-up was not kept: ${faults}`)
    const { ledger, migrations } = contentOfFile(part)
    flushToDisk(part)
    const note: BackupNote = {
      file: basename(target),
      madeAt: at.toISOString(),
      bytes: statSync(part).size,
      sha256: hashOfFile(part),
      ledger,
      migration: migrations.at(-1) ?? '',
    }
    writeFileSync(noteOf(target), `${JSON.stringify(note, null, 2)}\n`, { mode: 0o600 })
    flushToDisk(noteOf(target))
    renameSync(part, target)
    flushToDisk(dirname(target))
    return { ...note, path: target }
  } catch (error) {
    removeDatabaseFiles(part)
    rmSync(noteOf(target), { force: true })
    if (String((error as { code?: unknown }).code).startsWith('SQLITE_'))
      throw problem('storage', `The back-up was not kept: it can’t be read (${(error as Error).message}).`)
    throw error
  }
}

/**
 * All pages in one step. In steps of some pages each, SQLite begins anew whenever somebody has written in between:
 * beside a busy server that never ends. Readers and writers go on meanwhile (WAL).
 */
const copyWhole = async (path: string, target: string): Promise<void> => {
  const connection = openSqlite(path)
  try {
    await connection.backup(target, { progress: () => Number.MAX_SAFE_INTEGER })
  } finally {
    connection.close()
  }
}
