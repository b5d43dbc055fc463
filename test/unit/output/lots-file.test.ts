import readXlsxFile from 'read-excel-file/node'
import { describe, expect, it } from 'vitest'
import type { LotListItem } from '@/lib/domain/record/lot-columns'
import { lotsCsv } from '@/lib/output/lots-csv'
import { lotsXlsx } from '@/lib/output/lots-xlsx'
import { xlsxFile } from '@/lib/output/xlsx'

const style = {
  units: { diameter: 'mm', force: 'N', mass: 'mg' },
  timeZone: 'Europe/Oslo',
  numberFormat: 'point',
} as const

const lot: LotListItem = {
  code: 'LA-001',
  state: 'held',
  productCode: 'LARCH-254',
  productName: 'Larch 254',
  family: '=Larch',
  machine: '-1 machine',
  die: '+Die, the "wide" one',
  materials: [],
  maker: '@aldous',
  // Winter and summer time: one hour and two ahead of UTC.
  madeAt: Date.UTC(2026, 0, 31, 23, 30),
  measuredAt: Date.UTC(2026, 6, 1, 8, 5),
  lengthMetres: 1200.5,
  specimens: 5,
  evidenceChanged: false,
  openSignals: 0,
  summaries: { diameter: { n: 5, mean: 254.0312e-6, m2: 0 }, closure: { n: 5, mean: -0.0021, m2: 0 } },
}
const columns = [
  ...(['made', 'measured', 'family', 'machine', 'die', 'maker', 'length', 'diameter'] as const),
  ...(['closure', 'massWeighed', 'state'] as const),
]

describe('lotsCsv', () => {
  it('holds the code and the chosen columns, with units in the head and the clock of the works', () => {
    expect(lotsCsv([lot], ['state', 'made', 'diameter', 'closure', 'massWeighed'], style)).toBe(
      '\uFEFFLot,State,Made (Europe/Oslo),Diameter (µm),Closure (%),Mass weighed (mg/m)\r\n' +
        'LA-001,on hold,2026-02-01 00:30,254.0312,-0.21,\r\n',
    )
  })

  it('writes as a works with a decimal comma reads', () => {
    const text = lotsCsv([lot], ['length', 'measured'], { ...style, numberFormat: 'comma' })
    expect(text.split('\r\n')[1]).toBe('LA-001;1200,5;2026-07-01 10:05')
  })

  it('lets no text begin like a formula; a negative number stays a number', () => {
    expect(lotsCsv([lot], ['family', 'machine', 'die', 'maker', 'closure'], style).split('\r\n')[1]).toBe(
      `LA-001,'=Larch,'-1 machine,"'+Die, the ""wide"" one",'@aldous,-0.21`,
    )
  })

  it('is a head alone for no lots', () => {
    expect(lotsCsv([], ['state'], style)).toBe('\uFEFFLot,State\r\n')
  })
})

describe('lotsXlsx', () => {
  it('holds numbers as numbers, dates as dates of the works’ clock, and empty cells', async () => {
    const [sheet] = await readXlsxFile(Buffer.from(await lotsXlsx([lot], columns, style)))
    const [head, row] = sheet?.data ?? []
    expect(sheet?.sheet).toBe('Lots')
    expect(head).toEqual([
      ...['Lot', 'Made (Europe/Oslo)', 'Measured (Europe/Oslo)', 'Family', 'Machine', 'Die', 'Maker'],
      ...['Length (m)', 'Diameter (µm)', 'Closure (%)', 'Mass weighed (mg/m)', 'State'],
    ])
    // A day is a floating number in a spreadsheet: 00:30 is read a fraction of a millisecond early.
    expect(
      row?.map((cell) => (cell instanceof Date ? new Date(Math.round(cell.getTime() / 1000) * 1000) : cell)),
    ).toEqual([
      'LA-001',
      new Date(Date.UTC(2026, 1, 1, 0, 30)),
      new Date(Date.UTC(2026, 6, 1, 10, 5)),
      ...["'=Larch", "'-1 machine", `'+Die, the "wide" one`, "'@aldous"],
      ...[1200.5, 254.0312, -0.21, null, 'on hold'],
    ])
  })

  it('refuses a number that no spreadsheet has', () => {
    expect(() => xlsxFile('Lots', { columns: [{ head: 'x', decimals: 1 }], rows: [[Number.NaN]] })).toThrow(
      RangeError,
    )
  })
})
