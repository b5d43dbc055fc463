/**
 * Brings a database to the newest migration, in a process of its own before the server listens: all or nothing.
 * What is wrong is a sentence; the database is then as it was.
 */
import { existsSync, mkdirSync } from 'node:fs'
import { dirname } from 'node:path'
import { problem } from '@/lib/domain/errors'
import { type Environment, filePath } from './env'
import { migratePostgresql } from './migrate-postgresql'
import { migrateSqlite } from './migrate-sqlite'
import type { MigrationSet } from './migration-files'

export interface MigrationReport {
  /** The names of the migrations that were applied now, in order. */
  readonly applied: readonly string[]
  /** The verified copy of the database as it was before, when there was one and something was applied. */
  readonly copy: string | undefined
}

/**
 * Applies what is missing and makes the guards anew. One process at a time: the caller holds the lock
 * (`scripts/migrate.mjs`); on PostgreSQL the server's own lock keeps others waiting.
 * @throws LedgerlineError when the database was changed by another hand, is newer than this program, is in
 * use, is damaged, or a migration fails
 */
export const migrate = async (
  environment: Pick<Environment, 'engine' | 'databaseUrl'>,
  set: MigrationSet,
): Promise<MigrationReport> => {
  if (set.engine !== environment.engine)
    throw problem('storage', `These migrations are for ${set.engine}, not for ${environment.engine}.`)
  if (environment.engine === 'postgresql') return migratePostgresql(environment.databaseUrl, set)
  const path = filePath(environment.databaseUrl)
  if (!existsSync(dirname(path))) mkdirSync(dirname(path), { recursive: true, mode: 0o700 })
  return migrateSqlite(path, set)
}
