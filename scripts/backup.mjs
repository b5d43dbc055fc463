/**
 * `npm run backup [-- FOLDER]`: copies the database while the server runs, checks the copy, and writes a note
 * with its hash and the ledger's head beside it. Without a folder it goes to `backups` in the data folder.
 */
import { join, relative, resolve } from 'node:path'
import { CommandFailed } from './lib/child.mjs'
import { data, readDatabaseSettings, runCommand } from './lib/database-command.mjs'

await runCommand(async () => {
  const [folder, ...others] = process.argv.slice(2)
  if (others.length > 0 || folder?.startsWith('-')) throw new CommandFailed('npm run backup [-- FOLDER]')
  const { path, dataDir } = await readDatabaseSettings()
  if (path === undefined)
    throw new CommandFailed(
      'On PostgreSQL back-ups are the server’s own work: pg_dump --format=custom --file=FILE "$DATABASE_URL"',
    )
  const { backUp } = await data('backup')
  const backup = await backUp(path, resolve(folder ?? join(dataDir, 'backups')), new Date())
  const { count, hash } = backup.ledger
  process.stdout.write(
    `${relative(process.cwd(), backup.path)}: ${backup.bytes} bytes, checked.\n` +
      `Ledger: ${count} entries, ${hash}\nKeep a copy of both files on another machine.\n`,
  )
})
