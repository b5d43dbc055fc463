import { describe, expect, it } from 'vitest'
import { currentSheet } from '@/lib/domain/record/current-sheet'
import { mergeOf } from '@/lib/domain/record/merge-clash'
import {
  diameterAt,
  sheetReading,
  steelEquipment,
  steelSheet,
  typedHertz,
  typedMass,
} from '../../support/sheets'

const stored = currentSheet([sheetReading('r1')])

describe('mergeOf', () => {
  it('finds nothing new and no clash in the same sheet sent again', () => {
    expect(mergeOf(stored, steelSheet(), steelEquipment)).toEqual({ clashes: [], adds: false })
  })

  it('takes the same value in another unit as the same', () => {
    const micrometres = diameterAt(1, 'a', '0.2540')
    const part = {
      diameters: [{ ...micrometres, value: { ...micrometres.value, typed: '254', unit: 'µm' } }],
    }
    expect(mergeOf(stored, part, steelEquipment).clashes).toEqual([])
  })

  it('names both values where the same reading stands with another value', () => {
    const part = { cutMass: typedMass('210.1'), cutLength: steelSheet().cutLength }
    expect(mergeOf(stored, part, steelEquipment)).toEqual({
      clashes: [{ field: 'cutMass', stored: '199.1 mg', entered: '210.1 mg' }],
      adds: false,
    })
  })

  it('names the plucks and what hung where a sounding differs', () => {
    const part = {
      frequencies: [typedHertz('164.2'), typedHertz('164.3')],
      span: steelSheet().span,
      load: { kind: 'weights', hanger: 'H-01', weights: ['W-05'] } as const,
    }
    expect(mergeOf(stored, part, steelEquipment).clashes).toEqual([
      { field: 'frequency', stored: '331.0 Hz', entered: '164.2 Hz, 164.3 Hz' },
      { field: 'load', stored: 'H-01 W-02 W-05', entered: 'H-01 W-05' },
    ])
  })

  it('does not mind in which order the weights were named', () => {
    const part = {
      frequencies: steelSheet().frequencies,
      span: steelSheet().span,
      load: { kind: 'weights', hanger: 'H-01', weights: ['W-02', 'W-05'] } as const,
    }
    expect(mergeOf(stored, part, steelEquipment)).toEqual({ clashes: [], adds: false })
  })

  it('lets an act be added that is not there yet', () => {
    const section = currentSheet([
      { clientId: 'a', kind: 'section', values: { diameters: steelSheet().diameters }, equipment: {} },
    ])
    const part = { cutMass: typedMass('199.1'), cutLength: steelSheet().cutLength }
    expect(mergeOf(section, part, steelEquipment)).toEqual({ clashes: [], adds: true })
  })

  it('lets set-up values alone neither add nor clash', () => {
    expect(mergeOf(stored, { span: steelSheet({}).cutLength }, steelEquipment)).toEqual({
      clashes: [],
      adds: false,
    })
  })

  it('refuses further positions measured with another micrometer', () => {
    const part = { diameters: [diameterAt(4, 'a', '0.2540')] }
    expect(mergeOf(stored, part, { micrometer: 'M-15' }).clashes).toEqual([
      { field: 'micrometer', stored: 'M-14', entered: 'M-15' },
    ])
  })
})
