/** Migrations of the embedded engine: a verified copy first, and the copy put back when anything fails. */
import { existsSync, readdirSync, renameSync, rmSync, statSync } from 'node:fs'
import { basename, dirname, join } from 'node:path'
import { PrismaBetterSqlite3 } from '@prisma/adapter-better-sqlite3'
import type { SqlDriverAdapter, SqlMigrationAwareDriverAdapterFactory } from '@prisma/driver-adapter-utils'
import { LedgerlineError, problem } from '@/lib/domain/errors'
import { type Ask, askerOf, settlePragmas } from './connections'
import { isBusy } from './db-errors'
import { copyExactly, removeDatabaseFiles, removeLogFiles } from './file-copies'
import type { MigrationReport } from './migrate'
import type { MigrationSet } from './migration-files'
import { applyMissing, missingMigrations } from './migration-history'
import { withSchemaEngine } from './schema-engine'
import { soundnessOf, soundnessOfFile } from './soundness'

/** There only while a migration runs: a start that finds it puts it back, the last one was interrupted. */
export const workingCopyOf = (path: string): string => `${path}.while-migrating`

/** Kept after a migration, the newest one only. */
const keptCopyOf = (path: string, newest: string): string => `${path}.before-${newest}`

/** Hands out the one connection that the engine works on, and keeps it to be asked. */
const watchedFactory = (path: string) => {
  const factory = new PrismaBetterSqlite3(
    { url: `file:${path}`, timeout: 2_000 },
    { timestampFormat: 'unixepoch-ms' },
  )
  let connection: SqlDriverAdapter | undefined
  const watched: SqlMigrationAwareDriverAdapterFactory = {
    provider: factory.provider,
    adapterName: factory.adapterName,
    connect: async () => {
      connection = await factory.connect()
      return connection
    },
    connectToShadowDb: () => factory.connectToShadowDb(),
  }
  return {
    factory: watched,
    connection: (): SqlDriverAdapter => {
      if (connection === undefined) throw new Error('The schema engine opened no connection.')
      return connection
    },
  }
}

/** @throws LedgerlineError; the database file is then byte for byte what it was, or absent when it was absent */
export const migrateSqlite = async (path: string, set: MigrationSet): Promise<MigrationReport> => {
  const workingCopy = workingCopyOf(path)
  if (existsSync(workingCopy)) putBack(workingCopy, path)
  const isNew = !existsSync(path) || statSync(path).size === 0
  const { factory, connection } = watchedFactory(path)
  let copied = false
  try {
    const applied = await withSchemaEngine(factory, async (engine) => {
      const missing = await missingMigrations(engine, set)
      const adapter = connection()
      const ask = askerOf(adapter)
      await holdAlone(ask, path)
      if (missing.length > 0 && !isNew) {
        // What the log holds goes into the file first: the file alone is then the database.
        await ask('PRAGMA wal_checkpoint(TRUNCATE)')
        copyExactly(path, workingCopy)
        copied = true
        await requireSound(workingCopy)
      }
      await settlePragmas('script', ask)
      const names = await applyMissing(engine, set)
      await adapter.executeScript(`BEGIN IMMEDIATE;\n${set.guards}\nCOMMIT;`)
      const faults = await soundnessOf(ask)
      if (faults !== undefined) throw problem('storage', `After the migration ${faults}`)
      return names
    })
    return { applied, copy: copied ? keepCopy(path, set) : undefined }
  } catch (error) {
    if (isNew) removeDatabaseFiles(path)
    else if (copied) putBack(workingCopy, path)
    throw explain(error, isNew)
  }
}

/**
 * Takes the file for this connection alone, until it is closed: nothing may be written between the copy and
 * the end of the migration that putting the copy back would lose.
 */
const holdAlone = async (ask: Ask, path: string): Promise<void> => {
  try {
    await ask('PRAGMA locking_mode = EXCLUSIVE')
    await ask('BEGIN EXCLUSIVE')
    await ask('COMMIT')
  } catch (error) {
    if (!isBusy(error)) throw error
    throw problem('busy', `${basename(path)} is in use by another process.`, {
      mend: 'Stop the running server, then start again.',
    })
  }
}

const requireSound = async (copy: string): Promise<void> => {
  const faults = await soundnessOfFile(copy)
  if (faults === undefined) return
  throw problem('storage', `The database is damaged: ${faults} Nothing was migrated.`, {
    mend: 'Put back the last back-up: npm run restore.',
  })
}

const putBack = (copy: string, path: string): void => {
  removeLogFiles(path)
  renameSync(copy, path)
}

/** The working copy becomes the kept one; older ones go. */
const keepCopy = (path: string, set: MigrationSet): string => {
  const kept = keptCopyOf(path, set.migrations.at(-1)?.name ?? 'nothing')
  const folder = dirname(path)
  for (const name of readdirSync(folder))
    if (name.startsWith(`${basename(path)}.before-`)) rmSync(join(folder, name), { force: true })
  renameSync(workingCopyOf(path), kept)
  return kept
}

const explain = (error: unknown, isNew: boolean): LedgerlineError => {
  if (error instanceof LedgerlineError) return error
  const told =
    error instanceof Error ? error.message : String((error as { message?: unknown })?.message ?? error)
  const now = isNew ? 'No database was made.' : 'The database is as it was.'
  return new LedgerlineError(
    { code: 'storage', message: `A migration failed: ${told.trim()} ${now}` },
    { cause: error },
  )
}
