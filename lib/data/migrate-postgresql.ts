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
  const client = new pg.Client(postgresqlConfig(url, 'script'))
  client.on('error', () => undefined)
  try {
    await client.connect()
    await client.query('begin')
    await client.query('select pg_advisory_xact_lock($1)', [migrationLock])
    const applied = await withSchemaEngine(sharing(client), async (engine) => {
      // Asking for a history that is not there fails, and a failure would end the transaction.
      const missing = (await hasHistory(client)) ? await missingMigrations(engine, set) : set.migrations
      return missing.length === 0 ? [] : await applyMissing(engine, set)
    })
    await client.query(set.guards)
    await client.query('commit')
    return { applied, copy: undefined }
  } catch (error) {
    await client.query('rollback').catch(() => undefined)
    throw explain(error)
  } finally {
    await client.end().catch(() => undefined)
  }
}

const hasHistory = async (client: pg.Client): Promise<boolean> => {
  const { rows } = await client.query<{ found: boolean }>(
    `select to_regclass('_prisma_migrations') is not null as found`,
  )
  return rows[0]?.found ?? false
}

/**
 * Whatever the engine asks for goes to the one connection that holds the transaction. (A pool, even of one,
 * closes a connection on which a query failed, and goes on outside the transaction on another.)
 */
const sharing = (client: pg.Client): SqlMigrationAwareDriverAdapterFactory => {
  const pool = new pg.Pool()
  Object.defineProperty(pool, 'query', { value: client.query.bind(client) })
  Object.defineProperty(pool, 'connect', {
    value: () => Promise.reject(new Error('A migration is one transaction already.')),
  })
  const factory = new PrismaPg(pool)
  return {
    provider: factory.provider,
    adapterName: factory.adapterName,
    connect: (): Promise<SqlDriverAdapter> => factory.connect(),
    connectToShadowDb: () => Promise.reject(new Error('No shadow database is used here.')),
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
