import { describe, expect, it } from 'vitest'
import { stateWords } from '@/app/lots/state-words'
import {
  type LotColumnId,
  type LotListItem,
  lotCell,
  lotColumn,
  lotColumnIds,
  lotStateNames,
} from '@/lib/domain/record/lot-columns'
import { lotStates } from '@/lib/domain/record/lot-state'

const metric = { diameter: 'mm', force: 'N', mass: 'mg' } as const
const imperial = { diameter: 'in', force: 'lbf', mass: 'g' } as const

const lot: LotListItem = {
  code: 'LA-001',
  state: 'to-decide',
  productCode: 'LARCH-254',
  productName: 'Larch 254',
  family: 'Larch',
  machine: 'Drawing machine 1',
  die: undefined,
  materials: [],
  maker: 'T. Aldous',
  madeAt: Date.UTC(2026, 5, 1, 8),
  measuredAt: undefined,
  lengthMetres: 1200,
  specimens: 3,
  evidenceChanged: true,
  openSignals: 2,
  summaries: {
    diameter: { n: 3, mean: 254e-6, m2: 2e-12 },
    massPerMetreWeighed: { n: 1, mean: 4e-4, m2: 0 },
    closure: { n: 3, mean: -0.002, m2: 0 },
  },
}

const cell = (id: LotColumnId, of: LotListItem = lot, units: Parameters<typeof lotColumn>[1] = metric) =>
  lotCell(lotColumn(id, units), of)

describe('lotCell', () => {
  it('gives measured means and spreads in the units of the works', () => {
    expect(cell('diameter')).toEqual({ kind: 'number', value: expect.closeTo(254, 9) })
    expect(cell('diameter', lot, imperial)).toEqual({ kind: 'number', value: expect.closeTo(10, 9) })
    // Two squares of 1 µm over n − 1 = 2.
    expect(cell('diameterSpread')).toEqual({ kind: 'number', value: expect.closeTo(1, 9) })
    expect(cell('massWeighed')).toEqual({ kind: 'number', value: expect.closeTo(400, 9) })
    expect(cell('massWeighed', lot, imperial)).toEqual({ kind: 'number', value: expect.closeTo(0.4, 12) })
    expect(cell('closure')).toEqual({ kind: 'number', value: expect.closeTo(-0.2, 12) })
  })

  it('leaves open what is not known: no spread of one specimen, nothing that was not measured', () => {
    expect(cell('massSpread')).toEqual({ kind: 'number', value: undefined })
    expect(cell('massSounded')).toEqual({ kind: 'number', value: undefined })
    expect(cell('measured')).toEqual({ kind: 'instant', at: undefined })
    expect(cell('die')).toEqual({ kind: 'text', text: '' })
  })

  it('names what a lot is made of: roles where there are several, splices in their order', () => {
    const of = (materials: LotListItem['materials']) => cell('materials', { ...lot, materials })
    expect(of([])).toEqual({ kind: 'text', text: '' })
    expect(of([{ role: 'core', code: 'C-118' }])).toEqual({ kind: 'text', text: 'C-118' })
    expect(
      of([
        { role: 'core', code: 'C-118' },
        { role: 'wrap-1', code: 'SP-22' },
        { role: 'wrap-1', code: 'SP-23' },
      ]),
    ).toEqual({ kind: 'text', text: 'core C-118, wrap SP-22 + SP-23' })
  })

  it('says what is to be answered', () => {
    expect(cell('signals')).toEqual({ kind: 'text', text: 'evidence changed, 2 signals' })
    expect(cell('signals', { ...lot, evidenceChanged: false, openSignals: 1 })).toEqual({
      kind: 'text',
      text: '1 signal',
    })
    expect(cell('signals', { ...lot, evidenceChanged: false, openSignals: 0 })).toEqual({
      kind: 'text',
      text: '',
    })
  })
})

describe('lotColumn', () => {
  it('has a name of its own for each column, and decimals where there are numbers', () => {
    const columns = lotColumnIds.map((id) => lotColumn(id, metric))
    expect(new Set(columns.map(({ name }) => name)).size).toBe(lotColumnIds.length)
    for (const column of columns)
      expect([column.id, column.decimals !== undefined]).toEqual([
        column.id,
        lotCell(column, lot).kind === 'number',
      ])
  })

  it('sorts by what can be sorted by, and by nothing else', () => {
    expect(lotColumnIds.flatMap((id) => lotColumn(id, metric).sort ?? [])).toEqual([
      'product',
      'made',
      'measured',
      'length',
      'state',
    ])
  })
})

describe('lotStateNames', () => {
  it('are the words that pages show', () => {
    expect(lotStateNames).toEqual(
      Object.fromEntries(lotStates.map((state) => [state, stateWords[state].word])),
    )
  })
})
