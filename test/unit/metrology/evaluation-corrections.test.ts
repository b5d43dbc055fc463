import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { evaluateSpecimen } from '@/lib/domain/metrology/evaluate-specimen'
import type { EvaluationContext, SpecimenEvaluation } from '@/lib/domain/metrology/evaluation'
import { STANDARD_GRAVITY } from '@/lib/domain/strings/standard-gravity'
import { degreesCelsius } from '@/lib/domain/units/quantity'
import { steelSheet, typedHertz } from '@/test/support/sheets'
import { steelContext } from '@/test/support/steel-context'

const product = (evaluation: SpecimenEvaluation, on: string): number =>
  evaluation.corrections.filter((one) => one.on === on).reduce((sum, { relative }) => sum * (1 + relative), 1)

const withErrors = (error: number): EvaluationContext => {
  const { balance, counter, micrometer, rule, ...rest } = steelContext()
  return {
    ...rest,
    ...(balance ? { balance: { ...balance, error: error * 1e-4 } } : {}),
    ...(rule ? { rule: { ...rule, error: error * 0.5 } } : {}),
    ...(counter ? { counter: { ...counter, error: error * 300 } } : {}),
    ...(micrometer ? { micrometer: { ...micrometer, error: error * 1e-4 } } : {}),
  }
}

describe('evaluationCorrections(facts, outcome)', () => {
  it('tells every correction: their product leads from the bare readings to the results', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 5, max: 35, noNaN: true }),
        fc.double({ min: -0.01, max: 0.01, noNaN: true }),
        (celsius, error) => {
          const sheet = steelSheet({
            temperature: { typed: '', unit: '°C', si: degreesCelsius(celsius) },
            frequencies: [typedHertz('328.50')],
          })
          const evaluation = evaluateSpecimen(sheet, withErrors(error))
          const { results, steps } = evaluation
          const bareForce = 7.4 * STANDARD_GRAVITY
          expect(product(evaluation, 'force') * bareForce).toBeNear(steps.force ?? 0, { relative: 1e-12 })
          const bareSounded = (steps.force ?? 0) / (4 * 0.648 * 0.648 * 328.5 * 328.5)
          expect(product(evaluation, 'massPerMetreSounded') * bareSounded).toBeNear(
            results.massPerMetreSounded?.value ?? 0,
            { relative: 1e-12 },
          )
          expect((product(evaluation, 'massPerMetreWeighed') * 199.1e-6) / 0.5).toBeNear(
            results.massPerMetreWeighed?.value ?? 0,
            { relative: 1e-12 },
          )
        },
      ),
    )
  })

  it('has size, sign, cents, formula and source of each', () => {
    const { corrections } = evaluateSpecimen(steelSheet(), steelContext())
    expect(corrections.map((one) => one.id)).toEqual([
      'micrometer-error',
      'diameter-temperature',
      'specimen-buoyancy',
      'weighed-temperature',
      'gravity',
      'load-buoyancy',
      'hanging-string',
      'end-condition',
      'air',
      'stretch',
      'sounded-temperature',
    ])
    for (const one of corrections) {
      expect(one.formula).not.toBe('')
      expect(one.source).toMatch(/\.$/)
      expect(one.cents === undefined, one.id).toBe(one.on === 'diameter')
    }
    const stretch = corrections.find((one) => one.id === 'stretch')
    // 600 log₂(1.00696): 1 % of mass is 8.61 cents.
    expect(stretch?.cents).toBeNear(861 * (stretch?.relative ?? 0), { relative: 0.01 })
  })

  it('says in a sentence where a formula is used outside its range', () => {
    const hot = steelSheet({ temperature: { typed: '35', unit: '°C', si: degreesCelsius(35) } })
    const outside = evaluateSpecimen(hot, steelContext()).corrections.flatMap((one) => one.outside ?? [])
    expect(new Set(outside)).toEqual(
      new Set([
        'More than 10 K from 20 °C: rule, gauge and rig are taken as steel and at one temperature.',
        'The air is outside 10–30 °C, 600–1100 hPa or 80 % humidity: its density is not claimed there.',
      ]),
    )
    const { corrections } = evaluateSpecimen(steelSheet(), steelContext())
    expect(corrections.filter((one) => one.outside)).toEqual([])
  })
})
