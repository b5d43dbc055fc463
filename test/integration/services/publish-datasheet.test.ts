import { randomUUID } from 'node:crypto'
import { beforeAll, describe, expect, it } from 'vitest'
import { database } from '@/lib/data/database'
import { sha256 } from '@/lib/data/hash'
import { chartFileSchema } from '@/lib/input/chart-file'
import { publishDatasheetSchema } from '@/lib/input/datasheet'
import { decideLot } from '@/lib/services/decide-lot'
import { getDatasheet } from '@/lib/services/get-datasheet'
import { publishDatasheet } from '@/lib/services/publish-datasheet'
import { recordSpecimens } from '@/lib/services/record-specimens'
import { saveDatasheet } from '@/lib/services/save-datasheet'
import { saveDriftChart } from '@/lib/services/save-drift-chart'
import { supersedeReading } from '@/lib/services/supersede-reading'
import { pdfText } from '../../support/pdf-text'
import { plainTension, readPrintedSheet, stretchedTension } from '../../support/printed-table'
import { refusalOf } from '../../support/refusal-of'
import { steelSheet, typedMass } from '../../support/sheets'
import { calmTenths, measureLots } from '../../support/steel-lots'
import {
  day,
  openSteelLot,
  requestOf,
  type SteelWorks,
  setUpSteelWorks,
  thick,
} from '../../support/steel-works'
import { describeOnEachEngine, useFreshDatabase } from '../../support/template-database'

const asking = (change: Readonly<Record<string, unknown>> = {}) =>
  publishDatasheetSchema.parse({
    productCode: 'L254',
    notes: 'D4–F#4 Bb3',
    lengths: '610 648 25.5 in',
    a4: '442',
    basis: 'unloaded-mass',
    forceUnit: 'N',
    supersedes: 0,
    ...change,
  })

const textOf = async (content: string | Uint8Array): Promise<string> =>
  typeof content === 'string' ? content : pdfText(content)

describeOnEachEngine('datasheets', () => {
  useFreshDatabase()
  let works: SteelWorks
  beforeAll(async () => {
    works = await setUpSteelWorks()
    await measureLots(works, calmTenths(6))
  })

  it('are not built before a lot is released', async () => {
    expect(await refusalOf(publishDatasheet(works.sales, asking()))).toMatchObject({ code: 'not-ready' })
  })

  describe('once lots are released', () => {
    beforeAll(async () => {
      for (const number of [1, 2, 3, 4])
        await decideLot(works.quality, `L-${number}`, {
          verb: 'release',
          reason: 'Inside tolerance, routes closed.',
          lotVersion: 2,
          answers: [],
        })
    })

    it('are published as a numbered, hashed revision that rests on the released lots alone', async () => {
      expect(await publishDatasheet(works.sales, asking(), day(40))).toMatchObject({
        datasheetCode: 'DS-0001',
        number: 1,
      })
      const view = await getDatasheet(works.sales, 'DS-0001')
      expect(view.body.lots.map((lot) => lot.code)).toEqual(['L-1', 'L-2', 'L-3', 'L-4'])
      const row = await database().read.datasheetRevision.findFirst({ where: { number: 1 } })
      expect(row?.hash).toBe(sha256(row?.body ?? ''))
      expect(view).toMatchObject({ publishedBy: 'J. Pell', publishedAt: day(40), hash: row?.hash })
    })

    it('are refused to those who may not publish, and over a revision that was not seen', async () => {
      expect(await refusalOf(publishDatasheet(works.bench, asking({ supersedes: 1 })))).toMatchObject({
        code: 'not-permitted',
      })
      expect(await refusalOf(publishDatasheet(works.sales, asking()))).toMatchObject({
        code: 'conflict',
        where: 'supersedes',
      })
    })

    it('print tensions that obey the printed law of the unloaded mass with its stretch', async () => {
      const { content, type } = await saveDatasheet(works.sales, 'DS-0001', 1, 'pdf')
      expect(type).toBe('application/pdf')
      const sheet = readPrintedSheet(await textOf(content))
      expect(sheet.basis).toBe('unloaded mass, stretch solved')
      expect(sheet.cells.map(({ note }) => note)).toEqual(expect.arrayContaining(['D4', 'F♯4', 'A♯3']))
      expect(sheet.cells.length).toBeGreaterThanOrEqual(12)
      for (const { frequency, length, tension } of sheet.cells) {
        const reckoned = stretchedTension(
          plainTension(sheet.massPerMetre, frequency, length),
          sheet.axialStiffness ?? Number.NaN,
        )
        // Print rounds mass per metre to 0.1 mg/m, frequency to 0.01 Hz, length to 0.1 mm, tension to 0.1 N.
        expect(Math.abs(tension - reckoned)).toBeLessThan(0.05 + reckoned * (1.3e-4 + 8e-5 + 2e-4))
      }
      // The plain formula would be half a newton off where tension is high: the test knows one basis from the other.
      const off = sheet.cells.map(
        ({ frequency, length, tension }) => plainTension(sheet.massPerMetre, frequency, length) - tension,
      )
      expect(Math.max(...off)).toBeGreaterThan(0.4)
    })

    it('print every sign of the trade so that it can be read and copied', async () => {
      const text = (await textOf((await saveDatasheet(works.sales, 'DS-0001', 1, 'pdf')).content)).replace(
        /\s+/g,
        ' ',
      )
      expect(text).toMatch(/[µμ]/u)
      for (const sign of ['√', '₀', '²', '³', '°', '±', '−', '♯', '’'])
        expect(text.includes(sign), sign).toBe(true)
      for (const caution of (await getDatasheet(works.sales, 'DS-0001')).body.cautions)
        expect(text).toContain(caution.slice(0, 60))
    })

    it('give the same bytes every time', async () => {
      const [first, second] = [
        await saveDatasheet(works.sales, 'DS-0001', 1, 'pdf'),
        await saveDatasheet(works.sales, 'DS-0001', 1, 'pdf'),
      ]
      expect(Buffer.compare(Buffer.from(first.content), Buffer.from(second.content))).toBe(0)
    })

    it('give a table in which each row obeys the plain formula, when that is its basis', async () => {
      await publishDatasheet(works.sales, asking({ basis: 'plain-formula', supersedes: 1 }), day(41))
      const { content } = await saveDatasheet(works.sales, 'DS-0001', 2, 'csv')
      const [head = [], ...rows] = String(content)
        .replace('\uFEFF', '')
        .trim()
        .split('\r\n')
        .map((line) => line.split(/,(?=(?:[^"]*"[^"]*")*[^"]*$)/))
      const value = (row: readonly string[], column: string): number => Number(row[head.indexOf(column)])
      expect(rows.length).toBe(18)
      for (const row of rows) {
        if (row[head.indexOf('tension_n')] === '') continue
        const law = plainTension(
          value(row, 'mass_per_metre_kg_per_m'),
          value(row, 'frequency_hz'),
          value(row, 'length_m'),
        )
        expect(value(row, 'tension_n') / law).toBeCloseTo(1, 12)
        expect(Math.abs(value(row, 'tension_shown') - law)).toBeLessThan(0.0501)
      }
    })

    it('stay as they were sent when a later revision or a correction comes', async () => {
      const before = await saveDatasheet(works.sales, 'DS-0001', 1, 'pdf')
      const [specimen] = await database().read.specimen.findMany({
        where: { lot: { code: 'L-1' } },
        include: { readings: true },
      })
      const reading = specimen?.readings[0]
      if (!specimen || !reading) throw new Error('no reading')
      await supersedeReading(works.quality, {
        requestId: randomUUID(),
        supersedes: reading.clientId,
        reading: {
          clientId: randomUUID(),
          kind: 'weighing',
          sheet: { cutMass: typedMass('199.0'), cutLength: steelSheet().cutLength },
          equipment: { balance: 'B-03', rule: 'R-01' },
        },
        reason: 'Weighed with the hook on.',
      })
      expect((await getDatasheet(works.sales, 'DS-0001', 1)).evidenceChanged).toBe(true)
      const after = await saveDatasheet(works.sales, 'DS-0001', 1, 'pdf')
      expect(Buffer.compare(Buffer.from(before.content), Buffer.from(after.content))).toBe(0)
    })
  })
})

describeOnEachEngine('the staff chart as a file', () => {
  useFreshDatabase()
  let works: SteelWorks
  beforeAll(async () => {
    works = await setUpSteelWorks()
    await measureLots(works, calmTenths(22))
    await openSteelLot(works.bench, 'EMPTY-1', 40)
    await recordSpecimens(works.bench, requestOf('EMPTY-1', [thick('0.2541')]), day(40) + 7_200_000)
  })
  const options = (change: Readonly<Record<string, string>> = {}) => chartFileSchema.parse(change)

  it('has one note a lot and stave between the lots asked for, in drawing and data alike', async () => {
    const asked = options({ from: 'L-3', to: 'L-12', staves: 'diameter,closure' })
    const { content, name } = await saveDriftChart(works.quality, 'L254', 'svg', asked)
    expect(name).toBe('L254 L-3 to L-12.svg')
    expect(String(content).match(/data-mark="note"/g)).toHaveLength(20)
    const csv = String((await saveDriftChart(works.quality, 'L254', 'csv', asked)).content)
    expect(
      csv
        .trim()
        .split('\r\n')
        .slice(1)
        .map((line) => line.split(',')[0]),
    ).toEqual(Array.from({ length: 10 }, (_, index) => `L-${index + 3}`))
  })

  it('is a picture of the drawing, two pixels a px', async () => {
    const { content } = await saveDriftChart(works.quality, 'L254', 'png', options({ width: '800' }))
    const bytes = Buffer.from(content)
    expect(bytes.subarray(1, 4).toString()).toBe('PNG')
    expect(bytes.readUInt32BE(16)).toBe(1600)
  })

  it('refuses lots that are not on the chart, ends the wrong way round, and people without the right', async () => {
    expect(
      await refusalOf(saveDriftChart(works.quality, 'L254', 'svg', options({ from: 'X-1' }))),
    ).toMatchObject({ code: 'not-found', where: 'from' })
    expect(
      await refusalOf(saveDriftChart(works.quality, 'L254', 'svg', options({ from: 'L-9', to: 'L-2' }))),
    ).toMatchObject({ code: 'bad-input', where: 'from' })
    expect(await refusalOf(saveDriftChart(undefined, 'L254', 'svg', options()))).toMatchObject({
      code: 'not-signed-in',
    })
  })
})
