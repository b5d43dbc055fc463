import { readdirSync, readFileSync } from 'node:fs'
import { join } from 'node:path'
import { beforeAll, describe, expect, it } from 'vitest'
import { roles } from '@/lib/access/actor'
import { database } from '@/lib/data/database'
import { storageProblem } from '@/lib/data/db-errors'
import { controlRules } from '@/lib/domain/control/find-signals'
import { dispositionVerbs } from '@/lib/domain/quality/propose-disposition'
import { chartedStatistics } from '@/lib/domain/record/chart-history'
import { lotStates } from '@/lib/domain/record/lot-state'
import { readingKinds } from '@/lib/domain/record/reading'
import { storeOneOfEach } from '../../support/one-of-each'
import { onRawConnection } from '../../support/raw-connection'
import { describeOnEachEngine, migrationSet, useFreshDatabase } from '../../support/template-database'

const refused = (sql: string) =>
  expect(
    onRawConnection((run) => run(sql)),
    sql,
  ).rejects.toThrow('Ledgerline: ')
const accepted = (sql: string) => onRawConnection((run) => run(sql))

/** Table → columns of type Float, from the data model. */
const numbersOf = (): ReadonlyArray<readonly [table: string, column: string]> => {
  const folder = 'prisma/schema'
  return readdirSync(folder).flatMap((file) => {
    let table = ''
    return readFileSync(join(folder, file), 'utf8')
      .split('\n')
      .flatMap((line): Array<[string, string]> => {
        table = /^model (\w+)/.exec(line)?.[1] ?? table
        const column = /^ {2}(\w+)\s+Float\b/.exec(line)?.[1]
        return column ? [[table, column]] : []
      })
  })
}

describeOnEachEngine('guards of the database', (engine) => {
  useFreshDatabase()
  beforeAll(async () => {
    await storeOneOfEach()
  })

  describe('append-only tables, from raw SQL', () => {
    it.each([
      ['Reading', `"body" = '{"diameters":[0.000255]}'`],
      ['Reading', `"reason" = "reason"`],
      ['Evaluation', `"inputHash" = 'x'`],
      ['SpecimenResult', '"diameter" = 0.000255'],
      ['InputSnapshot', `"body" = '{"x":1}'`],
      ['LedgerEntry', `"verb" = 'release'`],
      ['SpecificationRevision', `"body" = '{"x":1}'`],
      ['DatasheetLot', '"lotId" = "lotId"'],
    ])('refuse an update of %s: %s', async (table, change) => {
      await refused(`update "${table}" set ${change}`)
    })

    it.each([
      'Reading',
      'Evaluation',
      'SpecimenResult',
      'InputSnapshot',
      'LedgerEntry',
      'SpecificationRevision',
      'DatasheetLot',
      'Disposition',
      'DatasheetRevision',
      'LimitSet',
      'Signal',
      'Specimen',
      'Lot',
      'Person',
      'LedgerHead',
    ])('refuse a deletion from %s', async (table) => {
      await refused(`delete from "${table}"`)
      if (engine === 'postgresql') await refused(`truncate "${table}" cascade`)
    })

    it('refuse a replacement of a reading', async () => {
      if (engine === 'postgresql') {
        await refused(`insert into "Reading" ("id", "clientId", "specimenId", "kind", "body", "hash", "measuredAt", "recordedAt")
          select "id", "clientId", "specimenId", "kind", '{}', "hash", "measuredAt", "recordedAt" from "Reading"
          on conflict ("id") do update set "body" = excluded."body"`)
      } else {
        await refused(`insert or replace into "Reading" ("id", "clientId", "specimenId", "kind", "body", "hash", "measuredAt", "recordedAt", "reason")
          select "id", "clientId", "specimenId", "kind", '{}', "hash", "measuredAt", "recordedAt", "reason" from "Reading"`)
      }
      const [reading] = await database().read.reading.findMany()
      expect(reading?.body).toBe('{"diameters":[0.000254]}')
    })

    it('are named to a person as a sentence', async () => {
      const error: unknown = await database()
        .write((tx) => tx.reading.updateMany({ data: { body: '{}' } }))
        .catch((caught: unknown) => caught)
      expect(storageProblem(error)?.problem).toMatchObject({
        code: 'conflict',
        message: 'A reading is never changed or removed, a correction is a reading that supersedes it.',
      })
    })
  })

  describe('rows that keep what they say', () => {
    it.each([
      ['Disposition', `"verb" = 'release'`],
      ['Disposition', `"evidence" = '{"x":1}'`],
      ['DatasheetRevision', `"body" = '{"x":1}'`],
      ['DatasheetRevision', `"ledgerHash" = 'x'`],
      ['LimitSet', '"upper" = 0.0003'],
      ['LimitSet', '"upper" = null'],
      ['Signal', `"rule" = 'nine-on-one-side'`],
      ['Signal', '"machineId" = 7'],
      ['LimitSet', '"target" = 0.0003'],
      ['LimitSet', `"rules" = 'beyond-the-limits'`],
      ['Specimen', '"number" = 2'],
      ['Lot', `"code" = 'LA-9999'`],
    ])('refuse a change of %s: %s', async (table, change) => {
      await refused(`update "${table}" set ${change}`)
    })

    it.each([
      ['Disposition', '"current" = false, "evidenceChanged" = true'],
      ['DatasheetRevision', '"evidenceChanged" = true'],
      ['Signal', `"state" = 'answered', "cause" = 'a worn die'`],
      ['Lot', `"state" = 'held', "version" = 2`],
    ])('accept the marks beside it on %s: %s', async (table, change) => {
      await accepted(`update "${table}" set ${change}`)
    })
  })

  describe('the ledger', () => {
    const entry = (sequence: number, previous: string) =>
      `insert into "LedgerEntry" ("sequence", "at", "verb", "subject", "body", "previousHash", "hash")
       values (${sequence}, ${engine === 'sqlite' ? '0' : `'2026-01-01T00:00:00Z'`}, 'x', 'x', '{}', '${previous}', 'y${sequence}')`

    it('refuses an entry out of order, or one that hangs on nothing', async () => {
      const head = await database().read.ledgerHead.findUniqueOrThrow({ where: { id: 1 } })
      expect(head.count).toBe(1)
      await refused(entry(3, head.hash))
      await refused(entry(1, head.hash))
      await refused(entry(2, 'another'))
    })

    it('refuses to move the head but to the entry just written, and has one head', async () => {
      await refused(`update "LedgerHead" set "count" = 0`)
      await refused(`update "LedgerHead" set "hash" = 'x'`)
      await refused(`update "LedgerHead" set "count" = 2`)
      await refused(`insert into "LedgerHead" ("id", "count", "hash") values (2, 0, 'x')`)
    })
  })

  describe('numbers', () => {
    it.each(numbersOf())('%s.%s is covered by the guards', (name, column) => {
      const { guards } = migrationSet()
      const pattern =
        engine === 'sqlite'
          ? [`"${name}_finite_insert" BEFORE INSERT`, `"${name}_finite_update" BEFORE UPDATE`]
          : [`"${name}_finite" CHECK`]
      for (const part of pattern) {
        const start = guards.indexOf(part)
        expect(start, part).toBeGreaterThan(0)
        expect(guards.slice(start, guards.indexOf(';', start))).toContain(`"${column}"`)
      }
    })

    const infinity = engine === 'sqlite' ? '9e999' : `'Infinity'`
    const minusInfinity = engine === 'sqlite' ? '-9e999' : `'-Infinity'`

    it.each([infinity, minusInfinity])('refuse %s when a row comes in and when it changes', async (value) => {
      const pattern =
        engine === 'sqlite' ? 'Ledgerline: A number in Lot is not finite' : /violates check constraint/
      const attempt = (sql: string) => expect(onRawConnection((run) => run(sql))).rejects.toThrow(pattern)
      await attempt(`update "Lot" set "lengthMetres" = ${value}`)
      await attempt(
        `insert into "Lot" ("code", "searchKey", "productId", "specificationRevisionId", "madeAt", "lengthMetres", "state", "createdAt")
         select 'LA-2', 'la-2', "productId", "specificationRevisionId", "madeAt", ${value}, "state", "createdAt" from "Lot"`,
      )
    })

    it('refuse what is not a number', async () => {
      if (engine === 'sqlite') {
        await refused(`update "Lot" set "lengthMetres" = 'long'`)
        await refused(`update "Signal" set "departure" = x'00'`)
      } else
        await expect(
          onRawConnection((run) => run(`update "Lot" set "lengthMetres" = 'NaN'`)),
        ).rejects.toThrow('violates check constraint')
    })

    it.each(['0', '-1.5', '1e300', '5e-324', 'null'])('accept %s', async (value) => {
      await accepted(`update "Lot" set "lengthMetres" = ${value}`)
    })
  })

  describe('words from closed lists', () => {
    const lists: ReadonlyArray<readonly [table: string, column: string, words: readonly string[]]> = [
      ['Lot', 'state', lotStates],
      ['Disposition', 'verb', dispositionVerbs],
      ['Signal', 'state', ['open', 'answered', 'no-longer-holds']],
      ['Signal', 'rule', Object.keys(controlRules)],
      ['Signal', 'side', ['above', 'below']],
      ['Signal', 'statistic', chartedStatistics],
      ['LimitSet', 'statistic', chartedStatistics],
      ['MaterialIn', 'kind', ['coil', 'spool', 'resin-batch']],
      ['LotMaterial', 'role', ['core', 'wrap-1', 'wrap-2', 'resin']],
      ['Import', 'state', ['draft', 'queued', 'running', 'done', 'cancelled', 'failed']],
      ['Import', 'format', ['csv', 'xlsx']],
      ['ImportRow', 'kind', ['refused', 'differs']],
      ['ImportRow', 'state', ['open', 'kept-stored', 'took-file']],
      ['Reading', 'kind', readingKinds],
      ['Evaluation', 'cause', ['first', 'superseded', 'calibration', 'rig', 'material', 'settings', 'model']],
      ['PersonRole', 'role', roles],
    ]

    it.each(lists)('%s.%s has the words of the domain', (table, column, words) => {
      const { guards } = migrationSet()
      const name = engine === 'sqlite' ? `"${table}_${column}_insert"` : `"${table}_${column}_known" CHECK`
      const start = guards.indexOf(`${engine === 'sqlite' ? 'CREATE TRIGGER ' : 'ADD CONSTRAINT '}${name}`)
      expect(start).toBeGreaterThan(0)
      const list = /IN \(([^)]*)\)/.exec(guards.slice(start))?.[1] ?? ''
      expect(list.split(', ').sort()).toEqual(words.map((word) => `'${word}'`).sort())
    })

    it('refuse a word that is not in them', async () => {
      const pattern = engine === 'sqlite' ? 'Lot has no state of that name' : /Lot_state_known/
      const attempt = (sql: string) => expect(onRawConnection((run) => run(sql))).rejects.toThrow(pattern)
      await attempt(`update "Lot" set "state" = 'sold'`)
      await attempt(
        `insert into "Lot" ("code", "searchKey", "productId", "specificationRevisionId", "madeAt", "state", "createdAt")
         select 'LA-3', 'la-3', "productId", "specificationRevisionId", "madeAt", 'sold', "createdAt" from "Lot"`,
      )
    })
  })
})
