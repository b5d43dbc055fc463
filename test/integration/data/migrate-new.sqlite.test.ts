import { spawnSync } from 'node:child_process'
import { cpSync, existsSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { temporaryFolder } from '../../support/template-database'

let folder: string

const run = (...args: readonly string[]) => {
  const { status, stdout, stderr } = spawnSync(process.execPath, ['scripts/migrate-new.mjs', ...args], {
    encoding: 'utf8',
    env: { ...process.env, LEDGERLINE_PRISMA_FOLDER: join(folder, 'prisma') },
  })
  return { status, output: stdout + stderr }
}

const change = (file: string, from: string | RegExp, to: string): void => {
  const path = join(folder, 'prisma/schema', file)
  const text = readFileSync(path, 'utf8')
  expect(text).toMatch(from)
  writeFileSync(path, text.replace(from, to))
}

const migrationsOf = (engine: string) =>
  readdirSync(join(folder, 'prisma/migrations', engine)).filter((name) => !name.endsWith('.toml'))

const sqlOf = (engine: string, name: string) =>
  readFileSync(join(folder, 'prisma/migrations', engine, name, 'migration.sql'), 'utf8')

describe('npm run migrate:new', () => {
  let newest: string
  let next: string
  beforeEach(() => {
    folder = temporaryFolder()
    cpSync('prisma', join(folder, 'prisma'), { recursive: true })
    newest = migrationsOf('sqlite').sort().at(-1) ?? ''
    next = String(Number.parseInt(newest, 10) + 1).padStart(4, '0')
  })
  afterEach(() => rmSync(folder, { recursive: true }))

  it('makes the next migration on both engines, and nothing more until something changes', () => {
    change('equipment.prisma', 'model Die {', 'model Coil {\n  id Int @id\n}\n\nmodel Die {')
    expect(run('add_coils')).toEqual({
      status: 0,
      output: `Made ${next}_add_coils for sqlite and postgresql: read it before it is committed.\n`,
    })
    for (const engine of ['sqlite', 'postgresql'])
      expect(sqlOf(engine, `${next}_add_coils`)).toContain('CREATE TABLE "Coil"')
    expect(run('again')).toEqual({
      status: 1,
      output: '\nprisma/schema has not changed since the newest migration.\n',
    })
  })

  it.each([
    ['Reading', 'lots.prisma', 'kind        String', 'kind        Int'],
    ['Evaluation', 'lots.prisma', 'inputHash    String', 'inputHash    Int'],
    ['LedgerEntry', 'ledger.prisma', 'verb         String', 'verb         Int'],
  ])('refuses to redefine %s unless asked', (table, file, from, to) => {
    change(file, from, to)
    const refused = run('change_it')
    expect(refused.status).toBe(1)
    expect(refused.output).toContain(`would redefine ${table}, which is append-only`)
    expect(existsSync(join(folder, 'prisma/migrations/sqlite', `${next}_change_it`))).toBe(false)
    const asked = run('change_it', '--redefine', table)
    expect(asked).toMatchObject({ status: 0 })
    expect(migrationsOf('postgresql')).toContain(`${next}_change_it`)
  })

  it.each([[[]], [['Two Words']], [['a', 'b']], [['-x']]])('refuses the name %j', (args) => {
    expect(run(...args)).toMatchObject({
      status: 1,
      output: expect.stringContaining('Give the migration one name'),
    })
  })
})
