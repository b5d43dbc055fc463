/** The order of a start, shared by `npm start` and `npm run dev`. */
import { dirname, relative } from 'node:path'
import { fileURLToPath } from 'node:url'
import { setUp } from '../setup.mjs'
import { buildApp } from './build.mjs'
import { CommandFailed, fail } from './child.mjs'
import { announceFirstAccount } from './first-account.mjs'
import { loadDemo, migrate, prepareDataFolder, readSettings, requireFreePort } from './prepare.mjs'
import { serve } from './serve.mjs'
import { buildWorkers } from './workers.mjs'

const root = dirname(dirname(dirname(fileURLToPath(import.meta.url))))

const parseArguments = (args) => {
  const unknown = args.find((arg) => arg !== '--demo')
  if (unknown !== undefined)
    throw new CommandFailed(
      `${unknown} is not an option of this command; --demo is, it loads the demo works.`,
    )
  return { demo: args.includes('--demo') }
}

/**
 * @param {readonly string[]} args
 * @param {{ dev?: boolean }} [options]
 */
export const start = async (args, { dev = false } = {}) => {
  try {
    const { demo } = parseArguments(args)
    process.chdir(root)
    await setUp()
    const settings = await readSettings(root)
    await requireFreePort(settings)
    prepareDataFolder(settings.dataDir)
    await migrate(root, settings)
    if (demo) await loadDemo(root, settings)
    await (dev ? buildWorkers(root) : buildApp(root))
    const address = await serve(root, settings, { dev })
    await announceFirstAccount(root, settings, address)
    const place =
      settings.engine === 'sqlite' ? relative(root, settings.dataDir) || '.' : 'a PostgreSQL server'
    process.stdout.write(`Ledgerline serves ${address}  (data in ${place}; Ctrl+C stops)\n`)
  } catch (error) {
    fail(error)
  }
}
