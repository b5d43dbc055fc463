/** Count and hash of the ledger in a database file that no process has open, for what goes beside the file. */
import { problem } from '@/lib/domain/errors'
import { inspectSqlite } from './connections'
import { removeLogFiles } from './file-copies'
import { beginningOfLedger, type LedgerHead } from './ledger'

export interface FileContent {
  readonly ledger: LedgerHead
  /** Names of the migrations that the file has, in order. */
  readonly migrations: readonly string[]
}

/** @throws LedgerlineError when the file is no database of this program, or its ledger ends elsewhere than its head */
export const contentOfFile = (path: string): FileContent => {
  const connection = inspectSqlite(path)
  try {
    const tables = connection
      .prepare<[], string>(`select name from sqlite_master where type = 'table'`)
      .pluck()
      .all()
    if (
      !['_prisma_migrations', 'LedgerHead', 'LedgerEntry', 'Reading'].every((name) => tables.includes(name))
    )
      throw problem('bad-input', 'This file is a database, but not one of Ledgerline.')
    const ledger = connection
      .prepare<[], LedgerHead>('select "count", "hash" from "LedgerHead" where "id" = 1')
      .get()
    if (ledger === undefined) throw problem('bad-input', 'The ledger in this file has lost its head.')
    const last = connection
      .prepare<[], LedgerHead>(
        'select "sequence" as "count", "hash" from "LedgerEntry" order by "sequence" desc limit 1',
      )
      .get() ?? { count: 0, hash: beginningOfLedger }
    if (last.count !== ledger.count || last.hash !== ledger.hash)
      throw problem('bad-input', 'The ledger in this file does not end at its head: entries are missing.')
    const migrations = connection
      .prepare<[], string>(
        'select migration_name from _prisma_migrations where finished_at is not null order by migration_name',
      )
      .pluck()
      .all()
    return { ledger, migrations }
  } finally {
    connection.close()
    removeLogFiles(path)
  }
}
