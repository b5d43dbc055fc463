import { beforeAll, describe, expect, it, vi } from 'vitest'
import type { Actor } from '@/lib/access/actor'
import { database } from '@/lib/data/database'
import { publishDatasheetSchema } from '@/lib/input/datasheet'
import { decideLot } from '@/lib/services/decide-lot'
import { getToday, type Today } from '@/lib/services/get-today'
import { publishDatasheet } from '@/lib/services/publish-datasheet'
import { recordSpecimens } from '@/lib/services/record-specimens'
import { refusalOf } from '../../support/refusal-of'
import { calmTenths, measureLot, measureLots } from '../../support/steel-lots'
import {
  day,
  fiveAbout,
  openSteelLot,
  requestOf,
  type SteelWorks,
  setUpSteelWorks,
} from '../../support/steel-works'
import { describeOnEachEngine, useFreshDatabase } from '../../support/template-database'

const { asked } = vi.hoisted(() => ({ asked: { queries: 0 } }))

// Counts what is really sent to the engine, below the client.
vi.mock('@/lib/data/connections', async (original) => {
  const real = await original<typeof import('@/lib/data/connections')>()
  const counting = <T extends object>(target: T): T =>
    new Proxy(target, {
      get: (inner, name) => {
        const value: unknown = Reflect.get(inner, name)
        if (typeof value !== 'function') return value
        return (...args: unknown[]) => {
          if (name === 'queryRaw') asked.queries += 1
          const given: unknown = value.apply(inner, args)
          return name === 'connect' ? (given as Promise<object>).then(counting) : given
        }
      },
    })
  return {
    ...real,
    connectionFactory: (...args: Parameters<typeof real.connectionFactory>) =>
      counting(real.connectionFactory(...args)),
  }
})

const itemsOf = ({ bands }: Today) => bands.flatMap(({ items }) => items)
const kindsOf = (today: Today) => itemsOf(today).map(({ kind }) => kind)
const lineOf = (today: Today, key: string) => itemsOf(today).find((item) => item.key === key)
const queriesOf = async (actor: Actor): Promise<number> => {
  const before = asked.queries
  await getToday(actor, NOW)
  return asked.queries - before
}

/** Sixty days after the works was set up. */
const NOW = day(60)

const release = (works: SteelWorks, code: string) =>
  decideLot(works.quality, code, {
    verb: 'release',
    reason: 'Inside tolerance, routes closed.',
    lotVersion: 2,
    answers: [],
  })

describeOnEachEngine('today', (engine) => {
  useFreshDatabase()
  let works: SteelWorks
  const everyone = (): Actor => ({
    ...works.quality,
    roles: ['bench', 'quality', 'sales', 'administrator'],
  })
  const itemsAt = async (at: number) => itemsOf(await getToday(works.quality, at))
  beforeAll(async () => {
    works = await setUpSteelWorks()
  })

  it('asks who it is', async () => {
    expect(await refusalOf(getToday(undefined))).toMatchObject({ code: 'not-signed-in' })
  })

  it('says so when nothing waits', async () => {
    for (const actor of [works.bench, works.quality, works.sales])
      expect(await getToday(actor, NOW)).toMatchObject({ headline: 'Nothing waits for you.', bands: [] })
  })

  it('is for people with a role', async () => {
    expect(await refusalOf(getToday({ ...works.bench, roles: [] }, NOW))).toMatchObject({
      code: 'not-permitted',
    })
  })

  describe('with lots at every stage', () => {
    beforeAll(async () => {
      await measureLots(works, calmTenths(4))
      await measureLot(works, 'THICK', 5, 2700)
      await openSteelLot(works.bench, 'BEGUN', 6)
      await recordSpecimens(works.bench, requestOf('BEGUN', fiveAbout(2540).slice(0, 2)), day(6))
      await openSteelLot(works.bench, 'UNTOUCHED', 2)
      await measureLot(works, 'HELD', 7, 2540)
      await decideLot(
        works.quality,
        'HELD',
        { verb: 'hold', reason: 'Ask the drawer about the oil.', lotVersion: 2, answers: [] },
        day(8),
      )
    })

    it('gives the bench its lots, half measured ones first though they are newer', async () => {
      const today = await getToday(works.bench, NOW)
      expect(itemsOf(today).map(({ key }) => key)).toEqual([
        'lot BEGUN',
        'lot UNTOUCHED',
        'held Ask the drawer about the oil.',
      ])
      expect(lineOf(today, 'lot BEGUN')).toMatchObject({ href: '/bench/BEGUN', text: /^2 specimens of 5/ })
      expect(lineOf(today, 'held Ask the drawer about the oil.')).toMatchObject({
        title: 'Your lot HELD is on hold',
        text: 'Held because: Ask the drawer about the oil.',
        href: '/lots/HELD',
      })
      expect(today.headline).toBe(
        'One lot is half measured, one lot waits to be measured, and one more thing waits.',
      )
    })

    it('shows a held lot to its maker alone', async () => {
      expect(kindsOf(await getToday(works.otherBench, NOW))).toEqual(['lot-half-measured', 'lot-to-measure'])
    })

    it('gives quality the lot outside first, calm ones in one line, and the hold that lasts', async () => {
      const today = await getToday(works.quality, NOW)
      expect(kindsOf(today)).toEqual(['lot-outside', 'lot-to-decide', 'lot-held'])
      expect(lineOf(today, 'lot THICK')).toMatchObject({
        href: '/lots/THICK/release',
        text: expect.stringMatching(/^Outside tolerance: .*diameter/),
      })
      expect(lineOf(today, 'lots to decide')).toMatchObject({
        title: 'L-1, L-2, L-3 and 1 more wait for a decision',
        href: '/lots?state=to-decide',
        waiting: '58 days',
      })
      expect(lineOf(today, 'held Ask the drawer about the oil.')).toMatchObject({
        kind: 'lot-held',
        waiting: '52 days',
      })
    })

    it('makes one line of lots that are held for the same reason', async () => {
      await measureLot(works, 'HELD-2', 8, 2541)
      await decideLot(
        works.quality,
        'HELD-2',
        { verb: 'hold', reason: 'Ask the drawer about the oil.', lotVersion: 2, answers: [] },
        day(9),
      )
      const held = (await itemsAt(NOW)).filter(({ kind }) => kind === 'lot-held')
      expect(held).toMatchObject([
        {
          title: 'HELD and HELD-2 have been on hold for more than a week',
          stake: '2 lots of Larch 254',
          waiting: '52 days',
          href: '/lots?state=held',
        },
      ])
    })

    it('does not call a hold of yesterday a long one', async () => {
      expect(kindsOf(await getToday(works.quality, day(9)))).not.toContain('lot-held')
    })

    it('shows somebody with several roles the union, each thing once', async () => {
      const today = await getToday(everyone(), NOW)
      const keys = itemsOf(today).map(({ key }) => key)
      expect(new Set(keys).size).toBe(keys.length)
      for (const actor of [works.quality, works.bench, works.sales, works.administrator])
        for (const { key } of itemsOf(await getToday({ ...everyone(), roles: actor.roles }, NOW)))
          expect(keys).toContain(key)
    })

    it('counts the day in the time zone of the works', async () => {
      // HELD was made on day 7 at 8 UTC; in Oslo that day ends at 23 UTC.
      const MINUTE = 60_000
      const midnight = day(7) + 15 * 60 * MINUTE
      const figuresAt = async (at: number) => (await getToday(works.bench, at)).figures
      expect((await figuresAt(midnight - MINUTE))?.day).toMatchObject({ made: 1, measured: 1 })
      expect((await figuresAt(midnight + MINUTE))?.day).toMatchObject({ made: 0, measured: 0 })
      expect((await figuresAt(day(9)))?.week).toMatchObject({ firstDecided: 2, rightFirstTime: 0, made: 8 })
      expect((await getToday(works.sales, NOW)).figures).toBeUndefined()
    })
  })

  describe('with signals, equipment and imports', () => {
    beforeAll(async () => {
      await database().write(async (tx) => {
        const product = await tx.product.findUniqueOrThrow({ where: { code: 'L254' } })
        const machine = await tx.machine.findUniqueOrThrow({ where: { code: 'DM-1' } })
        const lots = await tx.lot.findMany({
          where: { code: { startsWith: 'L-' } },
          orderBy: { code: 'asc' },
        })
        const limitSet = await tx.limitSet.create({
          data: {
            productId: product.id,
            characteristic: 'diameter',
            statistic: 'mean',
            number: 1,
            centre: 254e-6,
            sigma: 1e-6,
            sigmaEstimator: 'moving-range mean',
            lotCount: 20,
            provisional: true,
            baseline: '{"lots":[],"leftOut":[]}',
            effectiveFrom: new Date(day(0)),
            frozenAt: new Date(day(0)),
          },
        })
        const signal = (characteristic: string, members: readonly number[], machineId?: number) =>
          tx.signal.create({
            data: {
              lotId: members.at(-1) ?? 0,
              productId: product.id,
              characteristic,
              statistic: 'mean',
              limitSetId: limitSet.id,
              machineId: machineId ?? null,
              rule: 'nine-on-one-side',
              side: 'above',
              members: JSON.stringify(members),
              departure: 1e-6,
              state: 'open',
              raisedAt: new Date(day(10)),
            },
          })
        const ids = lots.map(({ id }) => id)
        await signal('diameter', ids.slice(0, 2))
        await signal('massPerMetreWeighed', ids.slice(1, 2))
        await signal('tension', ids.slice(2, 4), machine.id)
        await tx.gauge.update({ where: { code: 'B-03' }, data: { calibrationDueAt: new Date(day(50)) } })
        await tx.gauge.update({ where: { code: 'R-01' }, data: { calibrationDueAt: new Date(day(70)) } })
        const importOf = (fileName: string, createdById: number, state: string) =>
          tx.import.create({
            data: {
              fileName,
              sha256: fileName,
              bytes: 1,
              format: 'csv',
              state,
              options: '{}',
              message: state === 'failed' ? 'The file ends within a quoted cell.' : '',
              createdAt: new Date(day(59)),
              createdById,
            },
          })
        const mine = await importOf('mine.csv', works.bench.personId, 'done')
        const other = await importOf('other.csv', works.otherBench.personId, 'done')
        await importOf('broken.csv', works.bench.personId, 'failed')
        const row = (importId: number, number: number, kind: string, state: string) =>
          tx.importRow.create({
            data: { importId, row: number, line: number + 1, kind, problems: '[]', cells: '{}', state },
          })
        await row(mine.id, 1, 'refused', 'open')
        await row(mine.id, 2, 'differs', 'open')
        await row(mine.id, 3, 'differs', 'kept-stored')
        await row(other.id, 1, 'refused', 'open')
        await tx.person.create({
          data: { name: 'N. Carr', username: 'carr', searchKey: 'n. carr', createdAt: new Date(day(55)) },
        })
      })
    })

    it('makes one line of signals that share a lot, and names the machine that several products share', async () => {
      const today = await getToday(works.quality, NOW)
      const signals = itemsOf(today).filter(({ kind }) => kind === 'signal')
      expect(signals.map(({ title }) => title)).toEqual([
        'Larch 254: diameter and mass per metre, weighed',
        expect.stringMatching(/^Drawing machine 1: tension/),
      ])
      expect(signals[0]).toMatchObject({ stake: '2 lots, 2 to decide', waiting: '50 days' })
      expect(signals[0]?.text).toContain('One more signal of the same lots.')
      expect(signals[0]?.href).toMatch(/^\/drift\?product=L254&lot=L-2#signal-\d+$/)
      // Three signals, though two lines.
      expect(today.headline).toBe(
        'One lot is outside its tolerance, three signals wait for an answer, and ten more things wait.',
      )
    })

    it('has the overdue balance before the rule that is due, with the readings that rest on each', async () => {
      const today = await getToday(works.bench, NOW)
      expect(itemsOf(today).filter(({ key }) => key.startsWith('gauge'))).toMatchObject([
        { kind: 'gauge-overdue', key: 'gauge B-03', stake: 'no reading this month' },
        { kind: 'gauge-due', key: 'gauge R-01', waiting: '10 days left', href: '/equipment/gauges/R-01' },
      ])
      // Of the lots of the thirty days before day 36 one has two specimens (BEGUN) and two have five (HELD, HELD-2).
      expect(lineOf(await getToday(works.quality, day(36)), 'gauge B-03')).toMatchObject({
        kind: 'gauge-due',
        stake: '12 readings of lots of this month',
      })
    })

    it('gives the bench its own open rows, quality all of them, the administrator what failed', async () => {
      const rows = async (actor: Actor) =>
        itemsOf(await getToday(actor, NOW))
          .filter(({ key }) => key.startsWith('import'))
          .map(({ kind, title }) => `${kind}: ${title}`)
      expect(await rows(works.bench)).toEqual(['own-import-rows: mine.csv: 2 rows wait for a decision'])
      expect(await rows(works.quality)).toEqual([
        'import-rows: mine.csv: 2 rows wait for a decision',
        'import-rows: other.csv: 1 row waits for a decision',
      ])
      expect(await rows(works.administrator)).toEqual(['import-failed: The import of broken.csv failed'])
    })

    it('tells the administrator who has no role', async () => {
      expect(itemsOf(await getToday(works.administrator, NOW))).toContainEqual(
        expect.objectContaining({
          kind: 'person-without-role',
          title: 'N. Carr has no role',
          waiting: '5 days',
        }),
      )
    })
  })

  describe('once lots are released', () => {
    beforeAll(async () => {
      await database().write((tx) => tx.signal.updateMany({ where: {}, data: { state: 'no-longer-holds' } }))
      await database().write((tx) =>
        tx.gauge.updateMany({ where: {}, data: { calibrationDueAt: new Date(day(2000)) } }),
      )
      await release(works, 'L-1')
      await release(works, 'L-2')
    })

    it('asks sales for a datasheet, and later for a new revision', async () => {
      expect(itemsOf(await getToday(works.sales, Date.now()))).toMatchObject([
        {
          kind: 'product-without-datasheet',
          href: '/datasheets/new?productCode=L254',
          stake: '2 released lots',
        },
      ])
      const asking = {
        productCode: 'L254',
        notes: 'D4',
        lengths: '648',
        a4: '440',
        basis: 'unloaded-mass',
        forceUnit: 'N',
        supersedes: 0,
      }
      await publishDatasheet(works.sales, publishDatasheetSchema.parse(asking))
      expect(kindsOf(await getToday(works.sales, Date.now() + 1000))).toEqual(['lots-released'])
      await publishDatasheet(works.sales, publishDatasheetSchema.parse({ ...asking, supersedes: 1 }))
      expect(kindsOf(await getToday(works.sales, Date.now() + 1000))).toEqual([
        'lots-released',
        'revision-superseded',
      ])
    })

    it('puts a released lot whose evidence changed, and the sheet that rests on it, before all else', async () => {
      await database().write(async (tx) => {
        await tx.lot.update({ where: { code: 'L-1' }, data: { evidenceChanged: true } })
        await tx.datasheetRevision.updateMany({ where: {}, data: { evidenceChanged: true } })
      })
      expect(kindsOf(await getToday(works.quality, NOW))[0]).toBe('released-changed')
      expect(itemsOf(await getToday(works.sales, NOW))[0]).toMatchObject({
        kind: 'datasheet-changed',
        title: 'DS-0001: readings behind it have changed',
      })
    })
  })

  it('asks as many queries for forty lots more as before, and shows twelve lines of a kind at most', async () => {
    const actors = [works.quality, works.bench, works.sales, works.administrator, everyone()]
    const before = []
    for (const actor of actors) before.push(await queriesOf(actor))
    for (let index = 1; index <= 20; index += 1) {
      await openSteelLot(works.bench, `NEW-${index}`, 20 + index)
      await measureLot(works, `WIDE-${index}`, 20 + index, 2700)
    }
    const after = []
    for (const actor of actors) after.push(await queriesOf(actor))
    expect(after).toEqual(before)
    expect(Math.min(...before)).toBeGreaterThan(3)
    expect(Math.max(...before)).toBeLessThan(90)
    const today = await getToday(everyone(), NOW)
    for (const kind of ['lot-outside', 'lot-to-measure'])
      expect(kindsOf(today).filter((one) => one === kind)).toHaveLength(12)
    expect(today.bands.flatMap(({ more }) => more)).toContainEqual({
      kind: 'lot-outside',
      count: 21,
      href: '/lots?state=to-decide',
    })
    // What is not shown is counted all the same; of back-ups nothing is known on PostgreSQL.
    expect(today.headline).toContain(`and ${engine === 'sqlite' ? 55 : 54} more things wait.`)
  })
})
