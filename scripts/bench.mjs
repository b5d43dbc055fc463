/**
 * `npm run bench`: how fast the core, the charts and storing are, each as a ratio to a fixed piece of arithmetic of
 * the same run. No time is stable on shared computers; ratios nearly are. Judges nothing: read it before and after
 * a change.
 */
import { mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { dirname, join } from 'node:path'
import { fileURLToPath } from 'node:url'
import { requireNode } from './lib/node-version.mjs'

requireNode()

const root = dirname(dirname(fileURLToPath(import.meta.url)))
const { setUp } = await import('./setup.mjs')
const { fail, runNode } = await import('./lib/child.mjs')

const dataDir = mkdtempSync(join(tmpdir(), 'ledgerline-bench-'))
try {
  await setUp()
  const options = { cwd: root, env: { DATA_DIR: dataDir, DATABASE_URL: '' } }
  await runNode([join(root, 'scripts/migrate.mjs')], 'The database of the measurement was not made.', options)
  const program = join(root, 'scripts/bench-run.ts')
  await runNode(['--import', import.meta.resolve('tsx'), program], 'The measurement did not end.', options)
} catch (error) {
  fail(error)
} finally {
  rmSync(dataDir, { recursive: true, force: true })
}
