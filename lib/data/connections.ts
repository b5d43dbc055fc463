/**
 * Every connection to the database is opened here, by the server, the sign-in library, workers and scripts
 * alike. Settings that a promise rests on are set and then read back: a connection that answers otherwise is
 * not used. (The driver's write-ahead log quietly means `synchronous = NORMAL`, which loses acknowledged
 * readings when the power fails.)
 */
import { PrismaBetterSqlite3 } from '@prisma/adapter-better-sqlite3'
import { PrismaPg } from '@prisma/adapter-pg'
import type { SqlDriverAdapter, SqlDriverAdapterFactory } from '@prisma/driver-adapter-utils'
import BetterSqlite3 from 'better-sqlite3'
import { type Environment, filePath } from './env'
import { takeTurns } from './sqlite-transactions'

/** What a connection is for: decides how long it waits, and whether it may write. */
export type ConnectionRole = 'writer' | 'reader' | 'sign-in' | 'script' | 'worker'

/**
 * Milliseconds that SQLite waits for another connection's lock. It waits in the server's only thread, so the
 * server's own connections wait briefly and try again later.
 */
const busyTimeouts: Readonly<Record<ConnectionRole, number>> = {
  writer: 20,
  reader: 20,
  'sign-in': 20,
  script: 10_000,
  // It waits in its own thread.
  worker: 2_000,
}

/**
 * Milliseconds that a connection tries again, without stopping the server. The writer's door repeats whole
 * transactions instead.
 */
const busyPatience: Readonly<Record<ConnectionRole, number>> = {
  writer: 0,
  reader: 5_000,
  'sign-in': 15_000,
  script: 0,
  worker: 0,
}

/** Pages of the log after which it is copied back, and the size it is cut to: the log stays bounded. */
const checkpointPages = 1_000
const logBytes = 64 * 1024 * 1024

/** The pragmas of a connection and what each must answer. Order matters: `query_only` comes last. */
export const sqlitePragmas = (role: ConnectionRole): ReadonlyArray<readonly [string, string | number]> => [
  ['busy_timeout', busyTimeouts[role]],
  ['journal_mode', 'wal'],
  // 2 is FULL: a commit is on the disk before it is acknowledged.
  ['synchronous', 2],
  ['foreign_keys', 1],
  ['recursive_triggers', 1],
  ['wal_autocheckpoint', checkpointPages],
  ['journal_size_limit', logBytes],
  ['query_only', role === 'reader' ? 1 : 0],
]

/** Runs one statement; answers with the first column of the first row. */
export type Ask = (sql: string) => Promise<unknown>

const mustAnswer = (setting: string, wanted: string | number, answer: unknown): void => {
  // Either engine's driver may answer with a number, a bigint or a text.
  if (String(answer).toLowerCase() === String(wanted)) return
  throw new Error(
    `The database connection answers ${setting} = ${String(answer)} where ${wanted} is needed; it is not used.`,
  )
}

/** Sets a connection's pragmas and reads them back. @throws Error when one does not take */
export const settlePragmas = async (role: ConnectionRole, ask: Ask): Promise<void> => {
  for (const [pragma, value] of sqlitePragmas(role)) await ask(`PRAGMA ${pragma} = ${value}`)
  for (const [pragma, value] of sqlitePragmas(role)) mustAnswer(pragma, value, await ask(`PRAGMA ${pragma}`))
}

/**
 * A plain SQLite connection for scripts and workers.
 * @param path the database file, which must exist
 * @throws Error when a setting does not take
 */
export const openSqlite = (path: string, role: ConnectionRole = 'script'): BetterSqlite3.Database => {
  const connection = new BetterSqlite3(path, { fileMustExist: true, timeout: busyTimeouts[role] })
  try {
    for (const [pragma, value] of sqlitePragmas(role)) connection.pragma(`${pragma} = ${value}`)
    for (const [pragma, value] of sqlitePragmas(role))
      mustAnswer(pragma, value, connection.pragma(pragma, { simple: true }))
    return connection
  } catch (error) {
    connection.close()
    throw error
  }
}

/**
 * A connection that only looks at a database file and leaves it as it is, its journal mode included: for copies
 * and back-ups.
 */
export const inspectSqlite = (path: string): BetterSqlite3.Database => {
  const connection = new BetterSqlite3(path, { fileMustExist: true, timeout: busyTimeouts.script })
  try {
    connection.pragma('query_only = 1')
    mustAnswer('query_only', 1, connection.pragma('query_only', { simple: true }))
    return connection
  } catch (error) {
    connection.close()
    throw error
  }
}

/** An adapter's way to answer one statement. */
export const askerOf =
  (adapter: SqlDriverAdapter): Ask =>
  async (sql) => {
    const { rows } = await adapter.queryRaw({ sql, args: [], argTypes: [] })
    return rows[0]?.[0]
  }

const sqliteFactory = (path: string, role: ConnectionRole): SqlDriverAdapterFactory => {
  const factory = new PrismaBetterSqlite3(
    { url: `file:${path}`, fileMustExist: true, timeout: busyTimeouts[role] },
    { timestampFormat: 'unixepoch-ms' },
  )
  return {
    provider: factory.provider,
    adapterName: factory.adapterName,
    connect: async () => {
      const adapter = await factory.connect()
      try {
        await settlePragmas(role, askerOf(adapter))
      } catch (error) {
        await adapter.dispose()
        throw error
      }
      return takeTurns(adapter, busyPatience[role], role !== 'reader')
    },
  }
}

/** Session settings on PostgreSQL; each connection of the pool starts with them. */
export const postgresqlSettings = (role: ConnectionRole): Readonly<Record<string, string>> => ({
  TimeZone: 'UTC',
  synchronous_commit: 'on',
  default_transaction_isolation: 'read committed',
  default_transaction_read_only: role === 'reader' ? 'on' : 'off',
  // A lock that can't be had, a query or a forgotten transaction ends with an error, never with a hang.
  lock_timeout: role === 'script' ? '0' : '15s',
  statement_timeout: role === 'script' ? '0' : '30s',
  idle_in_transaction_session_timeout: role === 'script' ? '0' : '1min',
})

/** Connections of a role on PostgreSQL. */
export const poolSizes: Readonly<Record<ConnectionRole, number>> = {
  writer: 8,
  reader: 6,
  'sign-in': 3,
  script: 2,
  worker: 1,
}

/** What node-postgres needs to connect in a role. */
export const postgresqlConfig = (url: string, role: ConnectionRole) => ({
  connectionString: url,
  application_name: `ledgerline ${role}`,
  options: Object.entries(postgresqlSettings(role))
    .map(([name, value]) => `-c ${name}=${value.replaceAll(' ', '\\ ')}`)
    .join(' '),
  max: poolSizes[role],
  connectionTimeoutMillis: 10_000,
})

const postgresqlFactory = (url: string, role: ConnectionRole): SqlDriverAdapterFactory => {
  const factory = new PrismaPg(postgresqlConfig(url, role), {
    // The pool replaces a connection that the server closed; the query that meets it says so itself.
    onPoolError: () => undefined,
    onConnectionError: () => undefined,
  })
  return {
    provider: factory.provider,
    adapterName: factory.adapterName,
    connect: async (): Promise<SqlDriverAdapter> => {
      const adapter = await factory.connect()
      try {
        const ask = askerOf(adapter)
        for (const [name, value] of Object.entries(postgresqlSettings(role)))
          mustAnswer(name, value.toLowerCase(), await ask(`SHOW ${name}`))
      } catch (error) {
        await adapter.dispose()
        throw error
      }
      return adapter
    },
  }
}

/** The one way to a connection that a generated client uses. It is opened at the client's first query. */
export const connectionFactory = (
  environment: Pick<Environment, 'engine' | 'databaseUrl'>,
  role: ConnectionRole,
): SqlDriverAdapterFactory =>
  environment.engine === 'sqlite'
    ? sqliteFactory(filePath(environment.databaseUrl), role)
    : postgresqlFactory(environment.databaseUrl, role)
