import { describe, expect, it } from 'vitest'
import {
  isFiltered,
  listLotsSchema,
  lotParameters,
  lotSorts,
  parseColumns,
  readLotAddress,
} from '@/lib/input/lot-list'
import { parseInput } from '@/lib/input/parse-input'

const whole = {
  search: 'larch 254',
  state: 'to-decide',
  productCode: 'LARCH-254',
  family: 'Larch',
  machineCode: 'DM-1',
  dieCode: 'D-7',
  from: '2026-03-01',
  to: '2026-03-31',
  signals: 'open',
  evidence: 'changed',
  sort: 'length-up',
  columns: 'state,made',
  page: '3',
}

describe('readLotAddress', () => {
  it('takes nothing for the whole list, from its first page', () => {
    const { input, problems } = readLotAddress({})
    expect([input, problems]).toEqual([{ search: '', page: 1 }, []])
    expect(isFiltered(input)).toBe(false)
  })

  it('takes the empty fields that a form sends for nothing asked', () => {
    const empty = Object.fromEntries(Object.keys(whole).map((name) => [name, '']))
    expect(readLotAddress(empty)).toEqual({ input: { search: '', page: 1 }, problems: [] })
  })

  it('reads everything, and writes it back into the same address', () => {
    const { input, problems } = readLotAddress(whole)
    expect(problems).toEqual([])
    expect(input).toEqual({ ...whole, columns: ['state', 'made'], page: 3 })
    expect(Object.fromEntries(lotParameters(input))).toEqual(whole)
    expect(isFiltered(input)).toBe(true)
  })

  it('leaves the usual ways unnamed', () => {
    expect(String(lotParameters(readLotAddress({ sort: 'made-down', page: '1' }).input))).toBe('')
  })

  it.each([
    ['state', 'melted'],
    ['from', '2026-02-30'],
    ['from', '27.11.2026'],
    ['to', '1066-10-14'],
    ['sort', 'colour-up'],
    ['page', '0'],
    ['page', 'two'],
    ['dieCode', 'D 7'],
    ['signals', 'some'],
  ])('names %s=%s as wrong and keeps the rest', (name, value) => {
    const { input, problems } = readLotAddress({ search: 'larch', [name]: value })
    expect(problems).toMatchObject([{ where: name }])
    expect(problems[0]?.message).toMatch(/\.$/)
    expect(input).toEqual({ search: 'larch', page: 1 })
  })

  it('refuses days that end before they begin, without an order of their own', () => {
    const { input, problems } = readLotAddress({ from: '2026-03-02', to: '2026-03-01' })
    expect(problems).toMatchObject([{ where: 'to' }])
    expect(input).toMatchObject({ from: '2026-03-02' })
    expect(readLotAddress({ from: '2026-03-02', to: '2026-03-02' }).problems).toEqual([])
  })

  it('passes over parameters of no meaning here, which the API refuses', () => {
    expect(readLotAddress({ colour: 'red' }).problems).toEqual([])
    expect(parseInput(listLotsSchema, { colour: 'red' })).toMatchObject({ ok: false })
  })
})

describe('lotSorts', () => {
  it('go both ways', () => {
    expect(lotSorts).toEqual([
      ...['made-down', 'made-up', 'measured-down', 'measured-up', 'code-down', 'code-up'],
      ...['product-down', 'product-up', 'state-down', 'state-up', 'length-down', 'length-up'],
    ])
  })
})

describe('parseColumns', () => {
  it('keeps known ones once, in the order given; nothing known is undefined', () => {
    expect(parseColumns('state, made,state,colour')).toEqual(['state', 'made'])
    expect([parseColumns('colour'), parseColumns(''), parseColumns(undefined)]).toEqual([
      undefined,
      undefined,
      undefined,
    ])
  })
})
