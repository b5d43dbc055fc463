/**
 * The one door to the database. `read` refuses to write; `write` is the only way to change anything:
 * one lock, one transaction, closed when it ends.
 *
 * Why a lock: the embedded engine's client shares one connection, so a plain write issued while another
 * request's transaction is open lands inside it, is acknowledged, and vanishes when that one rolls back.
 */
import { connectionFactory } from './connections'
import {
  isBusy,
  isReadOnlyRefusal,
  isSerialisationFailure,
  storageProblem,
  uniqueViolation,
} from './db-errors'
import { type Environment, requireEnvironment } from './env'
import { PrismaClient as PostgresqlClient } from './generated/postgresql/client'
import { PrismaClient } from './generated/sqlite/client'
import { type Call, guardClient, isReading, nameOf } from './guarded-client'
import { type Inside, sharedState } from './shared-state'

export type Tx = Omit<PrismaClient, '$connect' | '$disconnect' | '$on' | '$transaction' | '$extends' | '$use'>

export type Engine = 'sqlite' | 'postgresql'

export interface Database {
  readonly engine: Engine
  /**
   * For queries outside a transaction: sees only what is committed, refuses to write, and throws inside
   * `write`, where `tx` is the client to use.
   */
  readonly read: Tx
  /**
   * Takes the write lock, opens a transaction, runs `work`, commits. `tx` throws once `work` has ended, and
   * `work` fails when it ends before a call that it made. When another connection holds the file, or the
   * database breaks a tie between two transactions, `work` runs again: it must change nothing but through `tx`.
   * @throws LedgerlineError for what `db-errors.ts` knows; else whatever `work` throws
   */
  write<T>(work: (tx: Tx) => Promise<T>): Promise<T>
  /** Ends the connections; the next `database()` opens new ones. */
  close(): Promise<void>
}

/** Milliseconds. A transaction has no slow work inside; one that hangs is given up, so that others go on. */
export interface Patience {
  /** How long a transaction may take. */
  readonly transaction: number
  /** How long to try for the file when another connection holds it. */
  readonly busy: number
  /** How long the client may take to begin a transaction: queues wait outside it, at the lock. */
  readonly begin: number
}

const usualPatience: Patience = { transaction: 20_000, busy: 20_000, begin: 5_000 }

const pauseMilliseconds = 15
const mostAttempts = 8

const pause = (milliseconds: number) => new Promise<void>((done) => setTimeout(done, milliseconds))

/** The client of an engine. Both are generated from one schema: PostgreSQL's is used under SQLite's type. */
const openClient = (
  environment: Pick<Environment, 'engine' | 'databaseUrl'>,
  role: 'writer' | 'reader',
): PrismaClient => {
  const options = { adapter: connectionFactory(environment, role), errorFormat: 'minimal' } as const
  return environment.engine === 'sqlite'
    ? new PrismaClient(options)
    : (new PostgresqlClient(options) as unknown as PrismaClient)
}

const nested = (what: string): Error =>
  new Error(`${what} inside database().write: use the tx that the transaction was given.`)

const afterEnd = (what: string): Error =>
  new Error(`${what} after its transaction ended: a call inside database().write was not awaited.`)

/** Opens a database of its own. Everything but tests and scripts uses `database()`. */
export const openDatabase = (
  environment: Pick<Environment, 'engine' | 'databaseUrl'>,
  patience: Patience = usualPatience,
): Database => {
  const { inside, writeLock } = sharedState()
  const { engine } = environment
  const writer = openClient(environment, 'writer')
  const reader = openClient(environment, 'reader')

  const read = guardClient(reader, {
    engine,
    allow: (call) => {
      if (inside.getStore()?.open) throw nested(`database().read.${nameOf(call)}`)
      if (!isReading(call)) throw new Error(`database().read does not write: ${nameOf(call)} was called.`)
    },
    failure: (error) =>
      isReadOnlyRefusal(error)
        ? new Error('database().read does not write: a raw query tried to.', { cause: error })
        : (storageProblem(error) ?? error),
  })

  /** One transaction from beginning to end. */
  const attempt = async <T>(work: (tx: Tx) => Promise<T>): Promise<T> => {
    const state: Inside = { open: true, sealed: false }
    const pending = new Set<Call>()
    const run = async (client: object): Promise<T> => {
      const tx = guardClient(client, {
        engine,
        pending,
        allow: (call) => {
          if (!state.open) throw afterEnd(nameOf(call))
          if (state.sealed && !isReading(call))
            throw new Error(
              `${nameOf(call)} after the ledger entry, which is the last write of a transaction.`,
            )
        },
      })
      const result = await work(tx)
      if (pending.size > 0)
        throw new Error(
          `Not awaited inside database().write: ${[...pending].map(nameOf).join(', ')}. Nothing was stored.`,
        )
      return result
    }
    // The client ends a transaction that takes too long; work that hangs must not keep the lock beyond that.
    let giveUp: NodeJS.Timeout | undefined
    const overdue = new Promise<never>((_, reject) => {
      giveUp = setTimeout(
        () => reject(new Error('A transaction took too long and was rolled back.')),
        patience.transaction + 1_000,
      )
    })
    try {
      return await Promise.race([
        writer.$transaction(
          (client) =>
            inside.run(state, () =>
              run(client).finally(() => {
                state.open = false
              }),
            ),
          { maxWait: patience.begin, timeout: patience.transaction },
        ),
        overdue,
      ])
    } finally {
      state.open = false
      clearTimeout(giveUp)
    }
  }

  /** Repeats a transaction that was rolled back because another one was in its way. */
  const attempts = async <T>(work: (tx: Tx) => Promise<T>): Promise<T> => {
    const until = Date.now() + patience.busy
    for (let count = 1; ; count += 1) {
      try {
        return await attempt(work)
      } catch (error) {
        const again =
          engine === 'sqlite'
            ? isBusy(error) && Date.now() < until
            : (isSerialisationFailure(error) && count < mostAttempts) ||
              // Another transaction inserted the same meanwhile: looked up again, it is there.
              (uniqueViolation(error) !== undefined && count === 1)
        if (!again) throw storageProblem(error) ?? error
        await pause(engine === 'sqlite' ? pauseMilliseconds : pauseMilliseconds * count)
      }
    }
  }

  return {
    engine,
    read,
    write: async (work) => {
      const state = inside.getStore()
      if (state) throw state.open ? nested('database().write') : afterEnd('database().write')
      return writeLock[engine].run(() => attempts(work))
    },
    close: async () => {
      const shared = sharedState()
      if (shared.database?.read === read) shared.database = undefined
      await Promise.all([writer.$disconnect(), reader.$disconnect()])
    },
  }
}

/** The database of this process, opened at its first use as the environment says. */
export const database = (): Database => {
  const shared = sharedState()
  shared.database ??= openDatabase(requireEnvironment())
  return shared.database
}
