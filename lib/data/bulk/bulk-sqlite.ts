import type BetterSqlite3 from 'better-sqlite3'
import { openSqlite } from '../connections'
import { isBusy } from '../db-errors'
import type { BulkConnection, BulkRow, BulkValue } from './bulk-connection'
import type { BulkTable } from './bulk-tables'

const pause = (milliseconds: number) => new Promise<void>((done) => setTimeout(done, milliseconds))

/** How long a write transaction is tried for while another connection holds the file. */
const PATIENCE = 60_000

const plain = (value: BulkValue | undefined): string | number | null =>
  value === undefined ? null : typeof value === 'boolean' ? Number(value) : value

/** @param path the database file */
export function openBulkSqlite(path: string): BulkConnection {
  const database = openSqlite(path, 'worker')
  const statements = new Map<string, BetterSqlite3.Statement>()
  const reserved = new Map<string, number>()
  const prepared = (sql: string): BetterSqlite3.Statement => {
    const known = statements.get(sql)
    if (known) return known
    const made = database.prepare(sql)
    statements.set(sql, made)
    return made
  }
  return {
    engine: 'sqlite',
    begin: async () => {
      const until = Date.now() + PATIENCE
      for (;;) {
        try {
          prepared('BEGIN IMMEDIATE').run()
          return
        } catch (error) {
          if (!isBusy(error) || Date.now() >= until) throw error
          await pause(10)
        }
      }
    },
    commit: async () => {
      prepared('COMMIT').run()
      reserved.clear()
    },
    rollback: async () => {
      if (database.inTransaction) prepared('ROLLBACK').run()
      reserved.clear()
    },
    rows: async <Row extends BulkRow>(sql: string, ...parameters: readonly BulkValue[]) =>
      prepared(sql).all(...parameters.map(plain)) as Row[],
    run: async (sql, ...parameters) => prepared(sql).run(...parameters.map(plain)).changes,
    insert: async (table, rows) => {
      const columns = Object.keys(table.columns)
      const statement = prepared(insertSql(table, columns))
      for (const row of rows) statement.run(...columns.map((column) => plain(row[column])))
    },
    reserveIds: async (table, count) => {
      const known = prepared('SELECT "seq" FROM sqlite_sequence WHERE "name" = ?').get(table) as
        | { readonly seq: number }
        | undefined
      const last = Math.max(known?.seq ?? 0, reserved.get(table) ?? 0)
      reserved.set(table, last + count)
      return Array.from({ length: count }, (_, index) => last + 1 + index)
    },
    instant: (epochMilliseconds) => epochMilliseconds,
    close: async () => {
      database.close()
    },
  }
}

const insertSql = ({ name, unlessThere }: BulkTable, columns: readonly string[]): string =>
  `INSERT INTO "${name}" (${columns.map((column) => `"${column}"`).join(', ')}) VALUES (${columns.map(() => '?').join(', ')})` +
  (unlessThere === undefined ? '' : ` ON CONFLICT ("${unlessThere}") DO NOTHING`)
