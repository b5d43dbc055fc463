import { describe, expect, it } from 'vitest'
import { benchColumn, likelyName, offeredNames } from '@/lib/input/bench-file/columns'
import { cleanHeaders, decimalOf, layoutOf, proposedColumns } from '@/lib/input/bench-file/layout'

describe('benchColumn(name)', () => {
  it.each([
    ['lot', { kind: 'word', id: 'lot' }],
    ['d2b_thou', { kind: 'diameter', position: 2, direction: 'b', unit: 'thou' }],
    ['d12a_um', { kind: 'diameter', position: 12, direction: 'a', unit: 'µm' }],
    ['cut_mass_g', { kind: 'value', base: 'cut_mass', unit: 'g' }],
    ['load_n', { kind: 'value', base: 'load', unit: 'N' }],
    ['load_kg', { kind: 'value', base: 'load', unit: 'kg' }],
    ['temperature_f', { kind: 'value', base: 'temperature', unit: '°F' }],
    ['humidity_percent', { kind: 'value', base: 'humidity', unit: '%' }],
    ['lot_length_m', { kind: 'value', base: 'lot_length', unit: 'm' }],
    ['span2_mm', { kind: 'note' }],
    ['pulse_time_s', { kind: 'note' }],
    ['refused_because', { kind: 'left-out' }],
  ])('%s', (name, column) => {
    expect(benchColumn(name)).toEqual(column)
  })

  it.each([
    '',
    'd1a',
    'd0a_mm',
    'd1c_mm',
    'cut_mass_mm',
    'load_hz',
    'frequency_mm',
    'span',
    'Lot',
    'toString_mm',
  ])('%s is none', (name) => {
    expect(benchColumn(name)).toBeUndefined()
  })

  it('knows every name that is offered', () => {
    expect(offeredNames(3).filter((name) => !benchColumn(name))).toEqual([])
    expect(offeredNames(3)).toContain('d3b_in')
  })
})

describe('likelyName(header)', () => {
  it.each([
    ['D1A [mm]', 'd1a_mm'],
    ['d2b (µm)', 'd2b_um'],
    ['Cut mass / mg', 'cut_mass_mg'],
    ['Temperature °C', 'temperature_c'],
    ['LOT', 'lot'],
    ['Durchmesser', undefined],
  ])('%s is %s', (header, name) => {
    expect(likelyName(header)).toBe(name)
  })
})

describe('a file’s layout', () => {
  it('takes the mark and empty headers at the end off', () => {
    expect(cleanHeaders(['\uFEFFlot', ' specimen ', '', 'x', '', ''])).toEqual(['lot', 'specimen', '', 'x'])
  })

  it('proposes own names, then what was kept, then what is likely, then a note; nothing twice', () => {
    const kept = { Los: 'lot', 'Nr.': 'specimen' }
    expect(proposedColumns(['Los', 'Nr.', 'd1a_mm', 'D1A [mm]', 'colour'], kept)).toEqual({
      Los: 'lot',
      'Nr.': 'specimen',
      d1a_mm: 'd1a_mm',
      'D1A [mm]': 'as-note',
      colour: 'as-note',
    })
  })

  it('refuses a missing column by its name, a name twice, and one reading in two columns', () => {
    const messages = (headers: readonly string[], columns: Record<string, string>) => {
      const layout = layoutOf(headers, columns)
      return layout.ok ? [] : layout.problems.map((one) => one.message)
    }
    expect(messages(['lot', 'd1a_mm'], { lot: 'lot', d1a_mm: 'd1a_mm' })).toEqual([
      'No column is read as specimen: it is missing from the file.',
    ])
    expect(messages(['lot', 'specimen', 'lot'], { lot: 'lot', specimen: 'specimen' })[0]).toBe(
      'The file has two columns named “lot”.',
    )
    expect(
      messages(['lot', 'specimen', 'a', 'b'], {
        lot: 'lot',
        specimen: 'specimen',
        a: 'load_kg',
        b: 'load_n',
      }),
    ).toEqual(['The columns “a” and “b” are both read as load.'])
    expect(messages(['lot', 'specimen', 'a'], { lot: 'lot', specimen: 'specimen', a: 'weight' })).toEqual([
      '“weight” is no column of the bench file.',
    ])
    expect(messages(['lot', 'specimen', 'colour'], { lot: 'lot', specimen: 'specimen' })).toEqual([])
  })

  it.each([
    [[['0,254', 'a,b']], 'comma'],
    [[['0.254', '3']], 'point'],
    [[['0,254', '0.254']], undefined],
    [[['3', 'x']], undefined],
  ])('finds the decimal sign of %j: %s', (rows, decimal) => {
    expect(decimalOf(rows)).toBe(decimal)
  })
})
