import { spawn } from 'node:child_process'
import { existsSync, readdirSync } from 'node:fs'
import { join } from 'node:path'
import pg from 'pg'
import { afterEach, beforeEach, expect, it } from 'vitest'
import { inspectSqlite } from '@/lib/data/connections'
import { database } from '@/lib/data/database'
import { filePath } from '@/lib/data/env'
import { hashOfFile } from '@/lib/data/file-copies'
import { migrate } from '@/lib/data/migrate'
import type { MigrationSet } from '@/lib/data/migration-files'
import { storeOneOfEach } from '../../support/one-of-each'
import { onRawConnection } from '../../support/raw-connection'
import {
  closeConnections,
  createEmptyDatabase,
  createTestDatabase,
  describeOnEachEngine,
  migrationSet,
  type TestDatabase,
} from '../../support/template-database'

const all = migrationSet()
const names = all.migrations.map(({ name }) => name)

const withMigration = (sql: string, name = '9000_next'): MigrationSet => ({
  ...all,
  migrations: [...all.migrations, { name, sql }],
})

const addColumn = 'ALTER TABLE "Machine" ADD COLUMN "place" TEXT;'

let current: TestDatabase

/** Opens `made` as the database of this test. */
const use = (made: TestDatabase): void => {
  current = made
  process.env.DATABASE_URL = made.databaseUrl
  process.env.DATA_DIR = made.folder
}

const rowsOf = async (sql: string): Promise<ReadonlyArray<Record<string, unknown>>> => {
  if (current.engine === 'postgresql') {
    const client = new pg.Client({ connectionString: current.databaseUrl })
    await client.connect()
    try {
      return (await client.query(sql)).rows
    } finally {
      await client.end()
    }
  }
  const connection = inspectSqlite(filePath(current.databaseUrl))
  try {
    return connection.prepare<[], Record<string, unknown>>(sql).all()
  } finally {
    connection.close()
  }
}

/** Everything about the database that a failed migration could have spoilt. */
const stateOf = async (): Promise<unknown> => {
  if (current.engine === 'sqlite') return hashOfFile(filePath(current.databaseUrl))
  return [
    await rowsOf(
      `select table_name, column_name, data_type from information_schema.columns where table_schema = 'public' order by 1, 2`,
    ),
    await rowsOf(
      `select tgname, pg_get_triggerdef(oid) as text from pg_trigger where not tgisinternal order by 1`,
    ),
    await rowsOf(`select conname, pg_get_constraintdef(oid) as text from pg_constraint order by 1`),
    await rowsOf('select * from _prisma_migrations order by migration_name'),
    await rowsOf('select * from "Reading"'),
  ]
}

const appliedMigrations = async () =>
  (await rowsOf('select migration_name as name from _prisma_migrations order by started_at')).map(
    ({ name }) => name,
  )

interface Ran {
  readonly code: number | null
  readonly output: string
}

/** `node scripts/migrate.mjs` as a start runs it. */
const runScript = (): Promise<Ran> =>
  new Promise((resolve) => {
    const child = spawn(process.execPath, ['scripts/migrate.mjs'], {
      env: { ...process.env, DATABASE_URL: current.databaseUrl, DATA_DIR: current.folder },
      stdio: ['ignore', 'pipe', 'pipe'],
    })
    let output = ''
    child.stdout.on('data', (part) => {
      output += part
    })
    child.stderr.on('data', (part) => {
      output += part
    })
    child.on('close', (code) => resolve({ code, output }))
  })

describeOnEachEngine('migrate', (engine) => {
  const before = { url: process.env.DATABASE_URL, folder: process.env.DATA_DIR }
  afterEach(async () => {
    await closeConnections()
    await current.drop()
    if (before.url === undefined) delete process.env.DATABASE_URL
    if (before.folder === undefined) delete process.env.DATA_DIR
  })

  it('makes a database from nothing, and does nothing the second time', async () => {
    use(await createEmptyDatabase())
    expect(await migrate(current, all)).toEqual({ applied: names, copy: undefined })
    expect(await migrate(current, all)).toEqual({ applied: [], copy: undefined })
    expect(await appliedMigrations()).toEqual(names)
    await storeOneOfEach()
    expect(await database().read.reading.count()).toBe(1)
  })

  it('is done once when three processes start at the same time', async () => {
    use(await createEmptyDatabase())
    const runs = await Promise.all([runScript(), runScript(), runScript()])
    expect(runs.map(({ code }) => code)).toEqual([0, 0, 0])
    expect(runs.filter(({ output }) => output.includes('applied')).length).toBe(1)
    expect(await appliedMigrations()).toEqual(names)
    expect(readdirSync(current.folder)).toEqual(engine === 'sqlite' ? ['ledgerline.db'] : [])
  })

  it('leaves nothing of a new database when it fails', async () => {
    use(await createEmptyDatabase())
    await expect(migrate(current, withMigration(`${addColumn}\nbroken;`))).rejects.toMatchObject({
      problem: { code: 'storage', message: expect.stringContaining('A migration failed') },
    })
    if (engine === 'sqlite') expect(readdirSync(current.folder)).toEqual([])
    else
      expect(await rowsOf(`select 1 from information_schema.tables where table_schema = 'public'`)).toEqual(
        [],
      )
  })

  describeFilled('on a database that holds something', () => {
    it('applies what is missing and keeps what is stored', async () => {
      const { applied, copy } = await migrate(current, withMigration(addColumn))
      expect(applied).toEqual(['9000_next'])
      expect(await rowsOf('select "place" from "Machine"')).toEqual([])
      expect((await database().read.reading.findMany()).map(({ body }) => body)).toEqual([
        '{"diameters":[0.000254]}',
      ])
      expect(copy !== undefined).toBe(engine === 'sqlite')
    })

    it('keeps a reading from being changed after a migration that redefines its table', async () => {
      await migrate(current, withMigration(redefineReading(engine)))
      for (const sql of [`update "Reading" set "body" = '{}'`, 'delete from "Reading"'])
        await expect(onRawConnection((run) => run(sql))).rejects.toThrow(
          'Ledgerline: A reading is never changed',
        )
      expect(await rowsOf('select "body" from "Reading"')).toEqual([{ body: '{"diameters":[0.000254]}' }])
    })

    it.each([
      ['in its first statement', 'broken;'],
      ['half-way', `${addColumn}\nDROP TABLE "DatasheetLot";\nALTER TABLE "Nowhere" ADD COLUMN "x" TEXT;`],
    ])('leaves the database as it was when a migration fails %s', async (_where, sql) => {
      const earlier = await stateOf()
      await expect(migrate(current, withMigration(sql))).rejects.toMatchObject({
        problem: {
          code: 'storage',
          message: expect.stringMatching(/^A migration failed: .* The database is as it was\.$/s),
        },
      })
      expect(await stateOf()).toEqual(earlier)
      if (engine === 'sqlite') expect(readdirSync(current.folder)).toEqual(['ledgerline.db'])
      // And a better one goes through.
      expect((await migrate(current, withMigration(addColumn))).applied).toEqual(['9000_next'])
    })

    it('leaves the database as it was when a guard can’t be made', async () => {
      const earlier = await stateOf()
      const set = { ...withMigration(addColumn), guards: `${all.guards}\ncreate trigger broken;` }
      await expect(migrate(current, set)).rejects.toMatchObject({ problem: { code: 'storage' } })
      expect(await stateOf()).toEqual(earlier)
    })

    it('refuses a migration that was edited after it had been applied', async () => {
      await migrate(current, withMigration(addColumn))
      await expect(migrate(current, withMigration(`${addColumn}\n-- another word`))).rejects.toMatchObject({
        problem: {
          code: 'storage',
          message: 'Migration 9000_next was edited after this database had applied it.',
          mend: expect.stringContaining('migrate:new'),
        },
      })
    })

    it('refuses a database that a newer version made', async () => {
      await migrate(current, withMigration(addColumn))
      await expect(migrate(current, all)).rejects.toMatchObject({
        problem: {
          message: 'This database knows migrations that this program does not have: 9000_next.',
          mend: expect.stringContaining('newer version'),
        },
      })
    })

    it('refuses a migration that was begun elsewhere and never finished', async () => {
      await onRawConnection((run) =>
        run(
          `insert into _prisma_migrations (id, checksum, migration_name, started_at, applied_steps_count)
           values ('x', 'x', '9000_next', ${engine === 'sqlite' ? '1' : 'now()'}, 0)`,
        ),
      )
      await expect(migrate(current, withMigration(addColumn))).rejects.toMatchObject({
        problem: { message: 'Migration 9000_next was begun on this database and never finished.' },
      })
    })

    it('makes guards again that someone took away', async () => {
      await onRawConnection((run) =>
        run(
          engine === 'sqlite'
            ? 'drop trigger "Reading_no_update"'
            : 'drop trigger "Reading_no_update" on "Reading"',
        ),
      )
      await onRawConnection((run) => run(`update "Reading" set "reason" = 'forged'`))
      await migrate(current, all)
      await expect(onRawConnection((run) => run(`update "Reading" set "reason" = 'again'`))).rejects.toThrow(
        'Ledgerline: ',
      )
    })
  })
})

function describeFilled(name: string, tests: () => void): void {
  describeOnEachEngine(name, () => {
    beforeEach(async () => {
      use(await createTestDatabase())
      await storeOneOfEach()
      await closeConnections()
      expect(existsSync(join(current.folder, 'ledgerline.db-wal'))).toBe(false)
    })
    tests()
  })
}

/** What the schema engine writes when a column of an existing table changes its type on SQLite. */
function redefineReading(engine: string): string {
  if (engine === 'postgresql')
    return 'CREATE TABLE "new_Reading" AS SELECT * FROM "Reading";\nDROP TABLE "Reading" CASCADE;\nALTER TABLE "new_Reading" RENAME TO "Reading";'
  return `PRAGMA defer_foreign_keys=ON;
PRAGMA foreign_keys=OFF;
CREATE TABLE "new_Reading" (
    "id" INTEGER NOT NULL PRIMARY KEY AUTOINCREMENT, "clientId" TEXT NOT NULL, "specimenId" INTEGER NOT NULL,
    "kind" TEXT NOT NULL, "body" TEXT NOT NULL, "hash" TEXT NOT NULL, "personId" INTEGER, "measuredAt" DATETIME NOT NULL,
    "recordedAt" DATETIME NOT NULL, "rigId" INTEGER, "micrometerId" INTEGER, "balanceId" INTEGER, "ruleId" INTEGER,
    "counterId" INTEGER, "supersedesId" INTEGER, "reason" TEXT NOT NULL DEFAULT '', "extra" TEXT
);
INSERT INTO "new_Reading" ("id", "clientId", "specimenId", "kind", "body", "hash", "personId", "measuredAt", "recordedAt", "reason")
  SELECT "id", "clientId", "specimenId", "kind", "body", "hash", "personId", "measuredAt", "recordedAt", "reason" FROM "Reading";
DROP TABLE "Reading";
ALTER TABLE "new_Reading" RENAME TO "Reading";
PRAGMA foreign_keys=ON;
PRAGMA defer_foreign_keys=OFF;`
}
