import { describe, expect, it } from 'vitest'
import { problem } from '@/lib/domain/errors'
import { changeLotMaterialsSchema, openLotSchema } from '@/lib/input/lot'
import { atRows, readMaterialRows, refusedAtRows, roleRow, sentRows } from '@/lib/input/lot-materials-form'
import { parseInput } from '@/lib/input/parse-input'
import { refusalOf } from '../../support/refusal-of'

/** The second row is blank, as when somebody emptied it. */
const fields = {
  'material-1.role': 'core',
  'material-1.code': ' C-1 ',
  'material-1.fromMetre': '',
  'material-1.toMetre': '800',
  'material-2.role': 'core',
  'material-2.code': '',
  'material-2.toMetre': 'nonsense',
  'material-3.role': 'wrap-1',
  'material-3.code': 'S-2',
  'material-3.fromMetre': '1,5 km',
}

const read = (change: object = {}) => {
  const sent = { ...fields, ...change }
  const rows = readMaterialRows(sent, sentRows(sent))
  if (!rows.ok) throw new Error(rows.problems.map(({ message }) => message).join(' '))
  return rows.value
}

describe('readMaterialRows', () => {
  it('takes the rows with a code, in their order, metres with comma', () => {
    expect(read({ 'material-3.fromMetre': '1500,5' }).materials).toEqual([
      { role: 'core', code: 'C-1', fromMetre: undefined, toMetre: 800 },
      { role: 'wrap-1', code: 'S-2', fromMetre: 1500.5, toMetre: undefined },
    ])
  })

  it('refuses a place that is no length, at its field', () => {
    const sent = { ...fields, 'material-3.fromMetre': 'far' }
    expect(readMaterialRows(sent, sentRows(sent))).toMatchObject({
      ok: false,
      problems: [{ where: 'material-3.fromMetre' }],
    })
  })

  it('takes one row a role where a lot is opened', () => {
    const rows = readMaterialRows({ 'material-resin.code': 'R-1' }, [roleRow('core'), roleRow('resin')])
    expect(rows).toMatchObject({ ok: true, value: { materials: [{ role: 'resin', code: 'R-1' }] } })
  })

  it('moves problems to the row that they are about, though a blank one stands between', async () => {
    const { materials, at } = read({ 'material-3.fromMetre': '9', 'material-3.toMetre': '3' })
    const parsed = parseInput(changeLotMaterialsSchema, { lotVersion: 1, materials, reason: '' })
    expect(atRows(parsed, at)).toMatchObject({
      ok: false,
      problems: [{ where: 'material-3.toMetre' }, { where: 'reason' }],
    })
    const work = async () => {
      throw problem('not-found', 'There is no S-2.', { where: 'materials.1.code' })
    }
    expect(await refusalOf(refusedAtRows(work, at))).toMatchObject({ where: 'material-3.code' })
  })

  it('leaves a fault of the program a fault', async () => {
    const broken = async () => {
      throw new TypeError('broken')
    }
    await expect(refusedAtRows(broken, (one) => one)).rejects.toThrow(TypeError)
  })
})

describe('openLotSchema', () => {
  const lot = { code: 'L-1', productCode: 'L254', madeAt: '2026-03-02T08:00:00Z' }
  const open = (materials: unknown) => parseInput(openLotSchema, { ...lot, materials })

  it('says nothing of materials unless something is said', () => {
    expect(parseInput(openLotSchema, lot)).toMatchObject({ ok: true, value: { materials: [] } })
  })

  it.each([
    ['materials.0.role', [{ role: 'skin', code: 'C-1' }]],
    ['materials.0.code', [{ role: 'core', code: 'C 1' }]],
    ['materials.0.fromMetre', [{ role: 'core', code: 'C-1', fromMetre: -1 }]],
    ['materials.0.toMetre', [{ role: 'core', code: 'C-1', fromMetre: 5, toMetre: 5 }]],
    ['materials', Array.from({ length: 21 }, () => ({ role: 'core', code: 'C-1' }))],
  ])('refuses %s', (where, materials) => {
    expect(open(materials)).toMatchObject({ ok: false, problems: [{ where }] })
  })

  it('takes twenty', () => {
    expect(open(Array.from({ length: 20 }, () => ({ role: 'core', code: 'C-1' }))).ok).toBe(true)
  })
})
