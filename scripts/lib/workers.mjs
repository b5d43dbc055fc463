/** The import's thread as one file, bundled from the sources: a thread can't load TypeScript by itself. */
import { mkdirSync, renameSync } from 'node:fs'
import { join } from 'node:path'

/** @returns {Promise<string>} the bundle's path */
export const buildWorkers = async (root) => {
  const { build } = await import('esbuild')
  const folder = join(root, 'build/workers')
  mkdirSync(folder, { recursive: true })
  const to = join(folder, 'import.mjs')
  // Written beside and moved into place: a server that is running never loads half a file.
  const made = `${to}.${process.pid}.mjs`
  await build({
    entryPoints: [join(root, 'lib/services/import/worker.ts')],
    outfile: made,
    bundle: true,
    platform: 'node',
    format: 'esm',
    target: 'node20',
    packages: 'external',
    tsconfig: join(root, 'tsconfig.json'),
    logLevel: 'warning',
  })
  renameSync(made, to)
  return to
}
