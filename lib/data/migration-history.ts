/** What the schema engine says of a database's past, and what is refused because of it. */
import type { MigrationList } from '@prisma/schema-engine-wasm/schema_engine_bg'
import { problem } from '@/lib/domain/errors'
import type { MigrationSet } from './migration-files'
import { noFilters, type SchemaEngine } from './schema-engine'

const listOf = (set: MigrationSet): MigrationList => ({
  baseDir: '/migrations',
  lockfile: { path: 'migration_lock.toml', content: set.lockfile },
  shadowDbInitScript: '',
  migrationDirectories: set.migrations.map(({ name, sql }) => ({
    path: name,
    migrationFile: { path: 'migration.sql', content: { tag: 'ok', value: sql } },
  })),
})

const codeOf = (error: unknown): string | undefined => (error as { code?: string } | undefined)?.code

/** The engine's code for a database that has no table of migrations yet, or does not exist. */
const noHistory = new Set(['P1014', 'P1003'])

/**
 * The names of the migrations that a database lacks.
 * @throws LedgerlineError when its past is not a beginning of `set`. Applying alone would not notice: the
 * engine accepts a migration that was edited after it had been applied.
 */
export const missingMigrations = async (
  engine: SchemaEngine,
  set: MigrationSet,
): Promise<readonly string[]> => {
  const all = set.migrations.map(({ name }) => name)
  const diagnosis = await engine
    .diagnoseMigrationHistory({
      migrationsList: listOf(set),
      filters: noFilters,
      optInToShadowDatabase: false,
    })
    .catch((error: unknown) => {
      if (noHistory.has(codeOf(error) ?? '')) return undefined
      throw error
    })
  if (diagnosis === undefined || !diagnosis.hasMigrationsTable) return all

  const { editedMigrationNames: edited, failedMigrationNames: failed, history } = diagnosis
  if (failed.length > 0)
    throw problem(
      'storage',
      `Migration ${failed.join(', ')} was begun on this database and never finished.`,
      {
        mend: 'Put back the last copy or back-up of the database (npm run restore), then start again.',
      },
    )
  if (edited.length > 0)
    throw problem(
      'storage',
      `Migration ${edited.join(', ')} was edited after this database had applied it.`,
      {
        mend: 'Put the file back as it was, and make the change as a new migration (npm run migrate:new).',
      },
    )
  if (history === null) return []
  if (history.diagnostic === 'databaseIsBehind') return history.unappliedMigrationNames
  throw problem(
    'storage',
    `This database knows migrations that this program does not have: ${history.unpersistedMigrationNames.join(', ')}.`,
    { mend: 'It was made by a newer version of Ledgerline: use that version or a newer one.' },
  )
}

/** Applies what is missing; returns the names of what was applied. */
export const applyMissing = async (engine: SchemaEngine, set: MigrationSet): Promise<readonly string[]> => {
  const { appliedMigrationNames } = await engine.applyMigrations({
    migrationsList: listOf(set),
    filters: noFilters,
  })
  return appliedMigrationNames
}
