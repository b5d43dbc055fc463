/** Plain SQL on a connection of its own, past the project's door: what an outsider with the database can do. */
import pg from 'pg'
import { openSqlite } from '@/lib/data/connections'
import { filePath } from '@/lib/data/env'
import { testEngine } from './template-database'

/** Runs one or several statements. */
export type RunSql = (sql: string) => Promise<void>

export const onRawConnection = async <T>(work: (run: RunSql) => Promise<T>): Promise<T> => {
  const url = process.env.DATABASE_URL ?? ''
  if (testEngine === 'postgresql') {
    const client = new pg.Client({ connectionString: url })
    await client.connect()
    try {
      return await work(async (sql) => {
        await client.query(sql)
      })
    } finally {
      await client.end()
    }
  }
  const connection = openSqlite(filePath(url))
  try {
    return await work(async (sql) => {
      connection.exec(sql)
    })
  } finally {
    connection.close()
  }
}

/** Takes a table's guards away, as someone who means to forge would. */
export const dropGuards = (table: string): Promise<void> =>
  onRawConnection(async (run) => {
    if (testEngine === 'postgresql') return run(`alter table "${table}" disable trigger user`)
    const connection = openSqlite(filePath(process.env.DATABASE_URL ?? ''))
    const names = connection
      .prepare<[string], string>(`select name from sqlite_master where type = 'trigger' and tbl_name = ?`)
      .pluck()
      .all(table)
    for (const name of names) connection.exec(`drop trigger "${name}"`)
    connection.close()
  })
