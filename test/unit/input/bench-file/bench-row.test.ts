import { describe, expect, it } from 'vitest'
import { readBenchRow } from '@/lib/input/bench-file/bench-row'
import { layoutOf, proposedColumns } from '@/lib/input/bench-file/layout'

/** A row as header → cell, read as a file with these headers is. */
function read(cells: Readonly<Record<string, string>>, decimal: 'point' | 'comma' = 'point') {
  const headers = Object.keys(cells)
  const layout = layoutOf(headers, proposedColumns(headers))
  if (!layout.ok) throw new Error(layout.problems.map((one) => one.message).join(' '))
  return readBenchRow(Object.values(cells), {
    headers,
    columns: layout.value,
    decimal,
    timeZone: 'Europe/London',
  })
}

const whole = {
  lot: 'LA-0001',
  product: 'Larch 254',
  made_at: '2026-07-01T09:00',
  machine: 'DM-1',
  maker: 'S. Imrie',
  lot_length_m: '1200',
  specification: '2',
  specimen: '3',
  taken_at: 'tail',
  measured_at: '2026-07-01T10:30',
  rig: 'RIG-2',
  weights: 'H-01 W-05',
  d1b_um: '254.1',
  d1a_mm: '0.2540',
  cut_length_mm: '500.0',
  cut_mass_mg: '198.91',
  weighed_state: 'slack',
  span_mm: '648.0',
  frequency_hz: '329.61 329.63',
  temperature_c: '20.4',
  humidity_percent: '45',
  colour: 'bright',
  span2_mm: '324.0',
}

const problems = (cells: Readonly<Record<string, string>>, decimal?: 'point' | 'comma') => {
  const row = read(cells, decimal)
  return row.ok ? [] : row.problems.map(({ message, where, details }) => [where, details?.value, message])
}

const least = { lot: 'LA-0001', specimen: '1', d1a_mm: '0.2540' }

describe('readBenchRow(cells, reading)', () => {
  it('understands every column of the format, keeps what was typed, and unknown columns as notes', () => {
    const row = read(whole)
    if (!row.ok) throw new Error(row.problems[0]?.message)
    expect(row.value).toMatchObject({
      lot: 'LA-0001',
      specimen: 3,
      measuredAt: Date.UTC(2026, 6, 1, 9, 30),
      weights: ['H-01', 'W-05'],
      equipment: { rig: 'RIG-2' },
      opening: {
        product: 'Larch 254',
        machine: 'DM-1',
        maker: 'S. Imrie',
        specification: 2,
        madeAt: Date.UTC(2026, 6, 1, 8),
        lengthMetres: 1200,
      },
    })
    expect(row.value.values).toMatchObject({
      takenAt: { end: 'tail' },
      diameters: [
        { position: 1, direction: 'a', value: { typed: '0.2540', unit: 'mm', si: 0.000254 } },
        { position: 1, direction: 'b', value: { typed: '254.1', unit: 'µm' } },
      ],
      cutLength: { si: 0.5 },
      frequencies: [{ si: 329.61 }, { si: 329.63 }],
      temperature: { si: 20.4 },
      humidity: 0.45,
      note: 'colour: bright\nspan2_mm: 324.0',
    })
  })

  it('reads decimal commas in a file that has them, and refuses a point there', () => {
    const row = read({ ...least, d1a_mm: '0,2540' }, 'comma')
    expect(row.ok && row.value.values.diameters?.[0]?.value.si).toBe(0.000254)
    expect(problems(least, 'comma')).toHaveLength(1)
    expect(problems({ ...least, d1a_mm: '0,2540' }, 'point')).toHaveLength(1)
  })

  it('takes a load as mass or as force', () => {
    const load = (cells: Readonly<Record<string, string>>) => {
      const row = read({ ...least, ...cells })
      return row.ok ? row.value.values.load : undefined
    }
    expect(load({ load_kg: '7.4' })).toMatchObject({ kind: 'mass', value: { si: 7.4 } })
    expect(load({ load_n: '72.6' })).toMatchObject({ kind: 'force', value: { si: 72.6 } })
    expect(load({ load_lbf: '10' })).toMatchObject({ kind: 'force', value: { si: 44.482216152605 } })
  })

  it.each([
    [{ ...least, d1a_mm: 'thick' }, 'd1a_mm', 'thick', 'Diameter: “thick” has no digits.'],
    [
      { ...least, cut_mass_mg: '-198' },
      'cut_mass_mg',
      '-198',
      'Cut mass: −198 mg was read, and it has to be between 0.1 mg and 2000000 mg.',
    ],
    [{ ...least, specimen: '0' }, 'specimen', '0', 'specimen is a whole number from 1 to 9999, not “0”.'],
    [{ ...least, specimen: '' }, 'specimen', '', 'specimen is empty.'],
    [{ ...least, lot: '' }, 'lot', '', 'lot is empty.'],
    [
      { ...least, measured_at: '2026-03-29T01:30' },
      'measured_at',
      '2026-03-29T01:30',
      '“2026-03-29T01:30” never was in Europe/London: the clocks went past it.',
    ],
    [
      { ...least, note: 'a\u0007b' },
      'note',
      'a\uFFFDb',
      'note holds characters that can’t be shown or stored.',
    ],
    [
      { ...least, weighed_state: 'wet' },
      'weighed_state',
      'wet',
      'weighed_state is slack or marked, not “wet”.',
    ],
    [
      { ...least, taken_at: 'middle' },
      'taken_at',
      'middle',
      'taken_at is head, tail or metres from the head, not “middle”.',
    ],
    [
      { ...least, weights: 'W-1 W-1' },
      'weights',
      'W-1',
      'weights names weight W-1 twice, and it can hang only once.',
    ],
    [
      { lot: 'LA-1', specimen: '1', note: 'x' },
      undefined,
      undefined,
      'The row holds no reading: no diameter, no mass, no frequency.',
    ],
  ] as const)('refuses %j: column, value, sentence', (cells, where, value, message) => {
    expect(problems(cells)).toEqual([[where, value, message]])
  })

  it('names every problem of a row at once', () => {
    expect(
      problems({ ...least, d1a_mm: 'x', cut_mass_mg: 'y', made_at: 'z' }).map(([where]) => where),
    ).toEqual(['d1a_mm', 'cut_mass_mg', 'made_at'])
  })

  it('refuses more cells than the header has, but not empty ones', () => {
    const layout = layoutOf(['lot', 'specimen', 'd1a_mm'], proposedColumns(['lot', 'specimen', 'd1a_mm']))
    if (!layout.ok) throw new Error('refused')
    const reading = {
      headers: ['lot', 'specimen', 'd1a_mm'],
      columns: layout.value,
      decimal: 'point' as const,
      timeZone: 'UTC',
    }
    expect(readBenchRow(['L1', '1', '0.254', ''], reading).ok).toBe(true)
    expect(readBenchRow(['L1', '1', '0', '254'], reading)).toMatchObject({
      ok: false,
      problems: [{ message: 'The row has 4 cells and the header 3.' }],
    })
  })
})
