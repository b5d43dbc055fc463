/**
 * `npm run migrate:new -- NAME [--redefine TABLE]`: makes the next migration on both engines from what changed
 * in prisma/schema since the last one. SQL that drops, renames or rewrites an append-only table (Reading,
 * Evaluation, LedgerEntry) is refused unless that table is named with --redefine.
 */
import { existsSync, mkdirSync, readdirSync, readFileSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { CommandFailed, fail } from './lib/child.mjs'
import { engines, forEngine, root, schemaFiles } from './lib/schema.mjs'
import { importTypeScript } from './lib/typescript.mjs'

const migrations = join(process.env.LEDGERLINE_PRISMA_FOLDER ?? join(root, 'prisma'), 'migrations')
const schemaFolder = join(migrations, '../schema')
/** The data model that the newest migration leads to. */
const snapshot = join(migrations, 'schema-at-newest.prisma')

const parseArguments = (args) => {
  const allowed = []
  const names = []
  args.forEach((arg, at) => {
    if (args[at - 1] === '--redefine') allowed.push(arg)
    else if (arg !== '--redefine') names.push(arg)
  })
  if (names.length !== 1 || !/^[a-z][a-z0-9_]{1,40}$/.test(names[0]))
    throw new CommandFailed(
      'Give the migration one name of small letters, digits and underscores: npm run migrate:new -- add_coils',
    )
  return { name: names[0], allowed }
}

const nextNumber = () => {
  const numbers = engines
    .flatMap((engine) => (existsSync(join(migrations, engine)) ? readdirSync(join(migrations, engine)) : []))
    .map((folder) => Number.parseInt(folder, 10))
    .filter(Number.isInteger)
  return String(Math.max(0, ...numbers) + 1).padStart(4, '0')
}

const draftAll = async (allowed) => {
  const { draftMigration, hasHiddenSemicolon, redefinedTables } = await importTypeScript(
    root,
    'lib/data/migration-draft.ts',
  )
  const before = existsSync(snapshot) ? readFileSync(snapshot, 'utf8') : undefined
  const drafts = []
  for (const engine of engines) {
    const previous = before === undefined ? undefined : [['schema.prisma', forEngine(engine, before)]]
    const sql = await draftMigration(engine, previous, schemaFiles(engine, schemaFolder))
    if (sql === '') throw new CommandFailed('prisma/schema has not changed since the newest migration.')
    const refused = redefinedTables(sql).filter((table) => !allowed.includes(table))
    if (refused.length > 0)
      throw new CommandFailed(
        `On ${engine} this change would redefine ${refused.join(', ')}, which is append-only. ` +
          `Change the data model so that it only adds, or ask for it: --redefine ${refused.join(' --redefine ')}`,
      )
    if (engine === 'postgresql' && hasHiddenSemicolon(sql))
      throw new CommandFailed(
        'A text in this change holds a semicolon, at which PostgreSQL’s migration would be cut.',
      )
    drafts.push({ engine, sql })
  }
  return drafts
}

try {
  const { name, allowed } = parseArguments(process.argv.slice(2))
  const drafts = await draftAll(allowed)
  const folder = `${nextNumber()}_${name}`
  for (const { engine, sql } of drafts) {
    mkdirSync(join(migrations, engine, folder), { recursive: true })
    writeFileSync(join(migrations, engine, folder, 'migration.sql'), sql)
    writeFileSync(
      join(migrations, engine, 'migration_lock.toml'),
      `# Names the engine that these migrations are for.\nprovider = "${engine}"\n`,
    )
  }
  const state = schemaFiles('sqlite', schemaFolder).map(([, content]) => content.trim())
  writeFileSync(snapshot, `${state.join('\n\n')}\n`)
  process.stdout.write(`Made ${folder} for ${engines.join(' and ')}: read it before it is committed.\n`)
} catch (error) {
  fail(error)
}
