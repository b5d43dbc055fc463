import { expect, it } from 'vitest'
import { openSqlite, settlePragmas, sqlitePragmas } from '@/lib/data/connections'
import { database } from '@/lib/data/database'
import { filePath } from '@/lib/data/env'
import { signInClient } from '@/lib/data/sign-in-client'
import { describeOnEachEngine, useFreshDatabase } from '../../support/template-database'

interface Asked {
  $queryRawUnsafe(sql: string): PromiseLike<unknown>
}

/** What a client's own connection answers. */
const ask =
  (client: Asked) =>
  async (pragma: string): Promise<string> => {
    const rows = (await client.$queryRawUnsafe(`PRAGMA ${pragma}`)) as ReadonlyArray<Record<string, unknown>>
    return String(Object.values(rows[0] ?? {})[0])
  }

const answers = async (asking: (pragma: string) => Promise<string>) => ({
  synchronous: await asking('synchronous'),
  journal_mode: await asking('journal_mode'),
  foreign_keys: await asking('foreign_keys'),
  recursive_triggers: await asking('recursive_triggers'),
  busy_timeout: await asking('busy_timeout'),
  query_only: await asking('query_only'),
})

const safe = {
  synchronous: '2',
  journal_mode: 'wal',
  foreign_keys: '1',
  recursive_triggers: '1',
  busy_timeout: '20',
  query_only: '0',
}

describeOnEachEngine('connections', () => {
  useFreshDatabase()

  it('the writer waits for the disk, keeps a log, checks references', async () => {
    expect(await database().write((tx) => answers(ask(tx)))).toEqual(safe)
  })

  it('the reader does the same and can’t write', async () => {
    expect(await answers(ask(database().read))).toEqual({ ...safe, query_only: '1' })
  })

  it('the sign-in library’s does the same', async () => {
    expect(await answers(ask(signInClient()))).toEqual(safe)
  })

  it('a script’s or a worker’s does the same and waits longer', async () => {
    const connection = openSqlite(filePath(process.env.DATABASE_URL ?? ''))
    const asking = async (pragma: string) => String(connection.pragma(pragma, { simple: true }))
    expect(await answers(asking)).toEqual({ ...safe, busy_timeout: '10000' })
    connection.close()
  })

  it('one that answers otherwise is not used', async () => {
    // A database in memory has no log beside it, whatever it is told.
    expect(() => openSqlite(':memory:')).toThrow('answers journal_mode = memory where wal is needed')
    const lying = async (sql: string) => (sql === 'PRAGMA synchronous' ? 1 : right(sql))
    await expect(settlePragmas('writer', lying)).rejects.toThrow('answers synchronous = 1 where 2 is needed')
  })

  it('none makes a database that is not there', () => {
    expect(() => openSqlite(`${filePath(process.env.DATABASE_URL ?? '')}.other`)).toThrow('unable to open')
  })
})

const right = (sql: string): string | number | undefined =>
  sqlitePragmas('writer').find(([pragma]) => sql === `PRAGMA ${pragma}`)?.[1]
