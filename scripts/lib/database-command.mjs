/** What the commands that look after the database have in common. */
import { mkdirSync } from 'node:fs'
import { dirname, join } from 'node:path'
import { CommandFailed, fail } from './child.mjs'
import { withLockFile } from './lock-file.mjs'
import { root } from './schema.mjs'
import { importTypeScript } from './typescript.mjs'

export const prismaFolder = () => process.env.LEDGERLINE_PRISMA_FOLDER ?? join(root, 'prisma')

/** A module of lib/data. */
export const data = (name) => importTypeScript(root, `lib/data/${name}.ts`)

/** The checked environment; on the embedded engine with the database's `path`. */
export const readDatabaseSettings = async () => {
  const { readEnvironment, filePath } = await data('env')
  const result = readEnvironment(process.env)
  if (!result.ok)
    throw new CommandFailed(
      result.problems.map(({ message, mend }) => [message, mend].filter(Boolean).join(' ')).join('\n'),
    )
  const { engine, databaseUrl, dataDir } = result.value
  return {
    engine,
    databaseUrl,
    dataDir,
    path: engine === 'sqlite' ? filePath(databaseUrl) : undefined,
  }
}

/** Holds the lock that a start, a migration and a restore of one database file share. */
export const withDatabaseLock = (path, work) => {
  mkdirSync(dirname(path), { recursive: true, mode: 0o700 })
  return withLockFile(`${path}.lock`, work)
}

/** Applies what is missing and says so. The caller holds the lock. */
export const migrateAndTell = async (settings) => {
  const { migrate } = await data('migrate')
  const { readMigrationSet } = await data('migration-files')
  const report = await migrate(settings, readMigrationSet(settings.engine, prismaFolder()))
  if (report.applied.length > 0) process.stdout.write(`Database: applied ${report.applied.join(', ')}.\n`)
  if (report.copy) process.stdout.write(`The database as it was: ${report.copy}\n`)
}

/** Runs a command to its end; a problem foreseen is said as sentences. */
export const runCommand = async (work) => {
  try {
    await work()
  } catch (error) {
    if (!error?.problem) fail(error)
    const { message, mend } = error.problem
    fail(new CommandFailed([message, mend].filter(Boolean).join('\n')))
  }
}
