/**
 * One SQLite connection shared by many requests, made safe.
 *
 * The driver's own adapter lets a plain statement land inside whatever transaction is open on the connection:
 * acknowledged, then gone when that one rolls back. It begins deferred transactions, which fail at once when
 * they read first and another connection wrote in between; stays inside a transaction whose COMMIT found the
 * file busy, so that later writes vanish with it; and never hands the turn on when BEGIN fails. Here statements
 * and transactions take turns, BEGIN is IMMEDIATE for whoever writes, what did not commit is rolled back for certain, and the turn
 * is always handed on.
 */
import { setTimeout as pause } from 'node:timers/promises'
import type { IsolationLevel, SqlDriverAdapter, Transaction } from '@prisma/driver-adapter-utils'
import { isBusy } from './db-errors'
import { createTurns } from './turns'

const pauseMilliseconds = 15

/**
 * Wraps an adapter of one connection.
 * @param busyPatience milliseconds to try again, without stopping the server, while another connection holds the
 * file. Only what has done nothing yet is tried again: a statement outside a transaction, or BEGIN.
 * @param writes whether its transactions write. One that only reads may not ask for the right to: the client opens
 * a transaction for a reading of several queries, too.
 */
export const takeTurns = (adapter: SqlDriverAdapter, busyPatience = 0, writes = true): SqlDriverAdapter => {
  const turns = createTurns()
  const run = (sql: string) => adapter.executeRaw({ sql, args: [], argTypes: [] })
  const rollBackIfOpen = () => run('ROLLBACK').catch(() => undefined)

  const whileBusy = async <T>(work: () => Promise<T>): Promise<T> => {
    const until = Date.now() + busyPatience
    for (;;) {
      try {
        return await work()
      } catch (error) {
        if (!isBusy(error) || Date.now() >= until) throw error
        await pause(pauseMilliseconds)
      }
    }
  }

  const startTransaction = async (isolationLevel?: IsolationLevel): Promise<Transaction> => {
    if (isolationLevel !== undefined && isolationLevel !== 'SERIALIZABLE')
      throw new Error(`SQLite has no isolation level ${isolationLevel}`)
    const handOn = await turns.take()
    try {
      await whileBusy(() => run(writes ? 'BEGIN IMMEDIATE' : 'BEGIN'))
    } catch (error) {
      handOn()
      throw error
    }
    return {
      provider: adapter.provider,
      adapterName: adapter.adapterName,
      options: { usePhantomQuery: false },
      queryRaw: (query) => adapter.queryRaw(query),
      executeRaw: (query) => adapter.executeRaw(query),
      // The client has sent COMMIT or ROLLBACK already. After a COMMIT that failed it sends nothing more.
      commit: async () => handOn(),
      rollback: async () => {
        await rollBackIfOpen()
        handOn()
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
    queryRaw: (query) => turns.run(() => whileBusy(() => adapter.queryRaw(query))),
    executeRaw: (query) => turns.run(() => whileBusy(() => adapter.executeRaw(query))),
    executeScript: (script) => turns.run(() => adapter.executeScript(script)),
    startTransaction,
    getConnectionInfo: adapter.getConnectionInfo?.bind(adapter),
    dispose: () => adapter.dispose(),
  }
}
