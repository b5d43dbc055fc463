import { type Environment, filePath } from '../env'
import type { BulkConnection } from './bulk-connection'
import { openBulkPostgresql } from './bulk-postgresql'
import { openBulkSqlite } from './bulk-sqlite'

/** A connection for storing many rows, on the engine that the environment names. */
export const openBulk = (
  environment: Pick<Environment, 'engine' | 'databaseUrl'>,
): Promise<BulkConnection> =>
  environment.engine === 'sqlite'
    ? Promise.resolve(openBulkSqlite(filePath(environment.databaseUrl)))
    : openBulkPostgresql(environment.databaseUrl)
