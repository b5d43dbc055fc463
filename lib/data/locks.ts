/**
 * Row locks. On PostgreSQL transactions run side by side: whoever changes a lot first locks its row, so that
 * what was read stays true until the commit. On SQLite the write lock has done that already.
 */
import type { Tx } from './database'
import { engineOf } from './guarded-client'

/** Tables whose rows are locked before what hangs on them is changed; each has an integer `id`. */
export type LockableTable =
  | 'Lot'
  | 'Product'
  | 'Person'
  | 'Works'
  | 'Material'
  | 'Datasheet'
  | 'LimitSet'
  | 'Gauge'
  | 'Weight'
  | 'Rig'
  | 'Machine'
  | 'Die'
  | 'MaterialIn'
  | 'Import'

/** Locks one row until the transaction ends; waits for another transaction that holds it. */
export const lockRow = async (tx: Tx, table: LockableTable, id: number): Promise<void> => {
  if (engineOf(tx) === 'sqlite') return
  await tx.$queryRawUnsafe(`select id from "${table}" where id = $1 for update`, id)
}

/** The first statement of every transaction that changes a lot or anything that hangs on it. */
export const lockLot = (tx: Tx, lotId: number): Promise<void> => lockRow(tx, 'Lot', lotId)

/** Any number that no other advisory lock of this database uses. */
const SIGN_IN_LOCK = 5_127_004

/** Tries to sign in are counted one after the other: their counters may not be there yet, so there is no row to lock. */
export const lockSignIn = async (tx: Tx): Promise<void> => {
  if (engineOf(tx) === 'sqlite') return
  await tx.$queryRawUnsafe('select pg_advisory_xact_lock($1::bigint)::text', SIGN_IN_LOCK)
}
