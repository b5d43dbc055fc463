/**
 * `node scripts/setup.mjs`: packages as locked and the database clients, nothing else. Every other command
 * begins with it. Does nothing when nothing changed; two at once wait for each other.
 */
import { dirname, join } from 'node:path'
import { fileURLToPath } from 'node:url'
import { requireNode } from './lib/node-version.mjs'

requireNode()

const root = dirname(dirname(fileURLToPath(import.meta.url)))

/** @returns {Promise<void>} */
export const setUp = async () => {
  const { installPackages } = await import('./lib/install.mjs')
  const { runNode } = await import('./lib/child.mjs')
  await installPackages(root)
  await runNode([join(root, 'scripts/generate-clients.mjs')], 'The database clients could not be made.', {
    cwd: root,
  })
}

if (process.argv[1] === fileURLToPath(import.meta.url)) {
  const { fail } = await import('./lib/child.mjs')
  await setUp().catch(fail)
}
