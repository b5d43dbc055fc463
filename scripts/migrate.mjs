/**
 * `node scripts/migrate.mjs`: creates the database, or brings it to the newest migration, and ends. Run in a
 * process of its own before the server listens; several at once take turns. Reads DATA_DIR and DATABASE_URL.
 */
import {
  migrateAndTell,
  readDatabaseSettings,
  runCommand,
  withDatabaseLock,
} from './lib/database-command.mjs'

await runCommand(async () => {
  const settings = await readDatabaseSettings()
  const run = () => migrateAndTell(settings)
  await (settings.path ? withDatabaseLock(settings.path, run) : run())
})
