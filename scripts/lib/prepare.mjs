/** What comes between the packages and the server: settings checked, data folder and database ready. */
import { accessSync, constants, existsSync, mkdirSync } from 'node:fs'
import { createServer } from 'node:net'
import { join } from 'node:path'
import { CommandFailed, runNode } from './child.mjs'
import { importTypeScript } from './typescript.mjs'

/** The checked environment. A bad variable is a sentence. */
export const readSettings = async (root) => {
  const { readEnvironment } = await importTypeScript(root, 'lib/data/env.ts')
  const result = readEnvironment(process.env, root)
  if (result.ok) return result.value
  throw new CommandFailed(
    result.problems.map(({ message, mend }) => `${message} ${mend ?? ''}`.trim()).join('\n'),
  )
}

/** Makes the data folder; only its owner may look inside. */
export const prepareDataFolder = (dataDir) => {
  try {
    mkdirSync(dataDir, { recursive: true, mode: 0o700 })
    accessSync(dataDir, constants.R_OK | constants.W_OK | constants.X_OK)
  } catch (error) {
    throw new CommandFailed(
      `DATA_DIR: ${dataDir} can't be made or written to (${error.code}). Give another folder.`,
    )
  }
}

/** Fails early, before a build, when someone else listens there. */
export const requireFreePort = async ({ host, port }) => {
  if (port === 0) return
  const probe = createServer()
  await new Promise((resolve, reject) => {
    probe.once('error', (error) => reject(new CommandFailed(listenSentence(error, { host, port }))))
    probe.listen({ host, port, exclusive: true }, () => probe.close(resolve))
  })
}

/** Why a server could not listen, as a sentence. */
export const listenSentence = (error, { host, port }) => {
  const place = `port ${port} of ${host}`
  if (error.code === 'EADDRINUSE')
    return `PORT: ${place} is in use. End what listens there, or give another PORT.`
  if (error.code === 'EACCES') return `PORT: this account may not listen on ${place}. Give a PORT above 1023.`
  if (error.code === 'EADDRNOTAVAIL' || error.code === 'ENOTFOUND')
    return `HOST: ${host} is no address of this computer. Give one, such as HOST=127.0.0.1.`
  return `Ledgerline could not listen on ${place}: ${error.message}`
}

const settingsForChildren = (settings) => ({ DATA_DIR: settings.dataDir, DATABASE_URL: settings.databaseUrl })

/** Creates or migrates the database, in a process of its own, before anything else opens it. */
export const migrate = (root, settings) =>
  runNode([join(root, 'scripts/migrate.mjs')], 'The database was not migrated; nothing was started.', {
    cwd: root,
    env: settingsForChildren(settings),
  })

/** Fills an empty works with the demo and prints one account a role. */
export const loadDemo = async (root, settings) => {
  const script = join(root, 'scripts/load-demo.mjs')
  if (!existsSync(script)) throw new CommandFailed('--demo: this version has no demo works.')
  await runNode([script], 'The demo works was not loaded; nothing was started.', {
    cwd: root,
    env: settingsForChildren(settings),
  })
}
