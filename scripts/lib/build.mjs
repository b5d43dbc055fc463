/** The built app: made again when a hash of all its sources changed, and only then. */
import { existsSync, mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { runNode } from './child.mjs'
import { fingerprint } from './fingerprint.mjs'
import { withLockFile } from './lock-file.mjs'
import { buildWorkers } from './workers.mjs'

/** Everything the build reads. Generated clients follow from prisma/schema and the lock. */
const sources = [
  'app',
  'lib',
  'public',
  'prisma/schema',
  'proxy.ts',
  'instrumentation.ts',
  'next.config.ts',
  'tsconfig.json',
  'package.json',
  'package-lock.json',
]

const generated = (path) => path.includes('generated')

/** Builds if needed. @returns {Promise<'built' | 'there'>} */
export const buildApp = async (root) => {
  const folder = join(root, '.next')
  const stamp = join(folder, 'ledgerline-sources')
  const hash = fingerprint(root, sources, { skip: generated, salt: process.version })
  const fresh = () =>
    existsSync(stamp) &&
    readFileSync(stamp, 'utf8') === hash &&
    existsSync(join(root, 'build/workers/import.mjs'))
  if (fresh()) return 'there'
  mkdirSync(join(root, 'build'), { recursive: true })
  return withLockFile(
    join(root, 'build/build.lock'),
    async () => {
      if (fresh()) return 'there'
      process.stdout.write('Building the app: half a minute after each change.\n')
      rmSync(stamp, { force: true })
      await runNode(
        [join(root, 'node_modules/next/dist/bin/next'), 'build'],
        'The app could not be built; the reason stands above.',
        {
          cwd: root,
          env: { NODE_ENV: 'production' },
        },
      )
      await buildWorkers(root)
      writeFileSync(stamp, hash)
      return 'built'
    },
    900_000,
  )
}
