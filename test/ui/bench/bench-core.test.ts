import { describe, expect, it } from 'vitest'
import { expectedFrequency } from '@/app/bench/_ui/bench-core'
import { liveLot } from '@/app/bench/_ui/bench-lot'
import type { BenchView } from '@/app/bench/_ui/bench-view'
import { evaluateSpecimen } from '@/lib/domain/metrology/evaluate-specimen'
import type { SpecimenSheet } from '@/lib/domain/metrology/sheet'
import { coreArea } from '@/lib/domain/strings/core-section'
import { tensileStrengthAt } from '@/lib/domain/strings/strength'
import { degreesCelsius } from '@/lib/domain/units/quantity'
import { productOf } from '@/prisma/demo/products'
import { readLot } from '@/prisma/demo/readings'
import { demoSchedule } from '@/prisma/demo/schedule'
import { demoContext } from '@/test/support/demo-simulation'

function benchOf(productCode: string): { readonly view: BenchView; readonly sheet: SpecimenSheet } {
  const lot = demoSchedule().find((one) => one.productCode === productCode && one.index === 3)
  if (!lot) throw new Error(`The demo has no lots of ${productCode}.`)
  const product = productOf(productCode)
  const known = demoContext(product, lot)
  const { rig } = known
  const context = { ...known, ...(rig ? { rig: { ...rig, weightCodes: product.load.slice(1) } } : {}) }
  const [read] = readLot(product, lot)
  if (!read) throw new Error('The lot has no specimens.')
  const temperature = { typed: '20.0', unit: '°C', si: degreesCelsius(20) }
  return {
    sheet: { ...read, temperature },
    view: {
      personId: 1,
      lot: { code: lot.code, productName: product.name, productCode, line: '', state: 'measuring' },
      plan: context.specification.plan,
      context,
      equipment: {},
      units: { diameter: 'mm', length: 'mm', mass: 'mg', massPerLength: 'mg/m', force: 'N' },
      decimal: 'point',
      stored: [],
      rigLine: '',
      equipmentLines: [],
    },
  }
}

describe('expectedFrequency(view, sheet)', () => {
  it.each(['LARCH-254', 'ROWAN-1060', 'ROWAN-1330', 'YEW-1400', 'ALDER-820'])(
    'of %s is the frequency with which its evaluation closes',
    (productCode) => {
      const { sheet, view } = benchOf(productCode)
      const expected = expectedFrequency(view, { ...sheet, frequencies: [] })
      if (!expected) throw new Error('Nothing is expected.')
      expect(expected.from).toBe('weighing')
      const heard = { ...sheet, frequencies: [{ typed: '', unit: 'Hz', si: expected.value }] }
      const { results } = evaluateSpecimen(heard, view.context)
      expect(Math.abs(results.closure?.value ?? Number.NaN)).toBeLessThan(1e-9)
    },
  )
})

describe('liveLot(…).caution of a wound string', () => {
  it('names the load that breaks its core, which alone bears it', () => {
    const { view } = benchOf('ROWAN-1060')
    const { core } = view.context.specification
    if (!core) throw new Error('It has no core.')
    // Strength of the table at the size of the core, over the core’s area.
    const newtons = (tensileStrengthAt(view.context.material, core.size)?.low ?? 0) * coreArea(core)
    expect(newtons).toBeGreaterThan(100)
    const { text } = liveLot(view, {}, {}, {}).caution
    expect(text).toMatch(new RegExp(`may break at ${newtons.toFixed(1)}\\sN`))
  })
})
