/**
 * A migrated, empty database for a test file (or for each test), on the engine that this run is for. It is a
 * copy of a template that is made once, put in place before anything opens it: overwriting an open file keeps
 * old rows without a word.
 */
import { randomUUID } from 'node:crypto'
import { copyFileSync, existsSync, mkdirSync, mkdtempSync, renameSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { fileURLToPath } from 'node:url'
import { afterAll, afterEach, beforeAll, beforeEach, describe, inject } from 'vitest'
import { database, type Engine } from '@/lib/data/database'
import { sha256 } from '@/lib/data/hash'
import { migrate } from '@/lib/data/migrate'
import { type MigrationSet, readMigrationSet } from '@/lib/data/migration-files'
import { sharedState } from '@/lib/data/shared-state'
import { closeSignInClient } from '@/lib/data/sign-in-client'
import { onCluster } from './postgresql-cluster'

const root = fileURLToPath(new URL('../..', import.meta.url))

/** The engine that this run of the tests is for. */
export const testEngine: Engine =
  process.env.LEDGERLINE_TEST_ENGINE === 'postgresql' ? 'postgresql' : 'sqlite'

export const migrationSet = (engine: Engine = testEngine): MigrationSet =>
  readMigrationSet(engine, join(root, 'prisma'))

/** A new folder of this test's own, below the system's temporary one. */
export const temporaryFolder = (): string => mkdtempSync(join(tmpdir(), 'ledgerline-test-'))

/** The path of the embedded engine's template; made when migrations or guards have changed. */
const sqliteTemplate = async (): Promise<string> => {
  const set = migrationSet('sqlite')
  const folder = join(root, 'build/test-databases')
  const path = join(folder, `${sha256(JSON.stringify(set)).slice(0, 24)}.db`)
  if (existsSync(path)) return path
  mkdirSync(folder, { recursive: true })
  // Under a name of its own until it is whole: several test files may make it at the same time.
  const draft = join(folder, `${randomUUID()}.db`)
  await migrate({ engine: 'sqlite', databaseUrl: `file:${draft}` }, set)
  renameSync(draft, path)
  return path
}

export interface TestDatabase {
  readonly engine: Engine
  readonly databaseUrl: string
  /** Also the data folder. */
  readonly folder: string
  /** Removes it. */
  drop(): Promise<void>
}

/** A fresh copy of the template. Most tests want `useFreshDatabase`. */
export const createTestDatabase = async (engine: Engine = testEngine): Promise<TestDatabase> => {
  const folder = temporaryFolder()
  const removeFolder = () => rmSync(folder, { recursive: true, force: true })
  if (engine === 'sqlite') {
    const path = join(folder, 'ledgerline.db')
    copyFileSync(await sqliteTemplate(), path)
    return { engine, folder, databaseUrl: `file:${path}`, drop: async () => removeFolder() }
  }
  const template = new URL(inject('postgresqlTemplate'))
  const templateName = template.pathname.slice(1)
  const name = `t_${randomUUID().replaceAll('-', '')}`
  const own = new URL(template)
  own.pathname = `/${name}`
  const server = new URL(template)
  server.pathname = '/postgres'
  // Making a copy needs the template for itself; test files that start together take turns.
  await onCluster(
    server.href,
    'select pg_advisory_lock(7731)',
    `create database ${name} template ${templateName}`,
  )
  return {
    engine,
    folder,
    databaseUrl: own.href,
    drop: async () => {
      await onCluster(server.href, `drop database ${name} with (force)`)
      removeFolder()
    },
  }
}

/** Closes whatever this process has open, so that the next `database()` opens anew. */
export const closeConnections = async (): Promise<void> => {
  await sharedState().database?.close()
  await closeSignInClient()
}

/**
 * Gives the tests of this file, or of the `describe` it is called in, a fresh database behind `database()` and
 * `signInClient()`: one for all of them, or one each.
 */
export const useFreshDatabase = (per: 'file' | 'test' = 'file'): void => {
  const before = { url: process.env.DATABASE_URL, folder: process.env.DATA_DIR }
  let current: TestDatabase | undefined
  const open = async () => {
    await closeConnections()
    current = await createTestDatabase()
    process.env.DATABASE_URL = current.databaseUrl
    process.env.DATA_DIR = current.folder
    if (database().engine !== testEngine) throw new Error(`The database under test is not ${testEngine}.`)
  }
  const close = async () => {
    await closeConnections()
    await current?.drop()
    current = undefined
    restore('DATABASE_URL', before.url)
    restore('DATA_DIR', before.folder)
  }
  if (per === 'file') {
    beforeAll(open)
    afterAll(close)
  } else {
    beforeEach(open)
    afterEach(close)
  }
}

const restore = (name: string, value: string | undefined): void => {
  if (value === undefined) delete process.env[name]
  else process.env[name] = value
}

/**
 * A suite that holds on both engines: each run of the integration tests is for one of them, and says for which.
 * @param tests gets the engine, for the few places where the engines differ
 */
export const describeOnEachEngine = (name: string, tests: (engine: Engine) => void): void => {
  describe(`${name} (${testEngine})`, () => tests(testEngine))
}
