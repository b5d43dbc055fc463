/**
 * The one door to the database. `read` refuses to write; `write` is the only way to change anything:
 * one lock, one transaction, closed when it ends. (Replaced piece by piece by the data layer.)
 */
import type { PrismaClient } from './generated/sqlite/client'

export type Tx = Omit<PrismaClient, '$connect' | '$disconnect' | '$on' | '$transaction' | '$extends' | '$use'>

export type Engine = 'sqlite' | 'postgresql'

export interface Database {
  readonly engine: Engine
  /** For queries outside a transaction: sees only what is committed, refuses to write. */
  readonly read: Tx
  /** Takes the write lock, opens a transaction, runs `work`, commits. `tx` throws once `work` has ended. */
  write<T>(work: (tx: Tx) => Promise<T>): Promise<T>
  close(): Promise<void>
}

export declare function database(): Database
