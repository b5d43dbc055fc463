import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { type CsvRecord, CsvRecords, delimiterOf } from '@/lib/input/bench-file/csv-records'

/** All records of a text that arrives in pieces of this size. */
function recordsOf(text: string, delimiter = ',', size = 7): readonly CsvRecord[] {
  const reader = new CsvRecords(delimiter)
  const records: CsvRecord[] = []
  for (let from = 0; from < text.length; from += size)
    records.push(...reader.push(text.slice(from, from + size)))
  return [...records, ...reader.end()]
}

const cellsOf = (records: readonly CsvRecord[]) =>
  records.map((one) => ('cells' in one ? one.cells : one.broken))

describe('CsvRecords', () => {
  it('reads any line end, quoted delimiters, doubled quotes and line ends in quotes, with line numbers', () => {
    const text = 'a,b\r\n"1,5","say ""so"""\n"two\r\nlines",x\r\n\r\nlast,row\rend,here'
    expect(recordsOf(text)).toEqual([
      { line: 1, cells: ['a', 'b'] },
      { line: 2, cells: ['1,5', 'say "so"'] },
      { line: 3, cells: ['two\r\nlines', 'x'] },
      { line: 6, cells: ['last', 'row'] },
      { line: 7, cells: ['end', 'here'] },
    ])
  })

  it('takes a quote within a cell as it stands', () => {
    expect(cellsOf(recordsOf('5" scale,x\n"a"b,c\nd,e'))).toEqual([
      ['5" scale', 'x'],
      'There is text behind a closing quote.',
      ['d', 'e'],
    ])
  })

  it('refuses a line whose quote is never closed, and goes on with the next line', () => {
    const records = recordsOf(`a,b\n"open,1\n${'x,y\n'.repeat(30_000)}last,row\n`, ',', 4096)
    expect(records[1]).toMatchObject({ line: 2, broken: 'A quote is opened on this line and never closed.' })
    expect(records).toHaveLength(30_003)
    expect(records.at(-1)).toEqual({ line: 30_003, cells: ['last', 'row'] })
    expect(cellsOf(recordsOf('a\n"open\nlast'))).toEqual([
      ['a'],
      'A quote is opened on this line and never closed.',
      ['last'],
    ])
  })

  it('passes over a line without end, and keeps nothing of it', () => {
    const reader = new CsvRecords(',')
    const records = [...reader.push('a,b\n')]
    for (let piece = 0; piece < 100; piece += 1) records.push(...reader.push('n'.repeat(20_000)))
    records.push(...reader.push('\nlast,row\n'), ...reader.end())
    expect(records).toMatchObject([
      { line: 1, cells: ['a', 'b'] },
      { line: 2, broken: 'The line is longer than 65536 characters.' },
      { line: 3, cells: ['last', 'row'] },
    ])
  })

  it('reads the same records however the text is cut', () => {
    const cell = fc.string({ unit: fc.constantFrom('a', '"', ',', '\n', '\r', ' ', 'µ', '😀'), maxLength: 6 })
    const row = fc.array(cell, { minLength: 2, maxLength: 4 })
    fc.assert(
      fc.property(
        fc.array(row, { minLength: 1, maxLength: 6 }),
        fc.integer({ min: 1, max: 9 }),
        (rows, size) => {
          const quoted = rows
            .map((cells) => cells.map((one) => `"${one.replaceAll('"', '""')}"`).join(','))
            .join('\r\n')
          expect(cellsOf(recordsOf(quoted, ',', size))).toEqual(rows)
        },
      ),
    )
  })

  it('never throws, and keeps the last row of any noise that ends its lines', () => {
    fc.assert(
      fc.property(
        fc.string({ unit: 'binary', maxLength: 400 }),
        fc.integer({ min: 1, max: 50 }),
        (noise, size) => {
          const records = recordsOf(`${noise.replaceAll('"', "'")}\nlast,row`, ',', size)
          expect(records.at(-1)).toMatchObject({ cells: ['last', 'row'] })
        },
      ),
    )
  })
})

describe('delimiterOf(head)', () => {
  it.each([
    ['lot,specimen\n', ','],
    ['\uFEFFlot;d1a_mm;"a,b,c,d"\n1,5;2,5', ';'],
    ['lot\tspecimen', '\t'],
    ['lot', ','],
  ])('%j has %j', (head, delimiter) => {
    expect(delimiterOf(head)).toBe(delimiter)
  })
})
