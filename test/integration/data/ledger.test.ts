import { beforeEach, expect, it } from 'vitest'
import { database } from '@/lib/data/database'
import { appendLedger, beginningOfLedger, hashOfEntry, ledgerHead } from '@/lib/data/ledger'
import { anchorsInDatabase, type LedgerVerdict, verifyLedger } from '@/lib/data/verify-ledger'
import { storeOneOfEach } from '../../support/one-of-each'
import { dropGuards, onRawConnection } from '../../support/raw-connection'
import { describeOnEachEngine, useFreshDatabase } from '../../support/template-database'

const draft = (number: number) => ({
  at: Date.UTC(2026, 2, 2, 8) + number,
  personId: number,
  verb: 'record',
  subject: `lot LA-${number}`,
  body: { number, weight: 0.1 + 0.2 },
})

const append = (number: number) => database().write((tx) => appendLedger(tx, draft(number)))

const verify = (anchors: Parameters<typeof verifyLedger>[1] = []): Promise<LedgerVerdict> =>
  verifyLedger(database().read, anchors)

/** What someone does who takes the guards away first. */
const forge = async (...statements: readonly string[]): Promise<void> => {
  await dropGuards('LedgerEntry')
  await dropGuards('LedgerHead')
  await onRawConnection(async (run) => {
    for (const statement of statements) await run(statement)
  })
}

describeOnEachEngine('the ledger', () => {
  useFreshDatabase('test')

  it('begins empty and sound', async () => {
    expect(await ledgerHead(database().read)).toEqual({ count: 0, hash: beginningOfLedger })
    expect(await verify()).toEqual({ sound: true, count: 0, hash: beginningOfLedger, anchors: 0 })
  })

  it('hangs each entry on the one before, with a hash over all that it says', async () => {
    await append(1)
    const head = await append(2)
    const [first, second] = await database().read.ledgerEntry.findMany({ orderBy: { sequence: 'asc' } })
    expect(first?.previousHash).toBe(beginningOfLedger)
    expect(second?.previousHash).toBe(first?.hash)
    expect(second).toMatchObject({
      sequence: 2,
      body: '{"number":2,"weight":0.30000000000000004}',
      hash: head.hash,
    })
    // By hand, from the definition: SHA-256 of the canonical JSON with sorted keys.
    const { createHash } = await import('node:crypto')
    const text = `{"at":${draft(2).at},"body":"{\\"number\\":2,\\"weight\\":0.30000000000000004}","personId":2,"previousHash":"${first?.hash}","sequence":2,"subject":"lot LA-2","verb":"record"}`
    expect(second?.hash).toBe(createHash('sha256').update(text).digest('hex'))
    expect(await verify()).toMatchObject({ sound: true, count: 2, hash: head.hash })
  })

  it('keeps the instant to the millisecond, in any time zone', async () => {
    await append(7)
    const [entry] = await database().read.ledgerEntry.findMany()
    expect(entry?.at.getTime()).toBe(draft(7).at)
  })

  it('takes several entries in one transaction, and nothing else after them', async () => {
    await database().write(async (tx) => {
      await appendLedger(tx, draft(1))
      await appendLedger(tx, draft(2))
      expect(await tx.ledgerEntry.count()).toBe(2)
    })
    const late = database().write(async (tx) => {
      await appendLedger(tx, draft(3))
      await tx.person.create({ data: { name: 'x', username: 'x', searchKey: 'x', createdAt: new Date() } })
    })
    await expect(late).rejects.toThrow('person.create after the ledger entry')
    expect(await verify()).toMatchObject({ sound: true, count: 2 })
  })

  it('keeps no entry of a transaction that rolled back', async () => {
    await append(1)
    await expect(
      database().write(async (tx) => {
        await appendLedger(tx, draft(2))
        throw new Error('no')
      }),
    ).rejects.toThrow('no')
    await append(3)
    expect(await verify()).toMatchObject({ sound: true, count: 2 })
  })

  it('refuses a body that is not canonical', async () => {
    const write = database().write((tx) => appendLedger(tx, { ...draft(1), body: '{"b":1,"a":2}' }))
    await expect(write).rejects.toThrow('not canonical JSON')
  })

  it('is one chain after 20 entries at once', async () => {
    await Promise.all(Array.from({ length: 20 }, (_, number) => append(number)))
    expect(await verify()).toMatchObject({ sound: true, count: 20 })
  })

  it('may be verified while it grows', async () => {
    const growing = (async () => {
      for (let number = 0; number < 30; number += 1) await append(number)
    })()
    const verdicts = []
    for (let count = 0; count < 5; count += 1) verdicts.push(await verify())
    await growing
    expect(verdicts.map(({ sound }) => sound)).toEqual([true, true, true, true, true])
    expect(await verify()).toMatchObject({ sound: true, count: 30 })
  })

  it('walks more than one page', async () => {
    await database().write(async (tx) => {
      for (let number = 0; number < 1_003; number += 1) await appendLedger(tx, draft(number))
    })
    expect(await verify()).toMatchObject({ sound: true, count: 1_003 })
  })
})

describeOnEachEngine('verifyLedger', (engine) => {
  useFreshDatabase('test')
  beforeEach(async () => {
    for (let number = 1; number <= 6; number += 1) await append(number)
  })

  const instant = (ms: number) => (engine === 'sqlite' ? String(ms) : `'${new Date(ms).toISOString()}'`)

  it.each([
    ['verb', `'release'`],
    ['subject', `'lot LA-99'`],
    ['body', `'{"number":99}'`],
    ['"personId"', '99'],
    ['"personId"', 'null'],
    ['at', 'INSTANT'],
  ])('finds a changed %s', async (column, value) => {
    await forge(
      `update "LedgerEntry" set ${column} = ${value.replace('INSTANT', instant(1))} where "sequence" = 3`,
    )
    expect(await verify()).toEqual({
      sound: false,
      sequence: 3,
      message: 'Entry 3 was changed after it was written.',
    })
  })

  it('finds a removed entry', async () => {
    await forge('delete from "LedgerEntry" where "sequence" = 4')
    expect(await verify()).toEqual({ sound: false, sequence: 4, message: 'Entry 4 is missing.' })
  })

  it('finds the first entry removed', async () => {
    await forge('delete from "LedgerEntry" where "sequence" = 1')
    expect(await verify()).toMatchObject({ sound: false, sequence: 1 })
  })

  it('finds the last entry removed, by the head', async () => {
    await forge('delete from "LedgerEntry" where "sequence" = 6')
    expect(await verify()).toEqual({
      sound: false,
      sequence: 6,
      message: 'The last entries are missing: 5 are there, the head says 6.',
    })
  })

  it('finds all entries removed', async () => {
    await forge('delete from "LedgerEntry"')
    expect(await verify()).toMatchObject({ sound: false, sequence: 1 })
  })

  it('finds an entry inserted beyond the head', async () => {
    const last = await ledgerHead(database().read)
    const entry = {
      sequence: 7,
      at: 0,
      personId: 1,
      verb: 'x',
      subject: 'x',
      body: '{}',
      previousHash: last.hash,
    }
    await forge(
      `insert into "LedgerEntry" ("sequence", "at", "personId", "verb", "subject", "body", "previousHash", "hash")
       values (7, ${instant(0)}, 1, 'x', 'x', '{}', '${last.hash}', '${hashOfEntry(entry)}')`,
    )
    expect(await verify()).toEqual({
      sound: false,
      sequence: 7,
      message: 'Entry 7 stands beyond the head of the ledger.',
    })
  })

  it('finds an entry inserted in between, the later ones moved up', async () => {
    await forge(
      'update "LedgerEntry" set "sequence" = "sequence" + 100 where "sequence" >= 4',
      'update "LedgerEntry" set "sequence" = "sequence" - 99 where "sequence" >= 104',
      `insert into "LedgerEntry" ("sequence", "at", "personId", "verb", "subject", "body", "previousHash", "hash")
       select 4, "at", "personId", "verb", "subject", "body", "hash", 'forged' from "LedgerEntry" where "sequence" = 3`,
    )
    expect(await verify()).toMatchObject({ sound: false, sequence: 4 })
  })

  it('finds two entries that changed places', async () => {
    await forge(
      'update "LedgerEntry" set "sequence" = 99 where "sequence" = 3',
      'update "LedgerEntry" set "sequence" = 3 where "sequence" = 4',
      'update "LedgerEntry" set "sequence" = 4 where "sequence" = 99',
    )
    expect(await verify()).toEqual({
      sound: false,
      sequence: 3,
      message: 'Entry 3 does not hang on the entry before it.',
    })
  })

  it('finds a head that is gone, and one that is not the last entry', async () => {
    await forge(`update "LedgerHead" set "hash" = '${'1'.repeat(64)}'`)
    expect(await verify()).toMatchObject({ sound: false, message: 'The head of the ledger is not entry 6.' })
    await forge('delete from "LedgerHead"')
    expect(await verify()).toMatchObject({ sound: false, message: 'The head of the ledger is missing.' })
  })

  it('finds a chain cut short with its head, by an anchor', async () => {
    const anchor = { ...(await ledgerHead(database().read)), where: 'the back-up of Monday' }
    const [fifth] = await database().read.ledgerEntry.findMany({ where: { sequence: 5 } })
    await forge(
      'delete from "LedgerEntry" where "sequence" = 6',
      `update "LedgerHead" set "count" = 5, "hash" = '${fifth?.hash}'`,
    )
    expect(await verify()).toMatchObject({ sound: true, count: 5 })
    expect(await verify([anchor])).toEqual({
      sound: false,
      sequence: 6,
      message:
        'The ledger is shorter than it was: 5 entries are there, 6 when the back-up of Monday was made.',
    })
  })

  it('finds a chain written anew from some entry on, by an anchor', async () => {
    const anchor = { ...(await ledgerHead(database().read)), where: 'the back-up of Monday' }
    const entries = await database().read.ledgerEntry.findMany({ orderBy: { sequence: 'asc' } })
    let previousHash = entries[2]?.hash ?? ''
    const statements: string[] = []
    for (const entry of entries.slice(3)) {
      const forged = { ...entry, at: entry.at.getTime(), verb: 'release', previousHash }
      const hash = hashOfEntry(forged)
      statements.push(
        `update "LedgerEntry" set "verb" = 'release', "previousHash" = '${previousHash}', "hash" = '${hash}' where "sequence" = ${entry.sequence}`,
      )
      previousHash = hash
    }
    await forge(...statements, `update "LedgerHead" set "hash" = '${previousHash}'`)
    expect(await verify()).toMatchObject({ sound: true, count: 6 })
    expect(await verify([anchor])).toEqual({
      sound: false,
      sequence: 6,
      message: 'Entry 6 is not the one that stood there when the back-up of Monday was made.',
    })
  })

  it('accepts every anchor that the chain passes through, the beginning included', async () => {
    const entries = await database().read.ledgerEntry.findMany()
    const anchors = entries.map(({ sequence, hash }) => ({
      count: sequence,
      hash,
      where: `note ${sequence}`,
    }))
    const verdict = await verify([...anchors, { count: 0, hash: beginningOfLedger, where: 'the beginning' }])
    expect(verdict).toMatchObject({ sound: true, anchors: 7 })
  })

  it('knows the anchors of published datasheets', async () => {
    await storeOneOfEach()
    expect(await anchorsInDatabase(database().read)).toEqual([
      { count: 0, hash: beginningOfLedger, where: 'datasheet DS-0001, revision 1' },
    ])
  })
})
