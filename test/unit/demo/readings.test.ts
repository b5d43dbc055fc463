import { describe, expect, it } from 'vitest'
import { normalisedError } from '@/lib/domain/metrology/closure'
import { evaluateSpecimen } from '@/lib/domain/metrology/evaluate-specimen'
import type { EvaluationContext } from '@/lib/domain/metrology/evaluation'
import { localGravity, NORMAL_GRAVITY_RELATIVE_U } from '@/lib/domain/strings/normal-gravity'
import { demoGauges, demoRig, demoWeights, demoWorks } from '@/prisma/demo/equipment'
import { type DemoProduct, demoProducts } from '@/prisma/demo/products'
import { readLot } from '@/prisma/demo/readings'
import { demoSchedule, inZeroWeek, WIDE_DIE, WORN_DIE } from '@/prisma/demo/schedule'
import { steelContext } from '@/test/support/steel-context'

const gauge = (code: string) => {
  const found = demoGauges.find((one) => one.code === code)
  if (!found) throw new Error(code)
  return { uRelative: 0, error: 0, ...found }
}

const gravity = localGravity(demoWorks.latitudeDegrees, demoWorks.heightMetres)

const contextOf = (product: DemoProduct): EvaluationContext => ({
  ...steelContext(),
  gravity: { value: gravity, u: gravity * NORMAL_GRAVITY_RELATIVE_U },
  specification: product.specification,
  rig: {
    ...demoRig,
    span: { value: demoRig.spanMetres, u: demoRig.uSpanMetres },
    hangingLength: demoRig.hangingLengthMetres,
  },
  weights: demoWeights.map(({ code, kind, conventionalMass, uMass }) => ({
    code,
    kind,
    mass: { value: conventionalMass, u: uMass },
  })),
  micrometer: gauge('M-14'),
  balance: gauge('B-03'),
  rule: gauge('R-02'),
  counter: gauge('F-02'),
})

const lots = demoSchedule().map((lot) => {
  const product = demoProducts.find((one) => one.code === lot.productCode)
  if (!product) throw new Error(lot.productCode)
  const evaluations = readLot(product, lot).map((sheet) => evaluateSpecimen(sheet, contextOf(product)))
  const mean = (id: 'diameter' | 'massPerMetreWeighed' | 'effectiveDensity'): number =>
    evaluations.reduce((sum, one) => sum + (one.results[id]?.value ?? Number.NaN), 0) / evaluations.length
  return { lot, product, evaluations, mean }
})

const average = (values: readonly number[]): number =>
  values.reduce((sum, one) => sum + one, 0) / values.length

describe('demo works', () => {
  it('has 340 lots of the Larch family in order, on 300 working days up to 27 November 2026', () => {
    expect(lots).toHaveLength(340)
    expect(new Set(lots.map(({ lot }) => lot.code)).size).toBe(340)
    const days = lots.map(({ lot }) => new Date(lot.madeAt).getUTCDay())
    expect(days.every((day) => day >= 1 && day <= 5)).toBe(true)
    expect(new Date(lots.at(-1)?.lot.madeAt ?? 0).toISOString().slice(0, 10)).toBe('2026-11-27')
  })

  it('is the same every time', () => {
    const [product] = demoProducts
    const first = demoSchedule().find((lot) => lot.productCode === product?.code)
    if (!product || !first) throw new Error('no lot')
    expect(readLot(product, first)).toEqual(readLot(product, first))
  })

  it('closes on every specimen: no fault between the two routes is buried in this family', () => {
    const errors = lots.flatMap(({ evaluations, lot }) =>
      evaluations.map((one, index) => {
        const closure = one.results.closure
        return {
          where: `${lot.code}/${index + 1}`,
          error: closure ? Math.abs(normalisedError(closure.value, closure.u)) : 9,
        }
      }),
    )
    expect(errors.filter(({ error }) => error > 1)).toEqual([])
    expect(errors).toHaveLength(1700)
  })

  it('wears the die of Larch 254 by 0.05 µm a lot for 70 lots, and goes back with the next die', () => {
    const of254 = lots.filter(({ lot }) => lot.micrometres === 254)
    const mass = (from: number, to: number): number =>
      average(
        of254
          .filter(({ lot }) => lot.index >= from && lot.index < to)
          .map(({ mean }) => mean('massPerMetreWeighed')),
      )
    const start = mass(0, WORN_DIE.from)
    const end = mass(WORN_DIE.from + WORN_DIE.lots - 10, WORN_DIE.from + WORN_DIE.lots)
    // 3.25 µm of 254 at the mean of the last ten lots: 2.56 % of mass per metre.
    expect(end / start - 1).toBeGreaterThan(0.021)
    expect(end / start - 1).toBeLessThan(0.03)
    expect(Math.abs(mass(WORN_DIE.from + WORN_DIE.lots, 160) / start - 1)).toBeLessThan(0.006)
  })

  it('runs nine lots above the mean of those before in diameter and in mass, with the new die of Larch 279', () => {
    const of279 = lots.filter(({ lot }) => lot.micrometres === WIDE_DIE.micrometres)
    for (const id of ['diameter', 'massPerMetreWeighed'] as const) {
      const before = average(of279.slice(0, 25).map(({ mean }) => mean(id)))
      const since = of279.slice(WIDE_DIE.from, 59).map(({ mean }) => mean(id))
      expect(since).toHaveLength(9)
      expect(average(since) / before - 1).toBeGreaterThan(0.002)
    }
  })

  it('shows the micrometer zero week in the density of every product, and not in its mass', () => {
    for (const product of demoProducts) {
      const own = lots.filter(
        (one) =>
          one.product === product && one.lot.dieCode !== WORN_DIE.code && one.lot.dieCode !== WIDE_DIE.code,
      )
      const during = own.filter(({ lot }) => inZeroWeek(lot.day))
      const before = own.filter(({ lot }) => !inZeroWeek(lot.day))
      expect(during.length).toBeGreaterThan(0)
      const density =
        average(during.map(({ mean }) => mean('effectiveDensity'))) /
          average(before.map(({ mean }) => mean('effectiveDensity'))) -
        1
      // −2e/d; lots of one product are few, and the zero wobbles by 0.4 µm a lot.
      const expected = (-2 * 1.5) / product.micrometres
      expect(Math.abs(density - expected)).toBeLessThan(0.0065)
      const massChange =
        average(during.map(({ mean }) => mean('massPerMetreWeighed'))) /
          average(before.map(({ mean }) => mean('massPerMetreWeighed'))) -
        1
      expect(Math.abs(massChange)).toBeLessThan(0.008)
    }
  })
})
