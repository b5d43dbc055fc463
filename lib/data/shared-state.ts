/**
 * What must exist once in a process. The bundler puts several copies of a module into one server, so a
 * module's own variables would be several locks and several connections: they live on `globalThis`.
 */
import { AsyncLocalStorage } from 'node:async_hooks'
import type { Database } from './database'
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
  /** The write lock of the embedded engine. */
  readonly writeLock: Turns
  readonly inside: AsyncLocalStorage<Inside>
  database: Database | undefined
  signIn: SignInClient | undefined
}

const key = Symbol.for('ledgerline.database')

export const sharedState = (): SharedState => {
  const holder = globalThis as typeof globalThis & { [key]?: SharedState }
  holder[key] ??= {
    writeLock: createTurns(),
    inside: new AsyncLocalStorage<Inside>(),
    database: undefined,
    signIn: undefined,
  }
  return holder[key]
}
