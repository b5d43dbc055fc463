import { spawn } from 'node:child_process'
import { existsSync, mkdirSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import BetterSqlite3 from 'better-sqlite3'
import { beforeEach, expect, it } from 'vitest'
import { type Backup, backUp, noteOf } from '@/lib/data/backup'
import { openSqlite } from '@/lib/data/connections'
import { database } from '@/lib/data/database'
import { filePath } from '@/lib/data/env'
import { hashOfFile } from '@/lib/data/file-copies'
import { appendLedger } from '@/lib/data/ledger'
import { restore } from '@/lib/data/restore'
import { verifyLedger } from '@/lib/data/verify-ledger'
import { storeOneOfEach } from '../../support/one-of-each'
import {
  closeConnections,
  describeOnEachEngine,
  migrationSet,
  useFreshDatabase,
} from '../../support/template-database'

const path = () => filePath(process.env.DATABASE_URL ?? '')
const folder = () => join(process.env.DATA_DIR ?? '', 'backups')
const monday = new Date('2026-03-02T17:00:05.000Z')
const tuesday = new Date('2026-03-03T17:00:05.000Z')
const known = migrationSet('sqlite').migrations.map(({ name }) => name)

const append = (subject: string) =>
  database().write((tx) => appendLedger(tx, { at: 1, personId: 1, verb: 'note', subject, body: {} }))

const runScript = (script: string, ...args: readonly string[]) =>
  new Promise<{ code: number | null; output: string }>((resolve) => {
    const child = spawn(process.execPath, [`scripts/${script}`, ...args], {
      stdio: ['ignore', 'pipe', 'pipe'],
    })
    let output = ''
    for (const stream of [child.stdout, child.stderr])
      stream.on('data', (part) => {
        output += part
      })
    child.on('close', (code) => resolve({ code, output }))
  })

describeOnEachEngine('backUp', () => {
  useFreshDatabase('test')
  beforeEach(async () => {
    await storeOneOfEach()
  })

  it('copies the database and notes its hash and the head of its ledger', async () => {
    const backup = await backUp(path(), folder(), monday)
    expect(readdirSync(folder()).sort()).toEqual([
      'ledgerline-20260302-170005.db',
      'ledgerline-20260302-170005.db.json',
    ])
    const head = await database().read.ledgerHead.findUniqueOrThrow({ where: { id: 1 } })
    const note = JSON.parse(readFileSync(noteOf(backup.path), 'utf8'))
    expect(note).toEqual({
      file: 'ledgerline-20260302-170005.db',
      madeAt: monday.toISOString(),
      bytes: readFileSync(backup.path).length,
      sha256: hashOfFile(backup.path),
      ledger: { count: head.count, hash: head.hash },
      migration: known.at(-1),
    })
  })

  it('is one moment of a database that is being written to', async () => {
    let going = true
    let written = 0
    const writing = (async () => {
      while (going) {
        written += 1
        await append(`${written}`)
        // The driver answers without leaving this turn of the loop: the back-up gets its own turns.
        await new Promise((resolve) => setImmediate(resolve))
      }
    })()
    const backup = await backUp(path(), folder(), monday)
    going = false
    await writing
    expect(backup.ledger.count).toBeGreaterThan(0)
    expect(backup.ledger.count).toBeLessThanOrEqual(written + 1)
    // The chain of today passes through the anchor of the back-up.
    const { count, hash } = backup.ledger
    expect(await verifyLedger(database().read, [{ count, hash, where: 'the back-up' }])).toMatchObject({
      sound: true,
    })
  })

  it('leaves nothing behind when the database is not there or the name is taken', async () => {
    await expect(backUp(`${path()}.other`, folder(), monday)).rejects.toMatchObject({
      problem: { code: 'not-found' },
    })
    expect(existsSync(folder())).toBe(false)
    await backUp(path(), folder(), monday)
    await expect(backUp(path(), folder(), monday)).rejects.toMatchObject({ problem: { code: 'conflict' } })
    expect(readdirSync(folder()).length).toBe(2)
  })

  it('keeps no copy that does not pass its check', async () => {
    await closeConnections()
    const bytes = readFileSync(path())
    bytes.fill(0xa5, 4096 * 40, 4096 * 60)
    writeFileSync(path(), bytes)
    await expect(backUp(path(), folder(), monday)).rejects.toMatchObject({
      problem: { code: 'storage', message: expect.stringContaining('The back-up was not kept') },
    })
    expect(readdirSync(folder())).toEqual([])
  })
})

describeOnEachEngine('restore', () => {
  useFreshDatabase('test')
  let backup: Backup
  beforeEach(async () => {
    await storeOneOfEach()
    backup = await backUp(path(), folder(), monday)
    await append('after the back-up')
    await closeConnections()
  })

  it('puts the back-up in place and keeps what was there', async () => {
    const { kept, ledger } = await restore(backup.path, path(), known, tuesday)
    expect(ledger).toEqual(backup.ledger)
    expect(hashOfFile(path())).toBe(backup.sha256)
    expect(await database().read.ledgerEntry.count()).toBe(1)
    const replaced = openSqlite(kept ?? '')
    expect(replaced.prepare('select count(*) from "LedgerEntry"').pluck().get()).toBe(2)
    replaced.close()
  })

  it('puts it where no database is', async () => {
    rmSync(path())
    expect((await restore(backup.path, path(), known, tuesday)).kept).toBeUndefined()
    expect(await database().read.reading.count()).toBe(1)
  })

  it('keeps a database that is too damaged to be opened', async () => {
    writeFileSync(path(), 'not a database at all, long enough to be looked at as one'.repeat(100))
    const { kept } = await restore(backup.path, path(), known, tuesday)
    expect(readFileSync(kept ?? '', 'utf8')).toContain('not a database at all')
    expect(await database().read.reading.count()).toBe(1)
  })

  const refusedWith = async (message: string): Promise<void> => {
    const earlier = hashOfFile(path())
    await expect(restore(backup.path, path(), known, tuesday)).rejects.toMatchObject({
      problem: { message: expect.stringContaining(message) },
    })
    expect(hashOfFile(path())).toBe(earlier)
    expect(readdirSync(process.env.DATA_DIR ?? '').sort()).toEqual(['backups', 'ledgerline.db'])
  }

  it('refuses a file that changed by one byte', async () => {
    const bytes = readFileSync(backup.path)
    bytes[bytes.length - 1] = (bytes[bytes.length - 1] ?? 0) ^ 1
    writeFileSync(backup.path, bytes)
    await refusedWith('it is not the file that its note was written for')
  })

  it.each(['cut short', 'overwritten', 'no database'])(
    'refuses a file without a note that is %s',
    async (how) => {
      rmSync(noteOf(backup.path))
      const bytes = readFileSync(backup.path)
      if (how === 'cut short') writeFileSync(backup.path, bytes.subarray(0, 4096 * 30))
      if (how === 'overwritten') writeFileSync(backup.path, bytes.fill(0xa5, 4096 * 40, 4096 * 60))
      if (how === 'no database') writeFileSync(backup.path, 'lot;specimen\nLA-1;1\n'.repeat(500))
      await refusedWith('was not restored')
    },
  )

  it('refuses a database of another program', async () => {
    rmSync(noteOf(backup.path))
    rmSync(backup.path)
    const other = new BetterSqlite3(backup.path)
    other.exec('create table "Lot" (x)')
    other.close()
    await refusedWith('not one of Ledgerline')
  })

  it('refuses one of a newer version', async () => {
    rmSync(noteOf(backup.path))
    const newer = new BetterSqlite3(backup.path)
    newer.exec(`insert into _prisma_migrations (id, checksum, migration_name, started_at, finished_at, applied_steps_count)
      values ('x', 'x', '9000_next', 1, 1, 1)`)
    newer.close()
    await refusedWith('it was made by a newer version of Ledgerline (9000_next)')
  })

  it('refuses one whose ledger was cut short', async () => {
    rmSync(noteOf(backup.path))
    const forged = new BetterSqlite3(backup.path)
    forged.exec('drop trigger "LedgerEntry_no_delete"; delete from "LedgerEntry"')
    forged.close()
    await refusedWith('entries are missing')
  })

  it('refuses one whose ledger is not the one in its note', async () => {
    const note = JSON.parse(readFileSync(noteOf(backup.path), 'utf8'))
    writeFileSync(noteOf(backup.path), JSON.stringify({ ...note, ledger: { count: 9, hash: 'x' } }))
    await refusedWith('its ledger is not the one that its note tells of')
  })

  it('refuses while the server has the database open', async () => {
    await database().read.lot.count()
    await expect(restore(backup.path, path(), known, tuesday)).rejects.toMatchObject({
      problem: { code: 'busy', mend: 'Stop the server, then restore again.' },
    })
    expect(await database().read.ledgerEntry.count()).toBe(2)
    expect(existsSync(`${path()}.incoming`)).toBe(false)
  })
})

describeOnEachEngine('the commands', () => {
  useFreshDatabase('test')

  it('back up, verify and restore', async () => {
    await storeOneOfEach()
    const made = await runScript('backup.mjs')
    expect(made).toMatchObject({ code: 0, output: expect.stringMatching(/Ledger: 1 entries, [0-9a-f]{64}/) })
    const [name] = readdirSync(folder()).filter((file) => file.endsWith('.db'))

    await append('after the back-up')
    const verified = await runScript('ledger-verify.mjs')
    expect(verified).toMatchObject({
      code: 0,
      output: expect.stringContaining('The ledger holds: 2 entries, 2 anchors.'),
    })

    await closeConnections()
    const restored = await runScript('restore.mjs', join(folder(), name ?? ''))
    expect(restored).toMatchObject({
      code: 0,
      output: expect.stringContaining('Restored. Ledger: 1 entries'),
    })
    expect(await database().read.ledgerEntry.count()).toBe(1)
  })

  it('end with 1 and a sentence, never a stack', async () => {
    await storeOneOfEach()
    await closeConnections()
    const forged = openSqlite(path())
    forged.exec('drop trigger "LedgerEntry_no_update"; update "LedgerEntry" set "verb" = \'x\'')
    forged.close()
    expect(await runScript('ledger-verify.mjs')).toEqual({
      code: 1,
      output: '\nThe ledger is broken. Entry 1 was changed after it was written.\n',
    })
    const nothing = join(folder(), 'nothing.db')
    expect(await runScript('restore.mjs', nothing)).toEqual({
      code: 1,
      output: `\nThere is no file ${nothing}.\n`,
    })
    expect((await runScript('restore.mjs')).output).toBe('\nnpm run restore -- FILE\n')
    mkdirSync(folder())
    writeFileSync(join(folder(), 'x.db.json'), '{}')
    expect((await runScript('ledger-verify.mjs')).output).toContain('is not the note of a back-up')
  })
})
