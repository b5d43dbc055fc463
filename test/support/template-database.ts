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

/** A database of the engine's own kind with nothing in it, or (embedded engine) a place for one. */
export const createEmptyDatabase = (): Promise<TestDatabase> =>
  testEngine === 'sqlite' ? Promise.resolve(sqliteAt(temporaryFolder())) : createOnCluster('template0')

/** A fresh copy of the template. Most tests want `useFreshDatabase`. */
export const createTestDatabase = async (): Promise<TestDatabase> => {
  if (testEngine === 'postgresql')
    return createOnCluster(new URL(inject('postgresqlTemplate')).pathname.slice(1))
  const template = await sqliteTemplate()
  const folder = temporaryFolder()
  copyFileSync(template, join(folder, 'ledgerline.db'))
  return sqliteAt(folder)
}

const sqliteAt = (folder: string): TestDatabase => ({
  engine: 'sqlite',
  folder,
  databaseUrl: `file:${join(folder, 'ledgerline.db')}`,
  drop: async () => rmSync(folder, { recursive: true, force: true }),
})

const createOnCluster = async (template: string): Promise<TestDatabase> => {
  const own = new URL(inject('postgresqlTemplate'))
  const server = new URL(own)
  server.pathname = '/postgres'
  const name = `t_${randomUUID().replaceAll('-', '')}`
  own.pathname = `/${name}`
  // Making a copy needs the template for itself; test files that start together take turns.
  await onCluster(
    server.href,
    'select pg_advisory_lock(7731)',
    `create database ${name} template ${template}`,
  )
  const folder = temporaryFolder()
  return {
    engine: 'postgresql',
    folder,
    databaseUrl: own.href,
    drop: async () => {
      await onCluster(server.href, `drop database ${name} with (force)`)
      rmSync(folder, { recursive: true, force: true })
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
