/**
 * Makes the database clients of both engines in lib/data/generated from prisma/schema. Works without a
 * network, and does nothing when the schema has not changed since the last time. `--force` makes them anyway.
 */
import { spawnSync } from 'node:child_process'
import { existsSync, mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs'
import { createRequire } from 'node:module'
import { dirname, join } from 'node:path'
import { withLockFile } from './lib/lock-file.mjs'
import { engines, root, schemaFiles, schemaHash } from './lib/schema.mjs'

const require = createRequire(import.meta.url)
const prismaPackage = require.resolve('prisma/package.json')
const prismaVersion = JSON.parse(readFileSync(prismaPackage, 'utf8')).version
const command = join(dirname(prismaPackage), 'build/index.js')

const generate = (engine) => {
  const target = join(root, 'lib/data/generated', engine)
  const stamp = join(target, '.schema-hash')
  const files = schemaFiles(engine)
  const wanted = `${prismaVersion} ${schemaHash(files)}`
  const fresh = existsSync(stamp) && readFileSync(stamp, 'utf8') === wanted
  if (fresh && !process.argv.includes('--force')) return

  // Same depth as prisma/schema: the relative output path stays true.
  const schema = join(root, 'build', `schema-${engine}`)
  rmSync(schema, { recursive: true, force: true })
  mkdirSync(schema, { recursive: true })
  for (const [name, content] of files) writeFileSync(join(schema, name), content)

  const run = spawnSync(process.execPath, [command, 'generate', '--schema', schema], {
    cwd: root,
    encoding: 'utf8',
    // The schema engine's binary would be downloaded; generating never calls it, so any program will do.
    env: {
      ...process.env,
      PRISMA_SCHEMA_ENGINE_BINARY: process.execPath,
      CHECKPOINT_DISABLE: '1',
      PRISMA_HIDE_UPDATE_MESSAGE: '1',
    },
  })
  if (run.status !== 0) {
    process.stderr.write(`${run.stdout}${run.stderr}\n`)
    throw new Error(`The ${engine} client could not be made from prisma/schema.`)
  }
  writeFileSync(stamp, wanted)
  process.stdout.write(`Made the ${engine} client.\n`)
}

mkdirSync(join(root, 'build'), { recursive: true })
await withLockFile(join(root, 'build/generate-clients.lock'), async () => engines.forEach(generate))
