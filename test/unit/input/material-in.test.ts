import { describe, expect, it } from 'vitest'
import type { FormFields } from '@/lib/input/form-fields'
import { createMaterialInSchema, listMaterialsInSchema, parseMaterialIn } from '@/lib/input/material-in'
import { parseInput } from '@/lib/input/parse-input'

const startOf = (day: string): number => Date.parse(`${day}T00:00:00+01:00`)
const parse = (fields: FormFields) =>
  parseMaterialIn({ kind: 'coil', name: 'Music wire', ...fields }, startOf)

const whereOf = (result: ReturnType<typeof parse>) =>
  result.ok ? [] : result.problems.map(({ where }) => where)

describe('parseMaterialIn', () => {
  it('takes sizes in mm, lengths in m and masses in kg unless a unit follows', () => {
    expect(parse({ size: '0,254', length: '12 km', mass: '500 g' })).toMatchObject({ ok: false })
    const read = parse({ size: '0,254', length: '1200', mass: '500 g', received: '2026-03-02' })
    expect(read).toMatchObject({
      ok: true,
      value: { lengthMetres: 1200, receivedAt: Date.UTC(2026, 2, 1, 23) },
    })
    if (!read.ok) throw new Error('refused')
    expect(read.value.sizeMetres).toBeCloseTo(254e-6, 12)
    expect(read.value.massKilograms).toBeCloseTo(0.5, 12)
  })

  it('leaves open what nobody said', () => {
    expect(parse({})).toEqual({
      ok: true,
      value: {
        name: 'Music wire',
        kind: 'coil',
        materialCode: undefined,
        heat: '',
        supplier: '',
        parentCode: undefined,
        sizeMetres: undefined,
        lengthMetres: undefined,
        massKilograms: undefined,
        note: '',
      },
    })
  })

  it.each([
    ['name', { name: ' ' }],
    ['kind', { kind: 'bobbin' }],
    ['parentCode', { parentCode: 'C 1' }],
    ['size', { size: '254' }],
    ['length', { length: '-3' }],
    ['mass', { mass: 'heavy' }],
    ['received', { received: '2026-02-30' }],
  ])('refuses a %s that can’t be, at its field', (field, fields) => {
    expect(whereOf(parse(fields))).toEqual([field])
  })
})

describe('createMaterialInSchema', () => {
  it('takes SI and instants, and fills what is left out', () => {
    expect(
      parseInput(createMaterialInSchema, {
        code: 'C-1',
        name: 'Wire',
        kind: 'coil',
        sizeMetres: 254e-6,
        receivedAt: '2026-03-02T08:00:00Z',
      }),
    ).toMatchObject({ ok: true, value: { heat: '', note: '', receivedAt: Date.UTC(2026, 2, 2, 8) } })
  })

  it.each([
    ['kind', { kind: 'reel' }],
    ['sizeMetres', { sizeMetres: 254 }],
    ['lengthMetres', { lengthMetres: Number.NaN }],
    ['massKilograms', { massKilograms: -1 }],
    ['receivedAt', { receivedAt: '2026-03-02' }],
    ['code', { code: 'C 1' }],
  ])('refuses %s', (where, change) => {
    const parsed = parseInput(createMaterialInSchema, { code: 'C-1', name: 'Wire', kind: 'coil', ...change })
    expect(parsed).toMatchObject({ ok: false, problems: [{ where }] })
  })
})

describe('listMaterialsInSchema', () => {
  it('is the first page of everything unless asked', () => {
    expect(parseInput(listMaterialsInSchema, {})).toEqual({ ok: true, value: { search: '', page: 1 } })
    expect(parseInput(listMaterialsInSchema, { inUse: 'maybe' }).ok).toBe(false)
  })
})
