/** Migrations and guards as they lie in `prisma/`. */
import { existsSync, readdirSync, readFileSync } from 'node:fs'
import { join } from 'node:path'
import type { Engine } from './database'

export interface Migration {
  readonly name: string
  readonly sql: string
}

export interface MigrationSet {
  readonly engine: Engine
  readonly lockfile: string
  /** In the order of their names, which is the order of application. */
  readonly migrations: readonly Migration[]
  /** Triggers and checks, made anew after every run: a table's redefinition drops them silently. */
  readonly guards: string
}

/**
 * Reads an engine's migrations and guards.
 * @param folder the project's `prisma` folder
 * @throws Error when a migration has no `migration.sql`
 */
export const readMigrationSet = (engine: Engine, folder: string): MigrationSet => {
  const home = join(folder, 'migrations', engine)
  const names = existsSync(home)
    ? readdirSync(home, { withFileTypes: true })
        .filter((entry) => entry.isDirectory())
        .map((entry) => entry.name)
        .sort()
    : []
  return {
    engine,
    lockfile: readFileSync(join(home, 'migration_lock.toml'), 'utf8'),
    migrations: names.map((name) => ({ name, sql: readFileSync(join(home, name, 'migration.sql'), 'utf8') })),
    guards: readFileSync(join(folder, 'guards', `${engine}.sql`), 'utf8'),
  }
}
