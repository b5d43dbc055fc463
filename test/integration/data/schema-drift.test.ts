import { readdirSync, readFileSync } from 'node:fs'
import { join } from 'node:path'
import { PrismaBetterSqlite3 } from '@prisma/adapter-better-sqlite3'
import pg from 'pg'
import { expect, it } from 'vitest'
import { draftMigration } from '@/lib/data/migration-draft'
import { noFilters, withSchemaEngine } from '@/lib/data/schema-engine'
import { onCluster } from '../../support/postgresql-cluster'
import { createEmptyDatabase, describeOnEachEngine, useFreshDatabase } from '../../support/template-database'

describeOnEachEngine('the newest migration', (engine) => {
  useFreshDatabase()

  const forEngine = (content: string) =>
    engine === 'sqlite' ? content : content.replace(/provider\s*=\s*"sqlite"/, 'provider = "postgresql"')

  const schema = readdirSync('prisma/schema').map(
    (name) => [name, forEngine(readFileSync(join('prisma/schema', name), 'utf8'))] as const,
  )

  it('leads to the data model as it is: else run npm run migrate:new', async () => {
    const newest = forEngine(readFileSync('prisma/migrations/schema-at-newest.prisma', 'utf8'))
    expect(await draftMigration(engine, [['schema.prisma', newest]], schema)).toBe('')
  })

  it('made a database that is the data model, table for table', async () => {
    if (engine === 'postgresql') return comparePostgresql(await draftMigration(engine, undefined, schema))
    const files = schema.map(([path, content]) => ({ path, content }))
    const { stdout } = await withSchemaEngine(
      new PrismaBetterSqlite3({ url: process.env.DATABASE_URL ?? '' }),
      (schemaEngine) =>
        schemaEngine.diff({
          from: { tag: 'schemaDatasource', files, configDir: '/' },
          to: { tag: 'schemaDatamodel', files },
          script: true,
          exitCode: null,
          filters: noFilters,
        }),
      schema,
    )
    expect(stdout).toMatch(/^\s*-- This is an empty migration\.\s*$/)
  })
})

/** The schema engine can't read PostgreSQL's catalogue through the driver: a database made afresh is compared. */
async function comparePostgresql(fromNothing: string): Promise<void> {
  const afresh = await createEmptyDatabase()
  await onCluster(afresh.databaseUrl, fromNothing)
  const expected = await catalogueOf(afresh.databaseUrl)
  await afresh.drop()
  expect(expected.columns.length).toBeGreaterThan(100)
  expect(await catalogueOf(process.env.DATABASE_URL ?? '')).toEqual(expected)
}

async function catalogueOf(url: string) {
  const client = new pg.Client({ connectionString: url })
  await client.connect()
  const ask = async (sql: string) => (await client.query(sql)).rows
  const catalogue = {
    columns: await ask(
      `select table_name, column_name, data_type, is_nullable, column_default, datetime_precision
       from information_schema.columns where table_schema = 'public' and table_name <> '_prisma_migrations' order by 1, 2`,
    ),
    indexes: await ask(
      `select indexname, indexdef from pg_indexes where schemaname = 'public' and tablename <> '_prisma_migrations' order by 1`,
    ),
    // Checks belong to the guards.
    constraints: await ask(
      `select conname, pg_get_constraintdef(oid) as text from pg_constraint
       where contype in ('p', 'f', 'u') and conrelid <> coalesce(to_regclass('_prisma_migrations'), 0) order by 1`,
    ),
  }
  await client.end()
  return catalogue
}
