import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { CharacteristicId } from '@/lib/domain/metrology/characteristics'
import { closureVerdict } from '@/lib/domain/metrology/closure'
import { evaluateSpecimen } from '@/lib/domain/metrology/evaluate-specimen'
import { evaluationInputs } from '@/lib/domain/metrology/evaluation-inputs'
import { measurementModel } from '@/lib/domain/metrology/measurement-model'
import { modelFacts } from '@/lib/domain/metrology/model-facts'
import type { SpecimenSheet } from '@/lib/domain/metrology/sheet'
import { airDensity } from '@/lib/domain/strings/air-density'
import { airViscosity } from '@/lib/domain/strings/air-viscosity'
import { deadWeightForce, hangingStringForce } from '@/lib/domain/strings/dead-weight-force'
import { solidWireMassPerMetre } from '@/lib/domain/strings/round-section'
import { soundedFundamental } from '@/lib/domain/strings/sounding-forward'
import { plainWireAxialStiffness, plainWireBendingStiffness } from '@/lib/domain/strings/stiffness'
import {
  degreesCelsius,
  hertz,
  kilograms,
  kilogramsPerCubicMetre,
  kilogramsPerMetre,
  metres,
  metresPerSecondSquared,
  newtons,
  pascals,
  perKelvin,
} from '@/lib/domain/units/quantity'
import { seededNormal, seededUniform } from '@/test/support/seeded-random'
import { steelSheet, typedHertz, typedMass } from '@/test/support/sheets'
import { steelContext } from '@/test/support/steel-context'

/**
 * What a perfect bench would read at t °C on a true wire of diameter d and density ρ at 20 °C, with gauge, rule
 * and rig of steel: the chain backwards.
 */
function perfectSheet(
  diameter: number,
  density: number,
  end: 'pinned' | 'knife' | 'clamped',
  celsius = 20,
  expansion = 11.5e-6,
): SpecimenSheet {
  const context = steelContext()
  const steel = 1 + 11.5e-6 * (celsius - 20)
  const grown = 1 + expansion * (celsius - 20)
  const air = { temperature: degreesCelsius(celsius), pressure: pascals(101325), humidity: 0.5 }
  const airRho = airDensity(air)
  const gravity = metresPerSecondSquared(context.gravity.value)
  const modulus = context.material.youngsModulus.value
  const d = metres(diameter)
  const mass = solidWireMassPerMetre(d, kilogramsPerCubicMetre(density))
  const weight = deadWeightForce(kilograms(7.4), gravity, airRho)
  const force = newtons(
    weight + hangingStringForce(context.specification.massPerMetre.target, metres(0.3), gravity),
  )
  const frequency = soundedFundamental(
    {
      force,
      span: metres(0.648 * steel),
      endCondition: end,
      axialStiffness: plainWireAxialStiffness(modulus, d),
      bendingStiffness: plainWireBendingStiffness(modulus, d),
      outerDiameter: d,
      air: { density: airRho, viscosity: airViscosity(air.temperature, airRho) },
    },
    kilogramsPerMetre(mass / grown),
  )
  const cut = ((mass / grown) * 0.5 * steel * (1 - airRho / 7850)) / (1 - airRho / 8000)
  const value = {
    typed: '',
    unit: 'mm',
    si: metres(diameter / (1 - (expansion - 11.5e-6) * (celsius - 20))),
  }
  return steelSheet({
    diameters: [1, 2, 3].flatMap((position) => [
      { position, direction: 'a' as const, value },
      { position, direction: 'b' as const, value },
    ]),
    cutLength: { typed: '500', unit: 'mm', si: metres(0.5) },
    cutMass: { typed: '', unit: 'mg', si: kilograms(cut) },
    span: { typed: '648', unit: 'mm', si: metres(0.648) },
    frequencies: [{ typed: '', unit: 'Hz', si: hertz(frequency) }],
    temperature: { typed: '', unit: '°C', si: degreesCelsius(celsius) },
  })
}

describe('evaluateSpecimen(sheet, context)', () => {
  it('finds the true string again: both routes, closure zero, density', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 230e-6, max: 340e-6, noNaN: true }),
        fc.double({ min: 7800, max: 7900, noNaN: true }),
        fc.constantFrom('pinned', 'knife', 'clamped'),
        fc.double({ min: 10, max: 32, noNaN: true }),
        fc.constantFrom(11.5e-6, 18e-6),
        (diameter, density, end, celsius, expansion) => {
          const { material, rig } = steelContext()
          const context = steelContext({
            rig: rig && { ...rig, endCondition: end },
            material: {
              ...material,
              thermalExpansion: {
                value: perKelvin(expansion),
                low: perKelvin(expansion),
                high: perKelvin(expansion),
              },
            },
          })
          const sheet = perfectSheet(diameter, density, end, celsius, expansion)
          const { results } = evaluateSpecimen(sheet, context)
          const mass = (density * Math.PI * diameter * diameter) / 4
          expect(Math.abs((results.massPerMetreSounded?.value ?? 0) / mass - 1)).toBeLessThan(1e-12)
          expect(Math.abs((results.massPerMetreWeighed?.value ?? 0) / mass - 1)).toBeLessThan(1e-12)
          expect(Math.abs(results.closure?.value ?? 1)).toBeLessThan(2e-12)
          expect(Math.abs((results.effectiveDensity?.value ?? 0) / density - 1)).toBeLessThan(1e-12)
        },
      ),
    )
  })

  it('would show a false disagreement without the corrections: they sum to about 0.9 %', () => {
    const { corrections, results } = evaluateSpecimen(perfectSheet(254e-6, 7850, 'knife'), steelContext())
    const sizes = Object.fromEntries(corrections.map((one) => [one.id, one.relative]))
    // Sizes for such a string from the reference page, physics of strings: stretch +0.7 %, knife +0.23 %, air −0.045 %.
    expect(sizes.stretch).toBeCloseTo(0.00696, 4)
    expect(sizes['end-condition']).toBeCloseTo(0.0023, 3)
    expect(sizes.air).toBeCloseTo(-0.00044, 4)
    expect(sizes['load-buoyancy']).toBeCloseTo(-0.00015, 5)
    expect(sizes['hanging-string']).toBeGreaterThan(0)
    const uClosure = results.closure?.u ?? 1
    expect((0.00696 + 0.0023 - 0.00044) / uClosure).toBeGreaterThan(4)
  })

  it('gives partial results for a partial sheet and says what is missing', () => {
    const sheet: SpecimenSheet = { diameters: [], weighedState: 'slack', frequencies: [], keptDoubts: [] }
    const none = evaluateSpecimen(sheet, steelContext())
    expect(none.results).toEqual({})
    expect(none.missing).toEqual([
      'No diameter has been read.',
      'The piece has not been weighed.',
      'The length of the piece is missing.',
      'The string has not been sounded.',
      'What hangs is not said.',
    ])
    const weighed = evaluateSpecimen({ ...steelSheet(), frequencies: [] }, steelContext())
    expect(Object.keys(weighed.results)).toEqual([
      'diameter',
      'ovality',
      'massPerMetreWeighed',
      'densityCheckWeighed',
      'effectiveDensity',
      'tension',
      'pitchError',
    ])
  })

  it('names a weight that is not registered instead of leaving it out of the load', () => {
    const sheet = steelSheet({ load: { kind: 'weights', hanger: 'H-01', weights: ['W-99'] } })
    const { missing, results } = evaluateSpecimen(sheet, steelContext())
    expect(results.massPerMetreSounded).toBeUndefined()
    expect(missing).toContain('Not registered: W-99.')
  })

  it('needs the load to bring a length marked under load to the unloaded state', () => {
    const marked = evaluateSpecimen(steelSheet({ weighedState: 'marked' }), steelContext())
    const slack = evaluateSpecimen(steelSheet(), steelContext())
    const ratio =
      (marked.results.massPerMetreWeighed?.value ?? 0) / (slack.results.massPerMetreWeighed?.value ?? 1)
    expect(ratio - 1).toBeCloseTo(marked.steps.strain ?? 0, 12)
    const without = evaluateSpecimen(steelSheet({ weighedState: 'marked', load: undefined }), steelContext())
    expect(without.missing).toContain('The load under which it was marked is missing.')
  })

  it('takes a piece marked at both edges to be as long as the span, with the span’s uncertainty in both routes', () => {
    const marked = steelSheet({ weighedState: 'marked', cutLength: undefined, cutMass: typedMass('256.0') })
    const { budgets, results, steps } = evaluateSpecimen(marked, steelContext())
    const airRho = steps.airDensity ?? 0
    const buoyancy = (1 - airRho / 8000) / (1 - airRho / 7850)
    const expected = ((256e-6 * buoyancy) / 0.648) * (1 + (steps.strain ?? 0))
    expect((results.massPerMetreWeighed?.value ?? 0) / expected - 1).toBeNear(0, { absolute: 1e-12 })
    const span = (id: CharacteristicId) =>
      budgets[id]?.find((line) => line.input === 'Span of rig RIG-2')?.contribution ?? 0
    const relative = 6e-5 / 0.648
    expect(span('massPerMetreWeighed')).toBeNear(relative * expected, { relative: 1e-4 })
    // −1 by weighing, −2 by sounding: one of them is left in the closure, and the ends’ 0.2 % goes with 1/L.
    expect(span('closure')).toBeNear(relative, { relative: 5e-3 })
  })

  it('refuses in words what no string can sound, and keeps the other results', () => {
    const high = evaluateSpecimen(steelSheet({ frequencies: [typedHertz('40000')] }), steelContext())
    expect(high.missing.at(-1)).toMatch(/^The air alone would weigh/)
    expect(high.results.massPerMetreWeighed).toBeDefined()
    const light = { typed: '0.01', unit: 'N', si: newtons(0.01) }
    const bar = evaluateSpecimen(steelSheet({ load: { kind: 'force', value: light } }), steelContext())
    expect(bar.missing.at(-1)).toMatch(/^So thick a string/)
    expect(bar.results.massPerMetreSounded).toBeUndefined()
  })

  it('never gives NaN and never throws, whatever finite readings are typed', () => {
    const within = (min: number, max: number) =>
      fc.double({ min: Math.log(min), max: Math.log(max), noNaN: true }).map((x) => Math.exp(x))
    const maybe = <T>(one: fc.Arbitrary<T>) => fc.option(one, { nil: undefined })
    fc.assert(
      fc.property(
        fc.record({
          d: fc.array(within(1e-5, 0.02), { maxLength: 6 }),
          length: maybe(within(1e-3, 20)),
          mass: maybe(within(1e-7, 2)),
          force: maybe(within(0.01, 5000)),
          span: maybe(within(0.01, 10)),
          plucks: fc.array(within(5, 20_000), { maxLength: 4 }),
          celsius: maybe(fc.double({ min: -20, max: 60, noNaN: true })),
          marked: fc.boolean(),
        }),
        ({ celsius, d, force, length, marked, mass, plucks, span }) => {
          const value = <Q extends number>(si: Q, unit: string) => ({ typed: '', unit, si })
          const sheet: SpecimenSheet = {
            diameters: d.map((si, index) => ({
              position: 1 + Math.floor(index / 2),
              direction: index % 2 === 0 ? 'a' : 'b',
              value: value(metres(si), 'm'),
            })),
            weighedState: marked ? 'marked' : 'slack',
            ...(length ? { cutLength: value(metres(length), 'm') } : {}),
            ...(mass ? { cutMass: value(kilograms(mass), 'kg') } : {}),
            ...(force ? { load: { kind: 'force', value: value(newtons(force), 'N') } } : {}),
            ...(span ? { span: value(metres(span), 'm') } : {}),
            frequencies: plucks.map((si) => value(hertz(si), 'Hz')),
            ...(celsius === undefined ? {} : { temperature: value(degreesCelsius(celsius), '°C') }),
            keptDoubts: [],
          }
          const evaluation = evaluateSpecimen(sheet, steelContext())
          const numbers = [
            ...Object.values(evaluation.results).flatMap(({ value: v, u, uCommon }) => [v, u, uCommon]),
            ...Object.values(evaluation.budgets).flatMap((lines) => lines.map((line) => line.contribution)),
            ...evaluation.corrections.flatMap((one) => [one.relative, one.amount, one.cents ?? 0]),
            ...Object.values(evaluation.steps),
          ]
          expect(numbers.filter((x) => !Number.isFinite(x))).toEqual([])
          expect(evaluation.missing.filter((text) => !/^[A-Z].*\.$/.test(text))).toEqual([])
        },
      ),
      { numRuns: 300 },
    )
  })

  it('takes off the known error of a micrometer', () => {
    const { micrometer } = steelContext()
    const off = steelContext({ micrometer: micrometer && { ...micrometer, error: 1.5e-6 } })
    const change =
      (evaluateSpecimen(steelSheet(), off).results.diameter?.value ?? 0) -
      (evaluateSpecimen(steelSheet(), steelContext()).results.diameter?.value ?? 0)
    expect(change).toBeCloseTo(-1.5e-6, 12)
  })

  it('takes the median of three plucks, so that one bad pluck does not move it', () => {
    const plucks = ['328.50', '328.52', '331.00'].map(typedHertz)
    const { steps } = evaluateSpecimen(steelSheet({ frequencies: plucks }), steelContext())
    expect(steps.frequency).toBe(328.52)
  })

  it('catches an octave: closure is open by ln 4', () => {
    const octave = evaluateSpecimen(steelSheet({ frequencies: [typedHertz('164.25')] }), steelContext())
    const right = evaluateSpecimen(steelSheet({ frequencies: [typedHertz('328.50')] }), steelContext())
    const change = (octave.results.closure?.value ?? 0) - (right.results.closure?.value ?? 0)
    expect(change).toBeCloseTo(-Math.log(4), 2)
    expect(closureVerdict(octave.results.closure?.value ?? 0, octave.results.closure?.u ?? 1)).toBe('open')
  })

  it('gives the same bits for the same content read back from JSON', () => {
    const before = evaluateSpecimen(steelSheet(), steelContext())
    const after = evaluateSpecimen(
      JSON.parse(JSON.stringify(steelSheet())),
      JSON.parse(JSON.stringify(steelContext())),
    )
    expect(JSON.stringify(after)).toBe(JSON.stringify(before))
  })

  it('keeps the sizes of a workshop budget', () => {
    const { results } = evaluateSpecimen(steelSheet(), steelContext())
    const relative = (id: CharacteristicId) => (results[id]?.u ?? 0) / (results[id]?.value ?? 1)
    // Typical budgets of the physics page, common practice, no source: weighed 4e-4 to 6e-4; sounded 1.4e-3
    // with the end unknown from pinned to clamped, 5e-4 with two spacings; density dominated by diameter.
    expect(relative('massPerMetreWeighed')).toBeGreaterThan(3e-4)
    expect(relative('massPerMetreWeighed')).toBeLessThan(6e-4)
    expect(relative('massPerMetreSounded')).toBeGreaterThan(1.2e-3)
    expect(relative('massPerMetreSounded')).toBeLessThan(1.6e-3)
    const { rig } = steelContext()
    const spaced = evaluateSpecimen(
      steelSheet(),
      steelContext({ rig: rig && { ...rig, uEndRelative: 2e-4 } }),
    )
    const u = (spaced.results.massPerMetreSounded?.u ?? 0) / (spaced.results.massPerMetreSounded?.value ?? 1)
    expect(u).toBeLessThan(6e-4)
    expect(relative('effectiveDensity')).toBeCloseTo(4.8e-3, 3)
  })

  it('keeps the common part below the whole, and both above zero', () => {
    const { results } = evaluateSpecimen(steelSheet(), steelContext())
    for (const one of Object.values(results)) {
      expect(one.uCommon).toBeLessThanOrEqual(one.u)
      expect(one.u).toBeGreaterThan(0)
    }
  })

  it('agrees with Monte Carlo within 2 %', () => {
    const sheet = steelSheet({ frequencies: ['328.50', '328.55'].map(typedHertz) })
    const context = steelContext()
    const facts = modelFacts(sheet, context)
    const inputs = evaluationInputs(facts, measurementModel(facts, {}).steps)
    const normal = seededNormal(20)
    const uniform = seededUniform(21)
    const trials = 20_000
    const sums = new Map<CharacteristicId, { sum: number; squares: number; centre: number }>()
    const { results } = evaluateSpecimen(sheet, context)
    for (let trial = 0; trial < trials; trial += 1) {
      const drawn = Object.fromEntries(
        inputs.map((one) => [
          one.id,
          one.value +
            one.u * (one.distribution === 'rectangular' ? (uniform() * 2 - 1) * Math.sqrt(3) : normal()),
        ]),
      )
      const outcome = measurementModel(facts, drawn).results
      for (const id of Object.keys(outcome) as CharacteristicId[]) {
        const centre = results[id]?.value ?? 0
        const departure = (outcome[id] ?? 0) - centre
        const at = sums.get(id) ?? { sum: 0, squares: 0, centre }
        sums.set(id, { centre, sum: at.sum + departure, squares: at.squares + departure * departure })
      }
    }
    // Ovality is the size of a difference: it bends at zero, and its budget says no more than resolution.
    for (const [id, { sum, squares }] of sums) {
      if (id === 'ovality') continue
      const deviation = Math.sqrt((squares - (sum * sum) / trials) / (trials - 1))
      expect(Math.abs(deviation / (results[id]?.u ?? 0) - 1), id).toBeLessThan(0.02)
    }
    expect(sums.size).toBe(10)
  })
})
