import pg from 'pg'
import { postgresqlConfig } from '../connections'
import type { BulkConnection, BulkRow, BulkValue } from './bulk-connection'
import type { BulkTable, ColumnKind } from './bulk-tables'

const arrayTypes: Readonly<Record<ColumnKind, string>> = {
  int: 'int4[]',
  text: 'text[]',
  float: 'float8[]',
  instant: 'timestamp[]',
  boolean: 'bool[]',
}

/** Instants travel as ISO texts with Z: a Date would be shifted by the zone of this process. */
const iso = (epochMilliseconds: number): string => new Date(epochMilliseconds).toISOString()

const numbered = (sql: string): string => {
  let count = 0
  return sql.replace(/\?/g, () => {
    count += 1
    return `$${count}`
  })
}

/** @param url the address of the database */
export async function openBulkPostgresql(url: string): Promise<BulkConnection> {
  const { max: _, ...config } = postgresqlConfig(url, 'worker')
  const client = new pg.Client(config)
  await client.connect()
  return {
    engine: 'postgresql',
    begin: async () => {
      await client.query('BEGIN')
    },
    commit: async () => {
      await client.query('COMMIT')
    },
    rollback: async () => {
      await client.query('ROLLBACK')
    },
    rows: async <Row extends BulkRow>(sql: string, ...parameters: readonly BulkValue[]) =>
      (await client.query(numbered(sql), [...parameters])).rows as Row[],
    run: async (sql, ...parameters) => (await client.query(numbered(sql), [...parameters])).rowCount ?? 0,
    insert: async (table, rows) => {
      if (rows.length === 0) return
      const columns = Object.entries(table.columns)
      await client.query(
        insertSql(table, columns),
        columns.map(([column, kind]) =>
          rows.map((row) => {
            const value = row[column] ?? null
            return kind === 'instant' && typeof value === 'number' ? iso(value) : value
          }),
        ),
      )
    },
    reserveIds: async (table, count) => {
      if (count === 0) return []
      const { rows } = await client.query(
        `SELECT nextval(pg_get_serial_sequence($1, 'id'))::int AS id FROM generate_series(1, $2::int)`,
        [`"${table}"`, count],
      )
      return (rows as { readonly id: number }[]).map((row) => row.id)
    },
    instant: iso,
    close: () => client.end(),
  }
}

/** One statement for any number of rows: an array a column, whose length bounds nothing but memory. */
const insertSql = (
  { name, unlessThere }: BulkTable,
  columns: readonly (readonly [string, ColumnKind])[],
): string =>
  `INSERT INTO "${name}" (${columns.map(([column]) => `"${column}"`).join(', ')}) ` +
  `SELECT * FROM unnest(${columns.map(([, kind], index) => `$${index + 1}::${arrayTypes[kind]}`).join(', ')})` +
  (unlessThere === undefined ? '' : ` ON CONFLICT ("${unlessThere}") DO NOTHING`)
