/** The SQL of a migration, made from two states of the data model, and what must not be in it unasked. */
import { PrismaBetterSqlite3 } from '@prisma/adapter-better-sqlite3'
import {
  ColumnTypeEnum,
  type SqlDriverAdapter,
  type SqlMigrationAwareDriverAdapterFactory,
} from '@prisma/driver-adapter-utils'
import type { Engine } from './database'
import { differenceOf, type SchemaFiles, withSchemaEngine } from './schema-engine'

/** Append-only tables: promises rest on nobody rewriting them, a migration included. */
export const appendOnlyTables = ['Reading', 'Evaluation', 'LedgerEntry'] as const

/**
 * Stands in for a PostgreSQL server: the engine asks for its version before it compares two data models, and
 * nothing else.
 */
const absentServer = (): SqlMigrationAwareDriverAdapterFactory => {
  const unasked = async (): Promise<never> => {
    throw new Error('A migration is drafted without a database.')
  }
  const info = { provider: 'postgres', adapterName: '@prisma/adapter-pg' } as const
  const adapter: SqlDriverAdapter = {
    ...info,
    queryRaw: async () => ({
      columnNames: ['exists', 'version', 'numeric_version'],
      columnTypes: [ColumnTypeEnum.Boolean, ColumnTypeEnum.Text, ColumnTypeEnum.Int32],
      rows: [[true, 'PostgreSQL 15.0', 150_000]],
    }),
    executeRaw: unasked,
    executeScript: unasked,
    startTransaction: unasked,
    getConnectionInfo: () => ({ supportsRelationJoins: true }),
    dispose: async () => {},
  }
  return { ...info, connect: async () => adapter, connectToShadowDb: async () => adapter }
}

/**
 * SQL from one state of the data model to the next; '' when there is none. Needs no database.
 * @param before undefined: from nothing
 */
export const draftMigration = async (
  engine: Engine,
  before: SchemaFiles | undefined,
  after: SchemaFiles,
): Promise<string> => {
  const factory = engine === 'sqlite' ? new PrismaBetterSqlite3({ url: ':memory:' }) : absentServer()
  const sql = await withSchemaEngine(
    factory,
    (schemaEngine) => differenceOf(schemaEngine, before, after),
    after,
  )
  return /^\s*(--[^\n]*\s*)*$/.test(sql) ? '' : sql
}

/** Append-only tables that the SQL drops, renames, rewrites or takes columns from. */
export const redefinedTables = (sql: string): readonly string[] =>
  appendOnlyTables.filter((table) => {
    const name = `(?:"public"\\.)?["\`]?${table}["\`]?`
    return [
      `\\bDROP\\s+TABLE\\s+(?:IF\\s+EXISTS\\s+)?${name}(?!\\w)`,
      `\\bALTER\\s+TABLE\\s+(?:IF\\s+EXISTS\\s+)?(?:ONLY\\s+)?${name}\\s+(?:RENAME|DROP|ALTER)\\b`,
      // Constraints and new columns leave what is stored alone; anything else in one statement does not.
      `\\bALTER\\s+TABLE\\s+(?:ONLY\\s+)?${name}[^;]*,\\s*(?:DROP|ALTER)\\b`,
      `\\b(?:UPDATE|DELETE\\s+FROM|TRUNCATE(?:\\s+TABLE)?)\\s+(?:ONLY\\s+)?${name}(?!\\w)`,
      `\\bRENAME\\s+TO\\s+${name}(?!\\w)`,
    ].some((pattern) => new RegExp(pattern, 'i').test(sql))
  })

/**
 * Whether a semicolon stands inside a text or a comment: PostgreSQL's adapter cuts a migration at every
 * semicolon, so such a one would be applied in pieces.
 */
export const hasHiddenSemicolon = (sql: string): boolean =>
  (sql.match(/'(?:[^']|'')*'|"[^"]*"|--[^\n]*|\/\*[\s\S]*?\*\/|\$\w*\$/g) ?? []).some(
    (part) => part.includes(';') || part.startsWith('$'),
  )
