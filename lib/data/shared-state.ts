/**
 * What must exist once in a process. The bundler puts several copies of a module into one server, so a
 * module's own variables would be several locks and several connections: they live on `globalThis`.
 */
import { AsyncLocalStorage } from 'node:async_hooks'
import { poolSizes } from './connections'
import type { Database, Engine } from './database'
import type { SignInClient } from './sign-in-client'
import { createTurns, type Turns } from './turns'

/** The transaction that the running code is part of. */
export interface Inside {
  /** False once the transaction has ended; code that goes on after that was not awaited. */
  open: boolean
  /** True once the ledger entry is written: nothing may follow it. */
  sealed: boolean
}

interface SharedState {
  /**
   * The write lock. On the embedded engine one transaction at a time; on PostgreSQL as many as have a
   * connection, while rows are locked (`locks.ts`). Either way a queue waits here, before its transactions
   * begin: inside the client it would give up.
   */
  readonly writeLock: Readonly<Record<Engine, Turns>>
  readonly inside: AsyncLocalStorage<Inside>
  /** Which engine stands behind each guarded client. */
  readonly engineOf: WeakMap<object, Engine>
  database: Database | undefined
  signIn: SignInClient | undefined
}

const key = Symbol.for('ledgerline.database')

export const sharedState = (): SharedState => {
  const holder = globalThis as typeof globalThis & { [key]?: SharedState }
  holder[key] ??= {
    writeLock: { sqlite: createTurns(), postgresql: createTurns(poolSizes.writer) },
    inside: new AsyncLocalStorage<Inside>(),
    engineOf: new WeakMap<object, Engine>(),
    database: undefined,
    signIn: undefined,
  }
  return holder[key]
}
