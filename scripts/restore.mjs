/**
 * `npm run restore -- FILE`: checks a back-up and puts it in the database's place; the database that was there
 * is kept beside it. A damaged back-up, or one of a newer version, is refused. The server must not run.
 */
import { relative, resolve } from 'node:path'
import { CommandFailed } from './lib/child.mjs'
import {
  data,
  migrateAndTell,
  prismaFolder,
  readDatabaseSettings,
  runCommand,
  withDatabaseLock,
} from './lib/database-command.mjs'

await runCommand(async () => {
  const [file, ...others] = process.argv.slice(2)
  if (file === undefined || others.length > 0 || file.startsWith('-'))
    throw new CommandFailed('npm run restore -- FILE')
  const settings = await readDatabaseSettings()
  const { path } = settings
  if (path === undefined)
    throw new CommandFailed(
      'On PostgreSQL restoring is the server’s own work: pg_restore --clean --dbname="$DATABASE_URL" FILE',
    )
  const { restore } = await data('restore')
  const { readMigrationSet } = await data('migration-files')
  const known = readMigrationSet('sqlite', prismaFolder()).migrations.map(({ name }) => name)
  await withDatabaseLock(path, async () => {
    const { kept, ledger } = await restore(resolve(file), path, known, new Date())
    await migrateAndTell(settings)
    process.stdout.write(`Restored. Ledger: ${ledger.count} entries, ${ledger.hash}\n`)
    if (kept) process.stdout.write(`What was there before: ${relative(process.cwd(), kept)}\n`)
  })
})
