import { describe, expect, it } from 'vitest'
import { draftMigration, hasHiddenSemicolon, redefinedTables } from '@/lib/data/migration-draft'

const schema = (engine: string, models: string): ReadonlyArray<readonly [string, string]> => [
  [
    'schema.prisma',
    `generator client {\n  provider = "prisma-client"\n  output = "./x"\n}\ndatasource db {\n  provider = "${engine}"\n}\n${models}`,
  ],
]

const coil = 'model Coil {\n  id Int @id @default(autoincrement())\n  code String @unique\n}\n'
const reading = 'model Reading {\n  id Int @id @default(autoincrement())\n  body String\n}\n'

describe('draftMigration', () => {
  it.each(['sqlite', 'postgresql'] as const)('makes tables from nothing on %s', async (engine) => {
    const sql = await draftMigration(engine, undefined, schema(engine, coil))
    expect(sql).toContain('CREATE TABLE "Coil"')
    expect(sql).toContain('CREATE UNIQUE INDEX "Coil_code_key"')
  })

  it.each(['sqlite', 'postgresql'] as const)('adds what is new on %s, and nothing else', async (engine) => {
    const sql = await draftMigration(engine, schema(engine, coil), schema(engine, coil + reading))
    expect(sql).toContain('CREATE TABLE "Reading"')
    expect(sql).not.toContain('"Coil"')
    expect(redefinedTables(sql)).toEqual([])
  })

  it.each(['sqlite', 'postgresql'] as const)('is empty on %s when nothing changed', async (engine) => {
    expect(await draftMigration(engine, schema(engine, coil), schema(engine, coil))).toBe('')
  })

  it.each([
    ['a type changes', reading.replace('body String', 'body Int')],
    ['a column goes', reading.replace('  body String\n', '')],
    ['a column becomes optional', reading.replace('body String', 'body String?')],
    ['the table goes', ''],
  ])('makes SQL that is known to redefine Reading when %s, on both engines', async (_what, after) => {
    for (const engine of ['sqlite', 'postgresql'] as const) {
      const sql = await draftMigration(engine, schema(engine, reading + coil), schema(engine, after + coil))
      expect(redefinedTables(sql), sql).toEqual(['Reading'])
    }
  })

  it('knows that SQLite rebuilds Reading for a column that must not be empty, and PostgreSQL does not', async () => {
    const after = reading.replace('body String', 'body String\n  note String @default("")')
    const draft = (engine: 'sqlite' | 'postgresql') =>
      draftMigration(engine, schema(engine, reading), schema(engine, after))
    expect(redefinedTables(await draft('sqlite'))).toEqual(['Reading'])
    expect(redefinedTables(await draft('postgresql'))).toEqual([])
  })

  it('makes SQL that is known to leave Reading alone when a column is added that may be empty', async () => {
    const after = reading.replace('body String', 'body String\n  note String?')
    for (const engine of ['sqlite', 'postgresql'] as const) {
      const sql = await draftMigration(engine, schema(engine, reading), schema(engine, after))
      expect(sql).toContain('ADD COLUMN')
      expect(redefinedTables(sql), sql).toEqual([])
    }
  })
})

describe('redefinedTables', () => {
  it.each([
    'DROP TABLE "Reading";',
    'drop table if exists Reading;',
    'ALTER TABLE "Reading" RENAME TO "Old";',
    'ALTER TABLE "new_Reading" RENAME TO "Reading";',
    'ALTER TABLE "Reading" DROP COLUMN "body";',
    'ALTER TABLE "Reading" ADD COLUMN "x" TEXT,\nDROP COLUMN "body";',
    'ALTER TABLE "public"."Reading" ALTER COLUMN "body" DROP NOT NULL;',
    'UPDATE "Reading" SET "body" = 1;',
    'DELETE FROM "Reading";',
    'TRUNCATE "Reading";',
  ])('finds %s', (sql) => expect(redefinedTables(sql)).toEqual(['Reading']))

  it.each([
    'ALTER TABLE "Reading" ADD COLUMN "x" TEXT;',
    'CREATE INDEX "Reading_x" ON "Reading"("x");',
    'DROP TABLE "ReadingRoom";',
    'ALTER TABLE "ReadingRoom" DROP COLUMN "x";',
    'CREATE TABLE "new_Machine" ("x" INTEGER); DROP TABLE "Machine"; ALTER TABLE "new_Machine" RENAME TO "Machine";',
    'ALTER TABLE "Reading" ADD CONSTRAINT "c" FOREIGN KEY ("x") REFERENCES "Rig"("id") ON DELETE SET NULL ON UPDATE CASCADE;',
  ])('passes %s', (sql) => expect(redefinedTables(sql)).toEqual([]))

  it('finds every append-only table', () => {
    expect(
      redefinedTables('DROP TABLE "LedgerEntry"; DROP TABLE "Evaluation"; DROP TABLE "Reading";'),
    ).toEqual(['Reading', 'Evaluation', 'LedgerEntry'])
  })
})

describe('hasHiddenSemicolon', () => {
  it.each([
    `INSERT INTO x VALUES ('a;b');`,
    '-- first; second\nSELECT 1;',
    `select 'it''s; so';`,
    'do $$ begin end $$;',
  ])('finds it in %s', (sql) => expect(hasHiddenSemicolon(sql)).toBe(true))

  it.each([
    `ALTER TABLE x ADD COLUMN y TEXT DEFAULT '';\nALTER TABLE x ADD COLUMN z TEXT DEFAULT 'a';`,
    '-- CreateTable\nSELECT 1;',
  ])('finds none in %s', (sql) => expect(hasHiddenSemicolon(sql)).toBe(false))
})
