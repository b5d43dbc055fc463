import BetterSqlite3 from 'better-sqlite3'
import pg from 'pg'
import readXlsxFile from 'read-excel-file/node'
import { beforeAll, describe, expect, it, vi } from 'vitest'
import { database } from '@/lib/data/database'
import { insertProduct } from '@/lib/data/products'
import { MODEL_VERSION } from '@/lib/domain/metrology/model-version'
import { lotStates } from '@/lib/domain/record/lot-state'
import { type ListLotsInput, readLotAddress } from '@/lib/input/lot-list'
import { listLotChoices, listLots } from '@/lib/services/list-lots'
import { saveLots } from '@/lib/services/save-lots'
import { refusalOf } from '../../support/refusal-of'
import { BEGIN, day, type SteelWorks, setUpSteelWorks } from '../../support/steel-works'
import { describeOnEachEngine, useFreshDatabase } from '../../support/template-database'

const COUNT = 3000
const HOUR = 3_600_000

const asked = (query: Record<string, string> = {}): ListLotsInput => readLotAddress(query).input
const codeOf = (index: number): string => `M-${String(index).padStart(4, '0')}`

/** Statements that reach the database while `work` runs, on either engine. */
async function statementsOf(work: () => Promise<unknown>): Promise<number> {
  const sqlite = vi.spyOn(BetterSqlite3.prototype, 'prepare')
  const postgresql = vi.spyOn(pg.Client.prototype, 'query')
  try {
    await work()
    return sqlite.mock.calls.length + postgresql.mock.calls.length
  } finally {
    sqlite.mockRestore()
    postgresql.mockRestore()
  }
}

/**
 * Lots M-0001 … M-3000, one an hour from BEGIN on, states in turn, every third of another product, every second
 * with a length, every fifth measured. Lots 1, 2 and 3 stand in an open signal, 4 in an answered one.
 */
async function makeLots(works: SteelWorks): Promise<void> {
  await database().write(async (tx) => {
    const larch = await tx.product.findUniqueOrThrow({ where: { code: 'L254' }, select: { id: true } })
    const rowan = await insertProduct(
      tx,
      'R_1060',
      { name: 'Rowan 1060', family: 'Rowan', construction: 'wound' },
      BEGIN,
    )
    const revision = await tx.specificationRevision.findFirstOrThrow({ select: { id: true } })
    const machine = await tx.machine.findUniqueOrThrow({ where: { code: 'DM-1' }, select: { id: true } })
    const die = await tx.die.findUniqueOrThrow({ where: { code: 'D-8' }, select: { id: true } })
    const lots = Array.from({ length: COUNT }, (_, offset) => {
      const index = offset + 1
      const wound = index % 3 === 0
      return {
        id: index,
        code: codeOf(index),
        searchKey: `${codeOf(index)} ${wound ? 'Rowan 1060 R_1060' : 'Larch 254 L254'}`.toLowerCase(),
        productId: wound ? rowan.id : larch.id,
        specificationRevisionId: revision.id,
        machineId: index % 2 === 0 ? machine.id : null,
        dieId: index % 4 === 0 ? die.id : null,
        makerId: works.bench.personId,
        madeAt: new Date(BEGIN + index * HOUR),
        measuredAt: index % 5 === 0 ? new Date(BEGIN + (COUNT - index) * HOUR) : null,
        lengthMetres: index % 2 === 0 ? index : null,
        state: lotStates[index % lotStates.length] ?? 'measuring',
        evidenceChanged: index === 10,
        createdAt: new Date(BEGIN),
      }
    })
    for (let first = 0; first < COUNT; first += 250)
      await tx.lot.createMany({ data: lots.slice(first, first + 250) })
    const coil = await tx.materialIn.create({
      data: { code: 'C-118', name: 'Coil', searchKey: 'c-118', kind: 'coil', createdAt: new Date(BEGIN) },
      select: { id: true },
    })
    await tx.lotMaterial.create({ data: { lotId: 2, role: 'core', materialInId: coil.id } })
    await tx.lotSummary.create({
      data: {
        ...{ lotId: 2, characteristic: 'diameter', modelVersion: MODEL_VERSION, n: 5, mean: 254.25e-6 },
        ...{ m2: 4e-12, min: 253e-6, max: 255e-6, uCommon: 0, uMean: 0, productId: larch.id },
        madeAt: new Date(BEGIN),
      },
    })
    const limits = await tx.limitSet.create({
      data: {
        ...{ productId: larch.id, characteristic: 'diameter', statistic: 'mean', number: 1 },
        ...{ centre: 254e-6, sigma: 1e-6, sigmaEstimator: 'moving-range', lotCount: 60, provisional: false },
        ...{ baseline: '{}', effectiveFrom: new Date(BEGIN), frozenAt: new Date(BEGIN) },
      },
      select: { id: true },
    })
    const signal = (lotId: number, members: string, state: string) => ({
      ...{ lotId, members, state, productId: larch.id, characteristic: 'diameter', statistic: 'mean' },
      ...{ limitSetId: limits.id, rule: 'beyond-the-limits', side: 'above', departure: 1e-6 },
      raisedAt: new Date(BEGIN),
    })
    await tx.signal.createMany({
      data: [signal(2, '[1,2,3]', 'open'), signal(2, '[2]', 'open'), signal(4, '[4]', 'answered')],
    })
  })
}

describeOnEachEngine('the list of lots', () => {
  useFreshDatabase()
  let works: SteelWorks
  beforeAll(async () => {
    works = await setUpSteelWorks()
    await makeLots(works)
  })

  const codes = async (query: Record<string, string>, actor = works.quality): Promise<readonly string[]> =>
    (await listLots(actor, asked(query))).lots.map(({ code }) => code)
  const count = async (query: Record<string, string>): Promise<number> =>
    (await listLots(works.quality, asked(query))).count

  it('is newest first, fifty a page; a page beyond the last is the last', async () => {
    const first = await listLots(works.quality, asked())
    expect(first).toMatchObject({ count: COUNT, page: 1, pages: 60 })
    expect(first.lots.map(({ code }) => code)).toEqual(
      Array.from({ length: 50 }, (_, index) => codeOf(COUNT - index)),
    )
    const last = await listLots(works.quality, asked({ page: '99' }))
    expect([last.page, last.lots.at(-1)?.code]).toEqual([60, codeOf(1)])
  })

  it('totals the whole selection, not the page', async () => {
    const { metres, lotsWithLength, states } = await listLots(works.quality, asked())
    // Sum of the even numbers up to 3000.
    expect([metres, lotsWithLength]).toEqual([1500 * 1501, 1500])
    expect(states.map(({ state, lots }) => [state, lots])).toEqual(lotStates.map((state) => [state, 375]))
    expect((await listLots(works.quality, asked({ state: 'held' }))).states).toHaveLength(1)
  })

  it('finds parts of code and product whatever the case, each word of several; signs stand for themselves', async () => {
    expect(await codes({ search: 'm-0123' })).toEqual(['M-0123'])
    expect(await codes({ search: 'ROWAN  m-0123' })).toEqual(['M-0123'])
    expect(await codes({ search: 'larch m-0123' })).toEqual([])
    expect(await count({ search: 'r_1060' })).toBe(COUNT / 3)
    expect([
      await count({ search: 'm_0123' }),
      await count({ search: '%' }),
      await count({ search: '\\' }),
    ]).toEqual([0, 0, 0])
  })

  it('filters by state, product, family, machine, die and changed evidence, together', async () => {
    expect(await count({ state: 'held' })).toBe(375)
    expect(await count({ productCode: 'R_1060' })).toBe(1000)
    expect(await count({ family: 'Rowan' })).toBe(1000)
    expect(await count({ machineCode: 'DM-1' })).toBe(1500)
    expect(await count({ dieCode: 'D-8' })).toBe(750)
    expect(await count({ family: 'Rowan', dieCode: 'D-8' })).toBe(250)
    expect(await count({ dieCode: 'D-7' })).toBe(0)
    expect(await count({ productCode: 'NONE' })).toBe(0)
    expect(await codes({ evidence: 'changed' })).toEqual(['M-0010'])
  })

  it('takes days as the clock of the works tells them, both ends among them', async () => {
    // Oslo is an hour ahead: its 6 January ends at 23:00 UTC, 39 hours after BEGIN (5 January, 8:00 UTC).
    const found = await codes({ from: '2026-01-06', to: '2026-01-06' })
    expect([found[0], found.at(-1), found.length]).toEqual(['M-0038', 'M-0015', 24])
    expect(await count({ from: '2026-01-06' })).toBe(COUNT - 14)
    expect(await count({ to: '2026-01-05' })).toBe(14)
  })

  it('finds the lots of open signals, and counts a lot’s own', async () => {
    const { lots } = await listLots(works.quality, asked({ signals: 'open', sort: 'code-up' }))
    expect(lots.map(({ code, openSignals }) => [code, openSignals])).toEqual([
      ['M-0001', 1],
      ['M-0002', 2],
      ['M-0003', 1],
    ])
    expect((await listLots(works.quality, asked({ search: 'm-0004' }))).lots[0]?.openSignals).toBe(0)
  })

  it.each([
    ['made-up', ['M-0001', 'M-0002']],
    ['code-down', ['M-3000', 'M-2999']],
    ['code-up', ['M-0001', 'M-0002']],
    ['product-up', ['M-2999', 'M-2998']],
    ['product-down', ['M-3000', 'M-2997']],
    ['state-up', ['M-3000', 'M-2992']],
    ['state-down', ['M-2999', 'M-2991']],
    ['length-down', ['M-3000', 'M-2998']],
    ['length-up', ['M-0002', 'M-0004']],
    ['measured-up', ['M-3000', 'M-2995']],
    ['measured-down', ['M-0005', 'M-0010']],
  ])('sorts by %s, on both engines alike', async (sort, expected) => {
    expect((await codes({ sort })).slice(0, 2)).toEqual(expected)
  })

  it.each(['length-down', 'length-up', 'measured-down', 'measured-up'])(
    'puts what has no such value last: %s',
    async (sort) => {
      const { lots } = await listLots(works.quality, asked({ sort, page: '60' }))
      const key = sort.startsWith('length') ? 'lengthMetres' : 'measuredAt'
      expect(lots.every((lot) => lot[key] === undefined)).toBe(true)
    },
  )

  it('has each lot once over all pages, whatever the order', async () => {
    const seen: string[] = []
    for (let page = 1; page <= 60; page += 1)
      seen.push(...(await codes({ sort: 'state-down', page: String(page) })))
    expect([seen.length, new Set(seen).size]).toEqual([COUNT, COUNT])
  })

  it('shows what was measured and what a lot is made of', async () => {
    expect((await listLots(works.quality, asked({ search: 'm-0002' }))).lots[0]).toMatchObject({
      productName: 'Larch 254',
      family: 'Larch',
      machine: 'Drawing machine 1',
      die: undefined,
      maker: 'T. Aldous',
      materials: [{ role: 'core', code: 'C-118' }],
      specimens: 0,
      lengthMetres: 2,
      summaries: { diameter: { n: 5, mean: 254.25e-6, m2: 4e-12 } },
    })
  })

  it('asks the database as often for a full page as for one lot, however many fit', async () => {
    await listLots(works.quality, asked())
    const one = await statementsOf(() => listLots(works.quality, asked({ search: 'm-0002' })))
    const page = await statementsOf(() => listLots(works.quality, asked()))
    const deep = await statementsOf(() => listLots(works.quality, asked({ page: '40', sort: 'state-up' })))
    expect(one).toBeGreaterThan(3)
    expect(Math.max(page, deep)).toBeLessThanOrEqual(one)
    expect(page).toBeLessThan(16)
  })

  it('answers soon, even on a busy machine: a page of 3000 lots in half a second', async () => {
    const times: number[] = []
    for (const sort of ['made-down', 'state-up', 'product-up', 'length-down', 'measured-up']) {
      const begin = performance.now()
      await listLots(works.quality, asked({ sort, search: 'm-', page: '30' }))
      times.push(performance.now() - begin)
    }
    expect(times.sort((a, b) => a - b)[2]).toBeLessThan(500)
  })

  describe('as sales sees it', () => {
    it('holds released lots only, whatever is asked for', async () => {
      const list = await listLots(works.sales, asked())
      expect([list.count, ...list.states.map(({ state }) => state)]).toEqual([375, 'released'])
      const others: readonly Record<string, string>[] = [
        { state: 'held' },
        { signals: 'open' },
        { search: 'm-0003' },
      ]
      for (const query of others) expect(await codes(query, works.sales)).toEqual([])
      expect((await listLots(works.sales, asked({ search: 'm-0002' }))).lots[0]).toMatchObject({
        state: 'released',
        openSignals: 0,
        materials: [],
      })
    })

    it('is chosen by product and family only; equipment is not listed', async () => {
      const choices = await listLotChoices(works.sales)
      expect([choices.machines, choices.dies]).toEqual([[], []])
      expect(await listLotChoices(works.quality)).toEqual({
        products: [
          { code: 'L254', name: 'Larch 254' },
          { code: 'R_1060', name: 'Rowan 1060' },
        ],
        families: ['Larch', 'Rowan'],
        machines: [{ code: 'DM-1', name: 'Drawing machine 1' }],
        dies: [
          { code: 'D-7', name: 'Die 7' },
          { code: 'D-8', name: 'Die 8' },
        ],
      })
    })

    it('comes as a file of the same lots, without what came in', async () => {
      const { content } = await saveLots(works.sales, 'csv', asked({ columns: 'state,materials' }))
      const lines = String(content).trim().split('\r\n')
      expect([lines[0], lines.length]).toEqual(['Lot,State', 376])
      expect(lines.slice(1).every((line) => line.endsWith(',released'))).toBe(true)
    })
  })

  it('is nobody’s who has not signed in', async () => {
    for (const refused of [
      listLots(undefined, asked()),
      saveLots(undefined, 'csv', asked()),
      listLotChoices(undefined),
    ])
      expect(await refusalOf(refused)).toMatchObject({ code: 'not-signed-in' })
  })

  describe('as a file', () => {
    it('holds the whole selection in the order and columns asked for', async () => {
      const query = asked({ sort: 'length-down', columns: 'length,diameter,materials', page: '7' })
      const { name, content } = await saveLots(works.quality, 'csv', query)
      const lines = String(content).trim().split('\r\n')
      expect([name, lines.length, lines[0]]).toEqual([
        'lots.csv',
        COUNT + 1,
        'Lot,Length (m),Diameter (µm),Spool or coil',
      ])
      expect([lines[1], lines[1500]]).toEqual(['M-3000,3000,,', 'M-0002,2,254.25,C-118'])
    })

    it('is an Excel file of real numbers and dates', async () => {
      const query = asked({ sort: 'code-up', columns: 'made,length,diameterSpread' })
      const { name, content } = await saveLots(works.quality, 'xlsx', query)
      const [sheet] = await readXlsxFile(Buffer.from(content))
      const rows = sheet?.data ?? []
      expect([name, rows.length]).toEqual(['lots.xlsx', COUNT + 1])
      const [code, made, length, spread] = rows[2] ?? []
      // Two hours after BEGIN, an hour ahead of UTC; the spread is √(4 µm² / 4).
      expect([code, length, spread]).toEqual(['M-0002', 2, 1])
      expect(made).toBeInstanceOf(Date)
      expect(Math.abs(Number(made) - (day(0) + 3 * HOUR))).toBeLessThan(500)
    })

    it('asks the database by the hundreds of lots, not by the lot', async () => {
      const all = await statementsOf(() => saveLots(works.quality, 'csv', asked()))
      expect(all).toBeLessThan(90)
    })
  })
})
