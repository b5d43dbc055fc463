/**
 * The data model of both engines. The files in prisma/schema are written for SQLite; PostgreSQL's are made
 * from them by replacing provider and output, so that the two can't drift apart.
 */
import { createHash } from 'node:crypto'
import { readdirSync, readFileSync } from 'node:fs'
import { dirname, join } from 'node:path'
import { fileURLToPath } from 'node:url'

export const root = dirname(dirname(dirname(fileURLToPath(import.meta.url))))

export const engines = ['sqlite', 'postgresql']

/** @returns {[path: string, content: string][]} the schema's files for one engine, in the order of their names */
export const schemaFiles = (engine, folder = join(root, 'prisma/schema')) =>
  readdirSync(folder)
    .filter((name) => name.endsWith('.prisma'))
    .sort()
    .map((name) => [name, forEngine(engine, readFileSync(join(folder, name), 'utf8'))])

/** One text of SQLite's schema turned into the other engine's. */
export const forEngine = (engine, content) =>
  engine === 'sqlite'
    ? content
    : content
        .replace(/provider\s*=\s*"sqlite"/, 'provider = "postgresql"')
        .replace('lib/data/generated/sqlite', 'lib/data/generated/postgresql')

export const schemaHash = (files) => {
  const hash = createHash('sha256')
  for (const [path, content] of files) hash.update(`${path}\n${content}\n`)
  return hash.digest('hex')
}
