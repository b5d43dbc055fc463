/**
 * Transactions on SQLite that take the write lock when they begin.
 *
 * The driver begins deferred transactions: one that reads first and writes later fails at once when another
 * connection wrote in between. It also leaves a connection inside its transaction when COMMIT finds the file
 * busy, so that later writes vanish with it, and never hands the turn on when BEGIN fails. Here BEGIN is
 * IMMEDIATE, a transaction that did not commit is rolled back for certain, and the turn is always handed on.
 */
import type { IsolationLevel, SqlDriverAdapter, Transaction } from '@prisma/driver-adapter-utils'
import { createTurns } from './turns'

/** Wraps an adapter: everything but `startTransaction` is its own. */
export const beginImmediately = (adapter: SqlDriverAdapter): SqlDriverAdapter => {
  const turns = createTurns()
  const run = (sql: string) => adapter.executeRaw({ sql, args: [], argTypes: [] })
  const rollBackIfOpen = () => run('ROLLBACK').catch(() => undefined)

  const startTransaction = async (isolationLevel?: IsolationLevel): Promise<Transaction> => {
    if (isolationLevel !== undefined && isolationLevel !== 'SERIALIZABLE')
      throw new Error(`SQLite has no isolation level ${isolationLevel}`)
    const release = await turns.take()
    try {
      await run('BEGIN IMMEDIATE')
    } catch (error) {
      release()
      throw error
    }
    return {
      provider: adapter.provider,
      adapterName: adapter.adapterName,
      options: { usePhantomQuery: false },
      queryRaw: (query) => adapter.queryRaw(query),
      executeRaw: (query) => adapter.executeRaw(query),
      // The client has sent COMMIT or ROLLBACK already. After a COMMIT that failed it sends nothing more.
      commit: async () => release(),
      rollback: async () => {
        await rollBackIfOpen()
        release()
      },
      createSavepoint: async (name) => {
        await run(`SAVEPOINT ${name}`)
      },
      rollbackToSavepoint: async (name) => {
        await run(`ROLLBACK TO ${name}`)
      },
      releaseSavepoint: async (name) => {
        await run(`RELEASE SAVEPOINT ${name}`)
      },
    }
  }

  return {
    provider: adapter.provider,
    adapterName: adapter.adapterName,
    queryRaw: (query) => adapter.queryRaw(query),
    executeRaw: (query) => adapter.executeRaw(query),
    executeScript: (script) => adapter.executeScript(script),
    startTransaction,
    getConnectionInfo: adapter.getConnectionInfo?.bind(adapter),
    dispose: () => adapter.dispose(),
  }
}
