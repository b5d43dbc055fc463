/**
 * `node scripts/migrate.mjs`: creates the database, or brings it to the newest migration, and ends. Run in a
 * process of its own before the server listens; several at once take turns. Reads DATA_DIR and DATABASE_URL.
 */
import { mkdirSync } from 'node:fs'
import { dirname, join, relative } from 'node:path'
import { CommandFailed, fail } from './lib/child.mjs'
import { withLockFile } from './lib/lock-file.mjs'
import { root } from './lib/schema.mjs'
import { importTypeScript } from './lib/typescript.mjs'

const sentences = (problem) => [problem.message, problem.mend].filter(Boolean).join('\n')

try {
  const { migrate, readMigrationSet, requireEnvironment, filePath } = await importTypeScript(
    root,
    'lib/data/migrate-command.ts',
  )
  const environment = requireEnvironment()
  const set = readMigrationSet(
    environment.engine,
    process.env.LEDGERLINE_PRISMA_FOLDER ?? join(root, 'prisma'),
  )
  const run = () => migrate(environment, set)
  let report
  if (environment.engine === 'sqlite') {
    const path = filePath(environment.databaseUrl)
    mkdirSync(dirname(path), { recursive: true, mode: 0o700 })
    report = await withLockFile(`${path}.lock`, run)
  } else report = await run()
  if (report.applied.length > 0) process.stdout.write(`Database: applied ${report.applied.join(', ')}.\n`)
  if (report.copy) process.stdout.write(`The database as it was: ${relative(process.cwd(), report.copy)}\n`)
} catch (error) {
  fail(error.problem ? new CommandFailed(sentences(error.problem)) : error)
}
