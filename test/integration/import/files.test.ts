import { beforeAll, expect, it } from 'vitest'
import writeXlsxFile from 'write-excel-file/node'
import { database } from '@/lib/data/database'
import { listSetAside } from '@/lib/data/imports'
import { anchorsInDatabase, verifyLedger } from '@/lib/data/verify-ledger'
import { cancelImport } from '@/lib/services/cancel-import'
import { decideImportRows } from '@/lib/services/decide-import-rows'
import { decideLot } from '@/lib/services/decide-lot'
import { getImport, type ImportView } from '@/lib/services/get-import'
import { getLot } from '@/lib/services/get-lot'
import { keepImportOptions } from '@/lib/services/keep-import-options'
import { listImports } from '@/lib/services/list-imports'
import { saveRefusedRows } from '@/lib/services/save-refused-rows'
import { startImport } from '@/lib/services/start-import'
import { csvOf, type FileCells, steelRow } from '../../support/bench-file'
import {
  begin,
  giveUp,
  importFile,
  sendFile,
  setAsideOf,
  withImportThread,
  workAll,
} from '../../support/import-run'
import { refusalOf } from '../../support/refusal-of'
import { seededUniform } from '../../support/seeded-random'
import { day, type SteelWorks, setUpSteelWorks } from '../../support/steel-works'
import { describeOnEachEngine, useFreshDatabase } from '../../support/template-database'

const HOUR = 3_600_000

const rowOf = (lot: string, number: number, change: Partial<FileCells> = {}): FileCells => {
  const madeAt = day(10)
  const row = steelRow({ lot, number, madeAt, measuredAt: madeAt + HOUR, tenths: 2538 + number })
  return Object.fromEntries(Object.entries({ ...row, ...change }).map(([name, cell]) => [name, cell ?? '']))
}

const rowsOf = (lot: string, count = 5): readonly FileCells[] =>
  Array.from({ length: count }, (_, index) => rowOf(lot, index + 1))

const verdict = async () => verifyLedger(database().read, await anchorsInDatabase(database().read))

const counts = ({ alreadyThere, differing, lotsOpened, refused, state, stored }: ImportView) => ({
  state,
  stored,
  lotsOpened,
  alreadyThere,
  differing,
  refused,
})

const nothing = { state: 'done', stored: 0, lotsOpened: 0, alreadyThere: 0, differing: 0, refused: 0 }

const readingsOf = async (lot: string) =>
  (
    await database().read.reading.findMany({
      where: { specimen: { lot: { code: lot } } },
      select: {
        hash: true,
        body: true,
        measuredAt: true,
        rigId: true,
        specimen: { select: { number: true } },
      },
      orderBy: [{ specimen: { number: 'asc' } }, { id: 'asc' }],
    })
  ).map(({ specimen, ...row }) => ({ ...row, number: specimen.number }))

describeOnEachEngine('a file of the bench', () => {
  useFreshDatabase()
  withImportThread()
  let works: SteelWorks
  beforeAll(async () => {
    works = await setUpSteelWorks()
  })

  it('with mark, CRLF, semicolons, decimal commas and line ends in quotes comes in whole', async () => {
    const rows = rowsOf('LA-101').map((row, index) =>
      index === 2 ? { ...row, note: 'second pluck; clearer\nthe first “buzzed”, twice "5"' } : row,
    )
    const style = { mark: true, lineEnd: '\r\n', delimiter: ';', decimalComma: true }
    const view = await importFile(works.bench, csvOf(rows, style), 'LA 101.csv')
    expect(counts(view)).toEqual({ ...nothing, stored: 5, lotsOpened: 1 })
    const plain = await importFile(works.bench, csvOf(rows))
    expect(counts(plain)).toEqual({ ...nothing, alreadyThere: 5 })
    expect(JSON.parse((await readingsOf('LA-101'))[2]?.body ?? '').values.note).toBe(
      'second pluck; clearer\nthe first “buzzed”, twice "5"',
    )
    expect(view.options).toContain('"decimal":"comma"')
  })

  it('with a needed column missing is refused before it begins', async () => {
    const rows = rowsOf('LA-102').map(({ specimen: _, ...row }) => row)
    const view = await sendFile(works.bench, csvOf(rows))
    expect(view.preview?.problems.map(({ message }) => message)).toEqual([
      'No column is read as specimen: it is missing from the file.',
    ])
    expect(await refusalOf(begin(works.bench, view))).toMatchObject({ code: 'bad-input', where: 'specimen' })
    await workAll()
    expect(await getImport(works.bench, view.id)).toMatchObject({ state: 'draft', stored: 0 })
  })

  it.each([
    'constructor',
    'toString',
    '__proto__',
    'hasOwnProperty_mm',
    'constructor_mm',
    'cut_mass_valueOf',
  ])('may have a column called %s: it is a note like any other', async (header) => {
    const text = `${csvOf([rowOf('LA-103', 1)])
      .replace('note\n', `${header}\n`)
      .trimEnd()}x\n`
    const view = await sendFile(works.bench, text)
    expect(view.preview?.problems).toEqual([])
    await begin(works.bench, view)
  })

  it('of more columns than anybody measures is refused with a sentence', async () => {
    const view = await sendFile(
      works.bench,
      `${Array.from({ length: 3000 }, (_, n) => `x${n}`).join(',')}\n1\n`,
    )
    expect(view.preview?.problems.map(({ message }) => message)).toEqual([
      'The first line has 3000 cells, and 200 columns is the most.',
    ])
  })

  it('that is empty, UTF-16 or an old spreadsheet is refused on arrival', async () => {
    for (const [bytes, sentence] of [
      [Buffer.alloc(0), 'The file is empty.'],
      [Buffer.from('\uFEFFlot,specimen\n', 'utf16le'), 'The file is written in UTF-16.'],
      [Buffer.from([0xd0, 0xcf, 0x11, 0xe0]), 'This is a spreadsheet of the old kind (.xls).'],
    ] as const)
      expect(await refusalOf(sendFile(works.bench, bytes))).toMatchObject({ message: sentence })
  })
})

const decisionOn = (lotVersion: number, verb: 'release' | 'scrap') => ({
  verb,
  reason: 'Seen beside the bench book.',
  lotVersion,
  answers: [],
})

/** Each row that can’t be taken: the change, the column named, the value, a part of the sentence. */
const bad: readonly (readonly [Partial<FileCells>, string, string | undefined, RegExp])[] = [
  [{ d1a_mm: 'thin' }, 'd1a_mm', 'thin', /thin/],
  [{ cut_mass_mg: '-199.1' }, 'cut_mass_mg', '-199.1', /mass/i],
  [{ lot: 'LA-NOWHERE', product: '' }, 'lot', 'LA-NOWHERE', /no lot LA-NOWHERE/],
  [{ measured_at: '2026-03-29T02:30' }, 'measured_at', '2026-03-29T02:30', /never was in Europe\/Oslo/],
  [{ measured_at: '2026-10-25T02:30' }, 'measured_at', '2026-10-25T02:30', /was twice in Europe\/Oslo/],
  [{ note: 'a\u0007b' }, 'note', 'a\uFFFDb', /can’t be shown/],
  [{ machine: 'DM-99' }, 'machine', 'DM-99', /no machine “DM-99”/],
  [{ weights: 'H-01 W-77' }, 'weights', 'H-01 W-77', /no weight W-77/],
  [{ measurer: 'Nemo' }, 'measurer', 'Nemo', /nobody called “Nemo”/],
  [{ measured_at: '2199-01-01T08:00Z' }, 'measured_at', '2199-01-01T08:00Z', /future/],
  [{ specimen: '0' }, 'specimen', '0', /whole number/],
  [{ product: 'Larch 999' }, 'product', 'Larch 999', /Larch 254.*Larch 999/],
  [{ made_at: '2026-01-02T08:00Z' }, 'made_at', '2026-01-02T08:00Z', /was made at/],
  [{ specimen: '1' }, 'specimen', '1', /stands on line 2 already/],
]

const wide = { weights: '', measurer: '', colour: '' }

/** Random bytes, with line ends and without, with quotes, between two line ends. */
function noise(size: number): Buffer {
  const random = seededUniform(20_261_204)
  const bytes = Buffer.from(Array.from({ length: size }, () => Math.floor(random() * 256)))
  // The second third is one line without an end.
  const [from, to] = [Math.floor(size / 3), Math.floor((2 * size) / 3)]
  for (let at = from; at < to; at += 1) if (bytes[at] === 10 || bytes[at] === 13) bytes[at] = 34
  return Buffer.concat([bytes, Buffer.from('"\n')])
}

describeOnEachEngine('a file with rows that can’t be taken', () => {
  useFreshDatabase()
  withImportThread()
  let works: SteelWorks
  let view: ImportView
  let file: Buffer
  const good = [...rowsOf('LA-201', 5), ...rowsOf('LA-202', 5)].map((row) => ({ ...row, ...wide }))
  const faulty = bad.map(([change], index) => ({ ...rowOf('LA-201', 20 + index), ...wide, ...change }))
  beforeAll(async () => {
    works = await setUpSteelWorks()
    const last = rowsOf('LA-203', 5).map((row) => ({ ...row, ...wide, note: 'quoted, and\nin two lines' }))
    file = Buffer.concat([
      Buffer.from(csvOf([...good, ...faulty])),
      noise(1_000_000),
      Buffer.from(csvOf(last).split('\n').slice(1).join('\n')),
    ])
    view = await importFile(works.bench, file)
  }, 120_000)

  it('stores the rows before and after them, down to the last', async () => {
    expect(counts(view)).toMatchObject({
      state: 'done',
      stored: 15,
      lotsOpened: 3,
      differing: 0,
      alreadyThere: 0,
    })
    expect(view.refused).toBeGreaterThan(1000)
    expect(view.rowsDone).toBe(view.stored + view.refused)
    for (const lot of ['LA-201', 'LA-202', 'LA-203'])
      expect((await readingsOf(lot)).map(({ number }) => number)).toEqual([1, 2, 3, 4, 5])
    expect(await verdict()).toMatchObject({ sound: true })
  })

  it('says of each its line, column, value, what is wrong and how to mend it', async () => {
    const rows = await setAsideOf(view.id)
    for (const [index, [, column, value, sentence]] of bad.entries()) {
      const row = rows[index]
      expect(row?.line, column).toBe(12 + index)
      const [problem] = row?.problems ?? []
      expect(problem, column).toMatchObject({
        where: column,
        message: expect.stringMatching(sentence),
        mend: expect.stringMatching(/\.$/),
        details: { value },
      })
    }
    for (const row of rows)
      for (const { mend, message } of row.problems) {
        expect(message).toMatch(/\.$/)
        expect(mend).toMatch(/\.$/)
      }
  })

  it('gives them as a file that, mended and sent again, brings exactly what was missing', async () => {
    const saved = await saveRefusedRows(works.bench, view.id)
    expect(saved.name).toBe('bench refused rows.csv')
    const again = await importFile(works.bench, saved.content)
    // The number that stood twice in the first file stands once in this one: now it differs from what is stored.
    expect(counts(again)).toMatchObject({
      stored: 0,
      alreadyThere: 0,
      differing: 1,
      refused: view.refused - 1,
    })

    const lines = saved.content.split('\r\n')
    expect(lines[0]?.endsWith(',refused_because')).toBe(true)
    const mended = faulty.map((_, index) => ({
      ...rowOf('LA-201', 20 + index),
      ...wide,
      refused_because: 'mended',
    }))
    expect(lines[0]).toBe(`\uFEFF${Object.keys(mended[0] ?? {}).join(',')}`)
    const next = await importFile(works.bench, csvOf(mended), saved.name)
    expect(counts(next)).toEqual({ ...nothing, stored: bad.length })
    expect(counts(await importFile(works.bench, csvOf(mended), saved.name))).toEqual({
      ...nothing,
      alreadyThere: bad.length,
    })
    expect((await readingsOf('LA-201')).map(({ number }) => number)).toEqual([
      1,
      2,
      3,
      4,
      5,
      ...bad.map((_, index) => 20 + index),
    ])
  })

  it('sent again whole finds everything that is in already there, and says it was sent before', async () => {
    const again = await importFile(works.bench, file)
    expect(counts(again)).toMatchObject({ stored: 0, lotsOpened: 0, alreadyThere: 15, refused: view.refused })
    expect(again.earlier.map(({ id }) => id)).toContain(view.id)
    expect(await verdict()).toMatchObject({ sound: true })
  })

  it('keeps cells beyond the last header in the file of refused rows', async () => {
    const text = `${csvOf([rowOf('LA-204', 1)]).trimEnd()},and,more\n`
    const refused = await importFile(works.bench, text)
    expect(refused.refusedRows[0]?.problems[0]?.message).toBe('The row has 20 cells and the header 18.')
    const { content } = await saveRefusedRows(works.bench, refused.id)
    expect(content.split('\r\n')[1]?.endsWith(',and,more')).toBe(true)
    expect(counts(await importFile(works.bench, content))).toMatchObject({ stored: 0, refused: 1 })
  })
})

describeOnEachEngine('rows that differ from what is stored', () => {
  useFreshDatabase()
  withImportThread()
  let works: SteelWorks
  let view: ImportView
  const changed = [
    { cut_mass_mg: '205.00' },
    { cut_mass_mg: '206.00', frequency_hz: '340.00' },
    { d1a_mm: '0.2600' },
  ] as const
  beforeAll(async () => {
    works = await setUpSteelWorks()
    await importFile(works.bench, csvOf(rowsOf('LA-301')))
    const { lot } = await getLot(works.quality, 'LA-301')
    await decideLot(works.quality, 'LA-301', decisionOn(lot.version, 'release'))
    const rows = rowsOf('LA-301').map((row, index) => ({ ...row, ...changed[index] }))
    view = await importFile(works.bench, csvOf(rows))
  }, 60_000)

  it('are told apart from those already there, with both values', () => {
    expect(counts(view)).toEqual({ ...nothing, alreadyThere: 2, differing: 3 })
    expect(view.openDifferences).toBe(3)
    expect(view.differingRows.map(({ line, specimen }) => [line, specimen])).toEqual([
      [2, 1],
      [3, 2],
      [4, 3],
    ])
    expect(view.differingRows[0]?.problems[0]).toMatchObject({
      code: 'conflict',
      details: { 'cutMass.entered': '205.00 mg' },
    })
  })

  it('are chosen by quality only, of this import only, with a reason', async () => {
    const [first] = view.differingRows
    const choice = { rowIds: [first?.id ?? 0], choice: 'took-file' as const, reason: 'The file is right.' }
    expect(await refusalOf(decideImportRows(works.bench, view.id, choice))).toMatchObject({
      code: 'not-permitted',
    })
    expect(await refusalOf(decideImportRows(works.quality, view.id - 1, choice))).toMatchObject({
      code: 'not-found',
    })
    expect(await getImport(works.quality, view.id)).toMatchObject({ openDifferences: 3 })
  })

  it('kept as stored change nothing but the row', async () => {
    const before = await readingsOf('LA-301')
    const [first] = view.differingRows
    const choice = {
      rowIds: [first?.id ?? 0],
      choice: 'kept-stored' as const,
      reason: 'Misread from the page.',
    }
    expect(await decideImportRows(works.quality, view.id, choice)).toEqual({ rows: 1, corrected: 0 })
    expect(await readingsOf('LA-301')).toEqual(before)
    expect(await refusalOf(decideImportRows(works.quality, view.id, choice))).toMatchObject({
      code: 'conflict',
    })
    expect((await getImport(works.quality, view.id)).differingRows[0]).toMatchObject({
      state: 'kept-stored',
      reason: 'Misread from the page.',
      decidedBy: 'M. Orrin',
    })
  })

  it('taken from the file supersede what is stored, keep it readable, and stand in the ledger', async () => {
    const before = await readingsOf('LA-301')
    const rowIds = view.differingRows.slice(1).map(({ id }) => id)
    const reason = 'Read again from the bench book.'
    expect(await decideImportRows(works.quality, view.id, { rowIds, choice: 'took-file', reason })).toEqual({
      rows: 2,
      corrected: 2,
    })
    const after = await readingsOf('LA-301')
    expect(after.length).toBe(before.length + 2)
    for (const reading of before) expect(after).toContainEqual(reading)
    const newer = await database().read.reading.findMany({
      where: { supersedesId: { not: null } },
      select: { reason: true, kind: true },
      orderBy: { id: 'asc' },
    })
    expect(newer).toEqual([
      { kind: 'sheet', reason },
      { kind: 'section', reason },
    ])
    const verbs = await database().read.ledgerEntry.findMany({
      where: { verb: { in: ['supersede-reading', 'import-row-took-file', 'import-row-kept-stored'] } },
      select: { verb: true },
      orderBy: { sequence: 'asc' },
    })
    expect(verbs.map(({ verb }) => verb)).toEqual([
      'import-row-kept-stored',
      'supersede-reading',
      'import-row-took-file',
      'supersede-reading',
      'import-row-took-file',
    ])
    expect(await verdict()).toMatchObject({ sound: true })
    const { dispositions, lot } = await getLot(works.quality, 'LA-301')
    expect(lot.evidenceChanged).toBe(true)
    expect(dispositions.map((one) => one.evidenceChanged)).toEqual([true])
    // The same file again differs in the row whose stored value was kept, and in no other.
    const rows = rowsOf('LA-301').map((row, index) => ({ ...row, ...changed[index] }))
    expect(counts(await importFile(works.bench, csvOf(rows)))).toEqual({
      ...nothing,
      alreadyThere: 4,
      differing: 1,
    })
  })
})

describeOnEachEngine('who may, and when it ends', () => {
  useFreshDatabase()
  withImportThread()
  let works: SteelWorks
  beforeAll(async () => {
    works = await setUpSteelWorks()
    await importFile(works.bench, csvOf(rowsOf('LA-401')))
  })

  it('lets bench and quality, not sales; the administrator looks on', async () => {
    const text = csvOf(rowsOf('LA-402'))
    expect(await refusalOf(sendFile(works.sales, text))).toMatchObject({ code: 'not-permitted' })
    expect(await refusalOf(sendFile(works.administrator, text))).toMatchObject({ code: 'not-permitted' })
    expect(await refusalOf(listImports(works.sales))).toMatchObject({ code: 'not-permitted' })
    expect(await refusalOf(listImports(undefined))).toMatchObject({ code: 'not-signed-in' })
    const view = await sendFile(works.bench, text)
    expect(await refusalOf(begin(works.sales, view))).toMatchObject({ code: 'not-permitted' })
    expect(await refusalOf(cancelImport(works.sales, view.id))).toMatchObject({ code: 'not-permitted' })
    expect(await refusalOf(saveRefusedRows(works.sales, view.id))).toMatchObject({ code: 'not-permitted' })
    expect(await getImport(works.administrator, view.id)).toMatchObject({ mayRun: false, mayChoose: false })
  })

  it('begins a file once, as it stood on the screen', async () => {
    const view = await sendFile(works.bench, csvOf(rowsOf('LA-402')))
    await begin(works.bench, view)
    expect(await refusalOf(begin(works.quality, view))).toMatchObject({ code: 'conflict' })
    await workAll()
  })

  it('refuses rows of the bench for a decided lot, and takes those of quality, marking the decision', async () => {
    const { lot } = await getLot(works.quality, 'LA-401')
    await decideLot(works.quality, 'LA-401', decisionOn(lot.version, 'scrap'))
    const more = csvOf([rowOf('LA-401', 1), rowOf('LA-401', 6), rowOf('LA-401', 7)])
    const bench = await importFile(works.bench, more)
    expect(counts(bench)).toEqual({ ...nothing, alreadyThere: 1, refused: 2 })
    expect(bench.refusedRows[0]?.problems[0]?.message).toBe(
      'Lot LA-401 is decided: only quality adds readings to it.',
    )
    expect(counts(await importFile(works.quality, more))).toEqual({ ...nothing, alreadyThere: 1, stored: 2 })
    expect((await getLot(works.quality, 'LA-401')).lot.evidenceChanged).toBe(true)
  })

  it('ended by hand keeps what is in, says how many, and the same file brings the rest', async () => {
    const text = csvOf(
      Array.from({ length: 130 }, (_, n) => rowsOf(`LA-5${String(n).padStart(2, '0')}`)).flat(),
    )
    const view = await sendFile(works.bench, text)
    await begin(works.bench, view)
    let asked = false
    await workAll({
      progress: () => {
        if (!asked) void cancelImport(works.bench, view.id)
        asked = true
      },
    })
    const ended = await getImport(works.bench, view.id)
    expect(ended.state).toBe('cancelled')
    expect(ended.stored).toBeGreaterThanOrEqual(200)
    expect(ended.stored).toBeLessThan(650)
    expect(await database().read.specimen.count({ where: { lot: { code: { startsWith: 'LA-5' } } } })).toBe(
      ended.stored,
    )
    expect(await refusalOf(cancelImport(works.bench, view.id))).toMatchObject({ code: 'conflict' })
    const rest = await importFile(works.bench, text)
    expect(counts(rest)).toMatchObject({ stored: 650 - ended.stored, alreadyThere: ended.stored })
    expect(await verdict()).toMatchObject({ sound: true })
  }, 120_000)

  it('put away while it waits is not begun, not even by a thread that has seen it waiting', async () => {
    const view = await sendFile(works.bench, csvOf(rowsOf('LA-450')))
    await begin(works.bench, view)
    const { read } = database()
    // The thread asks what waits; before it begins, somebody puts it away.
    const late = new Proxy(read, {
      get: (target, name) =>
        name === 'import'
          ? {
              ...target.import,
              findFirst: async (query: never) => {
                const found = await target.import.findFirst(query)
                if (found) await cancelImport(works.bench, view.id).catch(() => undefined)
                return found
              },
            }
          : Reflect.get(target, name),
    })
    await workAll({ read: late })
    expect(await getImport(works.bench, view.id)).toMatchObject({
      state: 'cancelled',
      stored: 0,
      rowsDone: 0,
    })
  })

  it('that ends its thread over and over is given up, what is in is kept, and the next one goes on', async () => {
    const rows = Array.from({ length: 90 }, (_, n) => rowsOf(`LA-7${String(n).padStart(2, '0')}`)).flat()
    const view = await sendFile(works.bench, csvOf(rows))
    expect(await giveUp()).toBe(false)
    await begin(works.bench, view)
    let batches = 0
    const stopAsked = () => {
      batches += 1
      return batches > 2
    }
    // A server that ends after two batches leaves it under way.
    await workAll({ stopAsked, once: true })
    expect(await getImport(works.bench, view.id)).toMatchObject({ state: 'running' })
    const other = await sendFile(works.bench, csvOf(rowsOf('LA-470')))
    await begin(works.bench, other)
    expect(await giveUp()).toBe(true)
    const { message, state, stored } = await getImport(works.bench, view.id)
    expect({ state, message }).toMatchObject({ state: 'failed', message: expect.stringMatching(/kept/) })
    await workAll()
    expect(counts(await getImport(works.bench, other.id))).toEqual({ ...nothing, stored: 5, lotsOpened: 1 })
    expect(counts(await importFile(works.bench, csvOf(rows)))).toMatchObject({
      stored: 450 - stored,
      alreadyThere: stored,
    })
    expect(await verdict()).toMatchObject({ sound: true })
  })

  it('whose file is gone fails with a sentence, and the next one goes on', async () => {
    const view = await sendFile(works.bench, csvOf(rowsOf('LA-460')))
    await begin(works.bench, view)
    const other = await sendFile(works.bench, csvOf(rowsOf('LA-461')))
    await begin(works.bench, other)
    await workAll({ dataDir: '/nowhere/at/all' })
    for (const { id } of [view, other])
      expect(await getImport(works.bench, id)).toMatchObject({
        state: 'failed',
        message: 'The file is no longer in the data folder. Send it again.',
      })
    expect(await verdict()).toMatchObject({ sound: true })
  })
})

describeOnEachEngine('columns of another name, and spreadsheets', () => {
  useFreshDatabase()
  withImportThread()
  let works: SteelWorks
  beforeAll(async () => {
    works = await setUpSteelWorks()
  })

  const foreign = (lot: string) =>
    rowsOf(lot).map(({ lot: code = '', specimen = '', machine = '', ...row }) => ({
      Los: code,
      'Probe Nr.': specimen,
      Maschine: machine,
      ...row,
    }))
  const columns = { Los: 'lot', 'Probe Nr.': 'specimen', Maschine: 'machine' }

  it('are kept under a name and proposed for the next file with such headers', async () => {
    const first = await sendFile(works.bench, csvOf(foreign('LA-601')))
    expect(first.preview?.options.columns).toMatchObject({ Los: 'as-note', 'Probe Nr.': 'as-note' })
    await begin(works.bench, first, { columns, keepAs: 'old bench' })
    await workAll()
    expect(counts(await getImport(works.bench, first.id))).toEqual({ ...nothing, stored: 5, lotsOpened: 1 })
    const second = await sendFile(works.bench, csvOf(foreign('LA-602')))
    expect(second.preview?.options.columns).toMatchObject(columns)
    expect(second.preview?.mappings).toEqual(['old bench'])
    await begin(works.bench, second)
    await workAll()
    expect(counts(await getImport(works.bench, second.id))).toEqual({ ...nothing, stored: 5, lotsOpened: 1 })
  })

  it('are named in refusals as the file names them', async () => {
    const rows = foreign('LA-603').map((row) => ({ ...row, Maschine: 'DM-99' }))
    const view = await importFile(works.bench, csvOf(rows))
    expect(view.refusedRows[0]?.problems[0]).toMatchObject({ where: 'Maschine', details: { value: 'DM-99' } })
  })

  it('are taken from a kept mapping on asking, the others left as they are', async () => {
    const rows = foreign('LA-604').map(({ Maschine: _, ...row }) => ({ ...row, Sonst: 'x' }))
    const view = await sendFile(works.bench, csvOf(rows))
    const { options } = view.preview ?? {}
    if (!options) throw new Error('no preview')
    const unset = { ...options, columns: { ...options.columns, Los: 'as-note', Sonst: 'leave-out' } }
    await keepImportOptions(works.bench, view.id, {
      options: unset,
      version: view.version,
      mapping: 'old bench',
    })
    const after = await getImport(works.bench, view.id)
    expect(after.preview?.options.columns).toMatchObject({ Los: 'lot', Sonst: 'leave-out' })
    expect(
      await refusalOf(
        startImport(works.bench, view.id, { options: unset, version: view.version, keepAs: '' }),
      ),
    ).toMatchObject({ code: 'bad-input' })
  })

  it('an XLSX file of the same cells gives the same readings, hash by hash', async () => {
    const rows = rowsOf('LA-701')
    const csv = await importFile(works.bench, csvOf(rows))
    expect(csv.stored).toBe(5)
    const headers = Object.keys(rows[0] ?? {})
    const texts = rows.map((row) => headers.map((header) => ({ value: row[header] ?? '', type: String })))
    const same = await importFile(
      works.bench,
      await writeXlsxFile([headers.map((value) => ({ value })), ...texts]).toBuffer(),
      'LA 701.xlsx',
    )
    expect(counts(same)).toEqual({ ...nothing, alreadyThere: 5 })
    expect(same.format).toBe('xlsx')
  })

  it('numbers and dates typed into a spreadsheet are read as the values they are', async () => {
    const rows = rowsOf('LA-702')
    await importFile(works.bench, csvOf(rows))
    const headers = Object.keys(rows[0] ?? {})
    // The works' clocks are an hour ahead of UTC in January; a sheet's dates have no zone.
    const cellOf = (header: string, text: string) =>
      /_at$/.test(header) && header !== 'taken_at'
        ? { value: new Date(Date.parse(text) + HOUR), type: Date, format: 'yyyy-mm-dd hh:mm' }
        : /_mm$|_mg$|_hz$|^specimen$/.test(header)
          ? { value: Number(text), type: Number }
          : { value: text, type: String }
    const sheet = rows.map((row) => headers.map((header) => cellOf(header, row[header] ?? '')))
    const view = await importFile(
      works.bench,
      await writeXlsxFile([headers.map((value) => ({ value })), ...sheet]).toBuffer(),
      'LA 702.xlsx',
    )
    expect(counts(view)).toEqual({ ...nothing, alreadyThere: 5 })
  })

  it('a text named .xlsx and a spreadsheet that says it unpacks to 2 GB are refused', async () => {
    expect(await refusalOf(sendFile(works.bench, csvOf(rowsOf('LA-703')), 'LA.xlsx'))).toMatchObject({
      code: 'bad-input',
      message: 'The file is named like a spreadsheet and holds none.',
    })
    const sheet = await writeXlsxFile([[{ value: 'lot' }]]).toBuffer()
    const bomb = Buffer.from(sheet)
    bomb.writeUInt32LE(2_000_000_000, bomb.indexOf(Buffer.from([0x50, 0x4b, 0x01, 0x02])) + 24)
    expect(await refusalOf(sendFile(works.bench, bomb, 'big.xlsx'))).toMatchObject({
      message: expect.stringMatching(
        /^This spreadsheet would unpack to 2\d{3} MB, and 300 MB is the most\.$/,
      ),
    })
    expect(await listSetAside(database().read, 999, 'refused', { take: 1 })).toEqual([])
  })
})
