import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { evaluateSpecimen } from '@/lib/domain/metrology/evaluate-specimen'
import type { EvaluationContext } from '@/lib/domain/metrology/evaluation'
import type { SpecimenSheet } from '@/lib/domain/metrology/sheet'
import type { Core } from '@/lib/domain/strings/core-section'
import {
  degreesCelsius,
  hertz,
  kilograms,
  kilogramsPerCubicMetre,
  metres,
  pascals,
} from '@/lib/domain/units/quantity'
import { type Bench, perfectReadings, type TrueString } from '@/prisma/demo/perfect-readings'
import { steelContext } from '@/test/support/steel-context'

const read = <Q extends number>(si: Q) => ({ typed: '', unit: '', si })

const bench = (change: Partial<Bench> = {}): Bench => ({
  celsius: 20,
  gravity: 9.8143,
  hangingMass: 7.4,
  hangingLength: 0.3,
  reckonedMassPerMetre: 397.8e-6,
  pull: 0,
  span: 0.648,
  endCondition: 'knife',
  cutLength: 0.5,
  weighedState: 'slack',
  ...change,
})

function sheetOf(string: TrueString, on: Bench): SpecimenSheet {
  const { cutMass, diameter, frequency } = perfectReadings(string, on)
  return {
    diameters: [
      { position: 1, direction: 'a', value: read(metres(diameter)) },
      { position: 1, direction: 'b', value: read(metres(diameter)) },
    ],
    weighedState: on.weighedState,
    cutLength: read(metres(on.cutLength)),
    cutMass: read(kilograms(cutMass)),
    load: { kind: 'weights', hanger: 'H-01', weights: ['W-05', 'W-02'] },
    span: read(metres(on.span)),
    frequencies: [read(hertz(frequency))],
    temperature: read(degreesCelsius(on.celsius)),
    keptDoubts: [],
  }
}

/** The specification of a wound string; the rest of the works as for plain steel. */
const woundContext = (core: Core, density: number): EvaluationContext => {
  const context = steelContext()
  const target = kilogramsPerCubicMetre(density)
  return {
    ...context,
    specification: {
      ...context.specification,
      core,
      effectiveDensity: { ...context.specification.effectiveDensity, target },
    },
  }
}

const nylonContext = (modulus: number): EvaluationContext => {
  const { material: steel, ...context } = steelContext()
  const { thermalExpansion: _, ...material } = steel
  const at = (value: number) => kilogramsPerCubicMetre(value)
  return {
    ...context,
    material: {
      ...material,
      kind: 'polymer',
      density: { value: at(1140), low: at(1130), high: at(1150) },
      youngsModulus: { value: pascals(modulus), low: pascals(0.9 * modulus), high: pascals(1.1 * modulus) },
    },
  }
}

const relative = (value: number | undefined, truth: number): number =>
  Math.abs((value ?? Number.NaN) / truth - 1)

describe('evaluateSpecimen(sheet, context) of a wound string', () => {
  it('finds the true mass per metre by both routes, whatever core, ends and room', () => {
    fc.assert(
      fc.property(
        fc.record({
          core: fc.record({
            shape: fc.constantFrom('round' as const, 'hex' as const),
            size: fc.double({ min: 0.3e-3, max: 0.7e-3, noNaN: true }).map(metres),
          }),
          diameter: fc.double({ min: 0.9e-3, max: 2.4e-3, noNaN: true }),
          density: fc.double({ min: 6300, max: 7600, noNaN: true }),
          end: fc.constantFrom('pinned' as const, 'knife' as const, 'clamped' as const),
          celsius: fc.double({ min: 12, max: 30, noNaN: true }),
        }),
        ({ core, density, diameter, celsius, end }) => {
          const mass = (density * Math.PI * diameter * diameter) / 4
          const string = { diameter, massPerMetre: mass, core, modulus: 206e9, expansion: 11.5e-6, density }
          const context = woundContext(core, density)
          const { rig } = context
          const { results } = evaluateSpecimen(sheetOf(string, bench({ celsius, endCondition: end })), {
            ...context,
            ...(rig ? { rig: { ...rig, endCondition: end } } : {}),
          })
          expect(relative(results.massPerMetreWeighed?.value, mass)).toBeLessThan(1e-9)
          expect(relative(results.massPerMetreSounded?.value, mass)).toBeLessThan(1e-9)
          expect(Math.abs(results.closure?.value ?? 1)).toBeLessThan(1e-9)
          expect(relative(results.effectiveDensity?.value, density)).toBeLessThan(1e-9)
        },
      ),
    )
  })

  it('corrects by its core, as the reference page says for a core of 0.40 mm under 0.33 mm of bronze', () => {
    // Physics of strings, table of the order of corrections, column W2: stretch +0.279 %, knife edge +0.595 %,
    // air −0.032 %, buoyancy of the piece −0.0012 %; E = 205 GPa, µ = 6.3071 g/m, D = 1.06 mm, T = 71.94 N.
    const core = { shape: 'round', size: metres(0.4e-3) } as const
    const density = 7147.02
    const string = { diameter: 1.06e-3, massPerMetre: 6.307058e-3, core, modulus: 205e9, density }
    const known = woundContext(core, density)
    const youngsModulus = { value: pascals(205e9), low: pascals(200e9), high: pascals(210e9) }
    const { corrections, steps } = evaluateSpecimen(sheetOf(string, bench({ hangingMass: 7.4 })), {
      ...known,
      material: { ...known.material, youngsModulus },
    })
    const force = steps.force ?? Number.NaN
    const sizes = Object.fromEntries(corrections.map((one) => [one.id, one.relative]))
    expect(sizes.stretch).toBeNear(0.00279 * (force / 71.94), { absolute: 6e-6 })
    // √B goes with 1/√F.
    expect(sizes['end-condition']).toBeNear(0.00595 * Math.sqrt(71.94 / force), { absolute: 2e-5 })
    expect(sizes.air).toBeNear(-0.00032, { absolute: 1e-5 })
    expect(sizes['specimen-buoyancy']).toBeNear(1.2 * (1 / 7147 - 1 / 8000), { absolute: 1e-7 })
  })

  it('is loaded by the breaking load of its core alone', () => {
    const core = { shape: 'hex', size: metres(0.4e-3) } as const
    const { steps } = evaluateSpecimen(
      sheetOf({ diameter: 1.06e-3, massPerMetre: 6.3e-3, core, modulus: 206e9, density: 7147 }, bench()),
      woundContext(core, 7147),
    )
    // 2668 MPa of this context’s steel over (√3/2) s².
    expect(steps.breakingLoad).toBeNear(2668e6 * (Math.sqrt(3) / 2) * 0.4e-3 ** 2, { relative: 1e-12 })
  })
})

describe('soundedFundamental of wound strings', () => {
  it('settles for every mass, also where the last bits of its steps go round among neighbours', () => {
    const core = { shape: 'round', size: metres(0.36e-3) } as const
    for (let step = 0; step < 3000; step += 1) {
      const massPerMetre = 3.6e-3 * (1 + step * 1.7e-5)
      const string = { diameter: 0.81e-3, massPerMetre, core, modulus: 206e9, density: 7140 }
      expect(perfectReadings(string, bench({ hangingMass: 7.5 })).frequency).toBeGreaterThan(100)
    }
  })
})

describe('evaluateSpecimen(sheet, context) of nylon cut at marks made under the load', () => {
  it('finds the true mass per metre, though it stretches by several per cent', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0.5e-3, max: 1.1e-3, noNaN: true }),
        fc.double({ min: 3e9, max: 8e9, noNaN: true }),
        fc.double({ min: 12, max: 30, noNaN: true }),
        (diameter, modulus, celsius) => {
          const mass = (1140 * Math.PI * diameter * diameter) / 4
          const string = { diameter, massPerMetre: mass, modulus, density: 1140 }
          const on = bench({ celsius, weighedState: 'marked', cutLength: 0.648 })
          const { results } = evaluateSpecimen(sheetOf(string, on), nylonContext(modulus))
          expect(relative(results.massPerMetreWeighed?.value, mass)).toBeLessThan(1e-9)
          expect(relative(results.massPerMetreSounded?.value, mass)).toBeLessThan(1e-9)
          expect(Math.abs(results.closure?.value ?? 1)).toBeLessThan(1e-9)
        },
      ),
    )
  })

  it('closes whatever is thought of its modulus: both routes stretch alike', () => {
    const mass = (1140 * Math.PI * 0.7e-3 ** 2) / 4
    const string = { diameter: 0.7e-3, massPerMetre: mass, modulus: 5e9, density: 1140 }
    const wrong = nylonContext(6.5e9)
    const marked = sheetOf(string, bench({ weighedState: 'marked', cutLength: 0.648 }))
    const slack = sheetOf(string, bench())
    // Only the ends, which bend by the modulus, are left: 0.26 % of mass at 5 GPa, with √E.
    expect(Math.abs(evaluateSpecimen(marked, wrong).results.closure?.value ?? 1)).toBeLessThan(5e-4)
    expect(Math.abs(evaluateSpecimen(slack, wrong).results.closure?.value ?? 0)).toBeGreaterThan(5e-3)
  })
})
