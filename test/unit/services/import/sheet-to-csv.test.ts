import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import writeXlsxFile from 'write-excel-file/node'
import { sheetToCsv, unpackedSize } from '@/lib/services/import/sheet-to-csv'

let folder: string
beforeAll(() => {
  folder = mkdtempSync(join(tmpdir(), 'ledgerline-sheet-'))
})
afterAll(() => rmSync(folder, { recursive: true }))

const put = (content: Buffer | string): string => {
  const path = join(folder, 'sheet.xlsx')
  writeFileSync(path, content)
  return path
}

type Cell = { readonly value: string | number | boolean | Date; readonly format?: string } | null

const bookOf = (rows: readonly (readonly Cell[])[]): Promise<Buffer> =>
  writeXlsxFile(rows.map((row) => [...row])).toBuffer()

async function csvOfSheet(rows: readonly (readonly Cell[])[]): Promise<string> {
  const to = join(folder, 'sheet.csv')
  expect(await sheetToCsv(put(await bookOf(rows)), to)).toEqual({ ok: true })
  return readFileSync(to, 'utf8')
}

describe('sheetToCsv', () => {
  it('quotes what needs it, leaves empty cells empty', async () => {
    expect(
      await csvOfSheet([
        [{ value: 'lot' }, { value: 'note' }, { value: 'x' }],
        [{ value: 'LA-1' }, null, { value: 'a, "b"\nc' }],
      ]),
    ).toBe('lot,note,x\r\nLA-1,,"a, ""b""\nc"\r\n')
  })

  it.each([
    [0.254, '0.254'],
    [500, '500'],
    [-0.1, '-0.1'],
    [1e-7, '0.0000001'],
    [2.5e21, '2500000000000000000000'],
    [12345678.9, '12345678.9'],
  ])('writes the number %d as %s, without an exponent', async (value, text) => {
    expect(await csvOfSheet([[{ value }]])).toBe(`${text}\r\n`)
  })

  it('writes a date as wall time without a zone, and truth values as words', async () => {
    const value = new Date(Date.UTC(2026, 10, 25, 14, 20, 30))
    expect(await csvOfSheet([[{ value, format: 'yyyy-mm-dd hh:mm:ss' }, { value: true }]])).toBe(
      '2026-11-25T14:20:30.000,true\r\n',
    )
  })

  it('refuses with a sentence what is no spreadsheet, cut off, or too large when unpacked', async () => {
    const to = join(folder, 'none.csv')
    const book = await bookOf([[{ value: 'lot' }]])
    const bomb = Buffer.from(book)
    bomb.writeUInt32LE(0xffff_ffff, bomb.indexOf(Buffer.from([0x50, 0x4b, 0x01, 0x02])) + 24)
    const damaged = Buffer.from(book)
    const sheet = 'xl/worksheets/sheet1.xml'
    damaged.fill(0x5a, damaged.indexOf(sheet) + sheet.length + 20, damaged.indexOf(sheet) + sheet.length + 80)
    for (const [content, sentence] of [
      [Buffer.from('lot,specimen\n'), 'This is no spreadsheet that can be opened.'],
      [book.subarray(0, book.length / 2), 'This is no spreadsheet that can be opened.'],
      [bomb, 'This spreadsheet would unpack to 4295 MB, and 300 MB is the most.'],
      [damaged, 'This spreadsheet can’t be read.'],
    ] as const)
      expect(await sheetToCsv(put(content), to)).toMatchObject({
        ok: false,
        message: sentence,
        mend: expect.stringMatching(/CSV\.$/),
      })
  })
})

describe('unpackedSize', () => {
  it('adds up what the directory names', async () => {
    const small = await unpackedSize(put(await bookOf([[{ value: 'lot' }]])))
    const large = await unpackedSize(
      put(
        await bookOf(Array.from({ length: 2000 }, (_, n) => [{ value: `LA-${n} and a good deal of text` }])),
      ),
    )
    expect(small).toBeGreaterThan(1000)
    expect(large).toBeGreaterThan(50_000)
  })

  it.each([
    ['nothing', Buffer.alloc(0)],
    ['two letters', Buffer.from('PK')],
    [
      'an end whose directory lies outside the file',
      (() => {
        const end = Buffer.alloc(22)
        end.writeUInt32LE(0x06054b50, 0)
        end.writeUInt32LE(46, 12)
        end.writeUInt32LE(9999, 16)
        return end
      })(),
    ],
  ])('knows none for %s', async (_, content) => {
    expect(await unpackedSize(put(content))).toBeUndefined()
  })
})
