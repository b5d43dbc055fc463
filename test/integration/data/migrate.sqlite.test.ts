import { type ChildProcess, spawn } from 'node:child_process'
import { copyFileSync, cpSync, existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { setTimeout as pause } from 'node:timers/promises'
import BetterSqlite3 from 'better-sqlite3'
import { beforeEach, expect, it } from 'vitest'
import { inspectSqlite, openSqlite } from '@/lib/data/connections'
import { database } from '@/lib/data/database'
import { filePath } from '@/lib/data/env'
import { hashOfFile } from '@/lib/data/file-copies'
import { migrate } from '@/lib/data/migrate'
import { workingCopyOf } from '@/lib/data/migrate-sqlite'
import { storeOneOfEach } from '../../support/one-of-each'
import {
  closeConnections,
  describeOnEachEngine,
  migrationSet,
  useFreshDatabase,
} from '../../support/template-database'

const all = migrationSet('sqlite')
const next = (sql: string) => ({
  ...all,
  migrations: [...all.migrations, { name: '9000_next', sql }],
})
const addColumn = 'ALTER TABLE "Machine" ADD COLUMN "place" TEXT;'

const here = () => ({ engine: 'sqlite' as const, databaseUrl: process.env.DATABASE_URL ?? '' })
const path = () => filePath(here().databaseUrl)

/** Starts `node scripts/migrate.mjs` with migrations of its own. */
const startScript = (prismaFolder: string): ChildProcess =>
  spawn(process.execPath, ['scripts/migrate.mjs'], {
    env: { ...process.env, LEDGERLINE_PRISMA_FOLDER: prismaFolder },
    stdio: 'ignore',
  })

const ended = (child: ChildProcess) =>
  new Promise<number | null>((resolve) => child.once('close', (code) => resolve(code)))

describeOnEachEngine('migrate, on the database file', () => {
  useFreshDatabase('test')
  beforeEach(async () => {
    await storeOneOfEach()
    await closeConnections()
  })

  it('keeps a copy of the file as it was, byte for byte, and only the newest', async () => {
    const earlier = hashOfFile(path())
    const first = await migrate(here(), next(addColumn))
    expect(first.copy).toBe(`${path()}.before-9000_next`)
    expect(hashOfFile(first.copy ?? '')).toBe(earlier)

    const set = next(addColumn)
    const second = await migrate(here(), {
      ...set,
      migrations: [
        ...set.migrations,
        { name: '9001_more', sql: 'ALTER TABLE "Die" ADD COLUMN "place" TEXT;' },
      ],
    })
    expect(second.copy).toBe(`${path()}.before-9001_more`)
    expect(existsSync(first.copy ?? '')).toBe(false)
  })

  it('takes what is only in the log along', async () => {
    const connection = openSqlite(path())
    connection.pragma('wal_autocheckpoint = 0')
    connection.exec(`update "Lot" set "version" = 77`)
    // A process that was killed leaves its log behind.
    const log = readFileSync(`${path()}-wal`)
    const file = readFileSync(path())
    connection.close()
    writeFileSync(path(), file)
    writeFileSync(`${path()}-wal`, log)

    const { copy } = await migrate(here(), next(addColumn))
    const copied = inspectSqlite(copy ?? '')
    expect(copied.prepare('select "version" from "Lot"').pluck().get()).toBe(77)
    copied.close()
    expect((await database().read.lot.findFirst())?.version).toBe(77)
  })

  it('turns a file with a rollback journal into one with a log', async () => {
    const connection = new BetterSqlite3(path())
    connection.pragma('journal_mode = delete')
    connection.close()
    await migrate(here(), next(addColumn))
    const inspected = inspectSqlite(path())
    expect(inspected.pragma('journal_mode', { simple: true })).toBe('wal')
    inspected.close()
  })

  it('refuses while another process has the file open', async () => {
    const earlier = hashOfFile(path())
    const other = openSqlite(path())
    other.prepare('select count(*) from "Lot"').get()
    await expect(migrate(here(), next(addColumn))).rejects.toMatchObject({
      problem: { code: 'busy', message: 'ledgerline.db is in use by another process.' },
    })
    other.close()
    expect(hashOfFile(path())).toBe(earlier)
    expect(existsSync(workingCopyOf(path()))).toBe(false)
  })

  it('refuses a damaged file and leaves it as it is', async () => {
    const bytes = readFileSync(path())
    // Inside the pages of tables and indexes, past the first page.
    bytes.fill(0xa5, 4096 * 40, 4096 * 60)
    writeFileSync(path(), bytes)
    const earlier = hashOfFile(path())
    await expect(migrate(here(), next(addColumn))).rejects.toMatchObject({ problem: { code: 'storage' } })
    expect(hashOfFile(path())).toBe(earlier)
  })

  it('refuses a migration that leaves a reference to nothing, and puts the copy back', async () => {
    const earlier = hashOfFile(path())
    const orphan = `PRAGMA foreign_keys=OFF;\nINSERT INTO "Specimen" ("clientId", "lotId", "number", "createdAt") VALUES ('x', 999, 9, 0);`
    await expect(migrate(here(), next(orphan))).rejects.toMatchObject({
      problem: {
        message: expect.stringContaining('an entry of Specimen refers to something that is not there'),
      },
    })
    expect(hashOfFile(path())).toBe(earlier)
  })

  it('puts the copy back that an interrupted migration left', async () => {
    copyFileSync(path(), workingCopyOf(path()))
    const broken = new BetterSqlite3(path())
    broken.exec(`${addColumn}; insert into _prisma_migrations (id, checksum, migration_name, started_at, applied_steps_count)
      values ('x', 'x', '9000_next', 1, 0)`)
    broken.close()
    expect((await migrate(here(), next(addColumn))).applied).toEqual(['9000_next'])
    expect((await database().read.reading.findMany()).length).toBe(1)
  })

  it('goes on after it was killed half-way, and loses nothing', async () => {
    const folder = join(process.env.DATA_DIR ?? '', 'prisma')
    cpSync('prisma', folder, { recursive: true })
    const home = join(folder, 'migrations/sqlite/9000_next')
    mkdirSync(home)
    const slow = `${addColumn}
CREATE TABLE "Filler" AS WITH RECURSIVE n(x) AS (SELECT 1 UNION ALL SELECT x + 1 FROM n WHERE x < 40000000) SELECT x FROM n;`
    writeFileSync(join(home, 'migration.sql'), slow)
    const earlier = hashOfFile(path())
    const child = startScript(folder)
    const end = ended(child)
    for (let tries = 0; tries < 600 && !existsSync(workingCopyOf(path())); tries += 1) await pause(20)
    await pause(100)
    child.kill('SIGKILL')
    expect(await end).toBeNull()
    expect(hashOfFile(workingCopyOf(path()))).toBe(earlier)
    expect(existsSync(`${path()}.lock`)).toBe(true)

    writeFileSync(join(home, 'migration.sql'), addColumn)
    expect(await ended(startScript(folder))).toBe(0)
    expect(existsSync(`${path()}.lock`)).toBe(false)
    const [reading] = await database().read.reading.findMany()
    expect(reading?.body).toBe('{"diameters":[0.000254]}')
    expect(await database().read.$queryRawUnsafe('select "place" from "Machine"')).toEqual([])
  })
})
