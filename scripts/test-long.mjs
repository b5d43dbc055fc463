/** `npm run test:long`: the long proofs whole (kills at 25 moments, the demo recomputed …). Takes tens of minutes. */
import { dirname } from 'node:path'
import { fileURLToPath } from 'node:url'
import { requireNode } from './lib/node-version.mjs'

requireNode()

const root = dirname(dirname(fileURLToPath(import.meta.url)))
const { setUp } = await import('./setup.mjs')
const { fail } = await import('./lib/child.mjs')
const { runStages, vitest } = await import('./lib/stages.mjs')

try {
  await setUp()
  process.exitCode = (await runStages([
    { name: 'long proofs', run: () => vitest(root, 'long', { LEDGERLINE_SHARE: '1' }) },
  ]))
    ? 0
    : 1
} catch (error) {
  fail(error)
}
