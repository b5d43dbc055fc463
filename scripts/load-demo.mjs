/**
 * `node scripts/load-demo.mjs`: fills an empty works with the demo, prints progress and one account a role.
 * Part of `npm start -- --demo`. Reads DATA_DIR and DATABASE_URL; the database has to be migrated.
 */

import { readDatabaseSettings, runCommand } from './lib/database-command.mjs'
import { root } from './lib/schema.mjs'
import { importTypeScript } from './lib/typescript.mjs'

await runCommand(async () => {
  const settings = await readDatabaseSettings()
  process.env.DATA_DIR = settings.dataDir
  process.env.DATABASE_URL = settings.databaseUrl
  const demo = await importTypeScript(root, 'prisma/demo/load-demo-works.ts')
  const tell = (line) => process.stdout.write(`${line}\n`)
  try {
    const loaded = await demo.loadDemoWorks(tell)
    if (loaded === 'there already') tell('A works is set up here already; the demo was not loaded.')
    else for (const line of demo.demoAccounts()) tell(`  ${line}`)
  } finally {
    await demo.closeDatabase()
  }
})
