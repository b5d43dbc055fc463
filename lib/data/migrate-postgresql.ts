/**
 * Migrations on PostgreSQL: everything on one connection and in one transaction, so that a failure leaves the
 * database as it was.
 */
import { PrismaPg } from '@prisma/adapter-pg'
import type { SqlDriverAdapter, SqlMigrationAwareDriverAdapterFactory } from '@prisma/driver-adapter-utils'
import pg from 'pg'
import { LedgerlineError, problem } from '@/lib/domain/errors'
import { postgresqlConfig } from './connections'
import { storageProblem } from './db-errors'
import type { MigrationReport } from './migrate'
import type { MigrationSet } from './migration-files'
import { applyMissing, missingMigrations } from './migration-history'
import { withSchemaEngine } from './schema-engine'

/** Any number, the same in every process: servers that start together take turns by it. */
const migrationLock = 4_107_559_011

/** @throws LedgerlineError; nothing is changed then */
export const migratePostgresql = async (url: string, set: MigrationSet): Promise<MigrationReport> => {
  // One connection only: whatever the engine asks for comes to the one that holds the transaction.
  const pool = new pg.Pool({ ...postgresqlConfig(url, 'script'), max: 1, idleTimeoutMillis: 0 })
  pool.on('error', () => undefined)
  try {
    await pool.query('begin')
    await pool.query('select pg_advisory_xact_lock($1)', [migrationLock])
    const applied = await withSchemaEngine(sharing(pool), async (engine) => {
      const missing = await missingMigrations(engine, set)
      return missing.length === 0 ? [] : await applyMissing(engine, set)
    })
    await pool.query(set.guards)
    await pool.query('commit')
    return { applied, copy: undefined }
  } catch (error) {
    await pool.query('rollback').catch(() => undefined)
    throw explain(error)
  } finally {
    await pool.end()
  }
}

/** The engine's connections, all on `pool`, which stays open when the engine is done. */
const sharing = (pool: pg.Pool): SqlMigrationAwareDriverAdapterFactory => {
  const factory = new PrismaPg(pool)
  return {
    provider: factory.provider,
    adapterName: factory.adapterName,
    connect: (): Promise<SqlDriverAdapter> => factory.connect(),
    connectToShadowDb: () => {
      throw new Error('No shadow database is used here.')
    },
  }
}

const explain = (error: unknown): LedgerlineError => {
  if (error instanceof LedgerlineError) return error
  const known = storageProblem(error)
  if (known !== undefined) return known
  const told = error instanceof Error ? error.message : String(error)
  return new LedgerlineError(
    problem('storage', `A migration failed: ${told.trim()} The database is as it was.`).problem,
    { cause: error },
  )
}
