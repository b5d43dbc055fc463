/**
 * A connection of its own for storing many rows at once, outside Prisma: one connection, one transaction at a
 * time, prepared statements. Only the import's worker uses it. Instants are epoch milliseconds on this side;
 * each engine stores them in its own way.
 */
import type { BulkTable } from './bulk-tables'

export type BulkValue = string | number | boolean | null

export type BulkRow = Readonly<Record<string, BulkValue>>

export interface BulkConnection {
  readonly engine: 'sqlite' | 'postgresql'
  /** Opens the write transaction; on SQLite it holds the file's write lock from now on. */
  begin(): Promise<void>
  commit(): Promise<void>
  /** Harmless when nothing is open. */
  rollback(): Promise<void>
  /** Rows of a query; `?` stands for each parameter. */
  rows<Row extends BulkRow>(sql: string, ...parameters: readonly BulkValue[]): Promise<readonly Row[]>
  /** @returns how many rows were changed */
  run(sql: string, ...parameters: readonly BulkValue[]): Promise<number>
  /** Inserts rows that carry every column of the table's list. */
  insert(table: BulkTable, rows: readonly BulkRow[]): Promise<void>
  /**
   * Ids for rows to come. On SQLite they hold as long as nobody else inserts meanwhile: whoever uses them checks
   * the ledger's head before anything is written.
   */
  reserveIds(table: string, count: number): Promise<readonly number[]>
  /** An instant as a parameter of `run`. */
  instant(epochMilliseconds: number): BulkValue
  close(): Promise<void>
}
