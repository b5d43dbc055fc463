/**
 * `npm run validate [-- --cases FILE_OR_FOLDER] [--json OUT]`: checks the formulas against check cases.
 *
 * Without `--cases` the built-in cases of test/reference run; quantities that nothing computes yet are listed
 * as *not yet* and count neither way. With `--cases` any file of that form (or folder of such files) runs, and
 * there an unknown quantity counts as failed. `--json` writes every compared value. Ends with
 * `N passed, N failed`; exit code 1 when a case failed or none ran. Needs installed packages, nothing else.
 */
import { dirname, join } from 'node:path'
import { fileURLToPath } from 'node:url'
import { requireNode } from './lib/node-version.mjs'

requireNode()

const root = dirname(dirname(fileURLToPath(import.meta.url)))
const { fail, run } = await import('./lib/child.mjs')
const { installPackages } = await import('./lib/install.mjs')

try {
  await installPackages(root)
  const program = join(root, 'scripts/validate-cases.ts')
  process.exitCode = await run(process.execPath, [
    '--import',
    import.meta.resolve('tsx'),
    program,
    ...process.argv.slice(2),
  ])
} catch (error) {
  fail(error)
}
