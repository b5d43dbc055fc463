import { describe, expect, it } from 'vitest'
import { characteristicIds, characteristics } from '@/lib/domain/metrology/characteristics'
import { chartName, chartUnit, displayUnit } from '@/lib/domain/record/display-unit'
import { fromSi, unit } from '@/lib/domain/units/unit'

const metric = { diameter: 'mm', force: 'N', mass: 'mg' } as const
const inches = { diameter: 'in', force: 'lbf', mass: 'g' } as const

describe('displayUnit', () => {
  it('reads charts finer than what is typed: micrometres for millimetres, thou for inches', () => {
    expect(displayUnit('diameter', metric)).toEqual({ unit: 'µm', decimals: 2 })
    expect(displayUnit('ovality', inches)).toEqual({ unit: 'thou', decimals: 3 })
    expect(displayUnit('diameter', { ...metric, diameter: 'thou' }).unit).toBe('thou')
    expect(displayUnit('diameter', { ...metric, diameter: 'µm' }).unit).toBe('µm')
  })

  it('follows the works’ units of mass and force', () => {
    expect(displayUnit('massPerMetreWeighed', metric)).toEqual({ unit: 'mg/m', decimals: 1 })
    expect(displayUnit('massPerMetreSounded', inches)).toEqual({ unit: 'g/m', decimals: 4 })
    expect(displayUnit('tension', inches)).toEqual({ unit: 'lbf', decimals: 2 })
  })

  it('has a unit of the right dimension for every characteristic', () => {
    for (const id of characteristicIds)
      for (const units of [metric, inches]) {
        const shown = displayUnit(id, units)
        expect(unit(shown.unit).dimension).toBe(characteristics[id].dimension)
        expect(Number.isFinite(fromSi(1, shown.unit))).toBe(true)
      }
  })
})

describe('chartUnit', () => {
  it('gives a spread one more decimal than its values', () => {
    expect(chartUnit('diameter', 'mean', metric)).toEqual({ unit: 'µm', decimals: 2 })
    expect(chartUnit('diameter', 'within-lot-sd', metric)).toEqual({ unit: 'µm', decimals: 3 })
  })
})

describe('chartName', () => {
  it('names the characteristic, or the spread of it', () => {
    expect(chartName('massPerMetreWeighed', 'mean')).toBe('Mass per metre, weighed')
    expect(chartName('massPerMetreWeighed', 'within-lot-sd')).toBe(
      'Spread within the lot, mass per metre, weighed',
    )
  })
})
