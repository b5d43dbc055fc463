import { evaluateSpecimen } from '@/lib/domain/metrology/evaluate-specimen'
import type { EvaluationContext, GaugeFacts, SpecimenEvaluation } from '@/lib/domain/metrology/evaluation'
import { type LotSummaries, summariseSpecimens } from '@/lib/domain/record/summarise-specimens'
import type { MaterialBody } from '@/lib/domain/strings/material'
import { handbookMaterials } from '@/lib/domain/strings/materials-table'
import { localGravity, NORMAL_GRAVITY_RELATIVE_U } from '@/lib/domain/strings/normal-gravity'
import { alderNylon } from '@/prisma/demo/alder'
import { demoGauges, demoWeights, demoWorks, rigOf } from '@/prisma/demo/equipment'
import { type DemoProduct, specificationFor } from '@/prisma/demo/product'
import { productOf } from '@/prisma/demo/products'
import { readLot } from '@/prisma/demo/readings'
import { type DemoSchedule, demoSchedule } from '@/prisma/demo/schedule'

export interface SimulatedLot {
  readonly lot: DemoSchedule
  readonly product: DemoProduct
  readonly evaluations: readonly SpecimenEvaluation[]
  readonly summaries: LotSummaries
}

const gravity = localGravity(demoWorks.latitudeDegrees, demoWorks.heightMetres)

function gaugeFacts(code: string): GaugeFacts {
  const found = demoGauges.find((one) => one.code === code)
  if (!found) throw new Error(`The demo has no gauge ${code}.`)
  return { ...found, uRelative: found.uRelative ?? 0, error: 0 }
}

function materialOf(code: string): MaterialBody {
  const found = [...handbookMaterials, alderNylon].find((one) => one.code === code)
  if (!found) throw new Error(`There is no material ${code}.`)
  return found.body
}

/** What the demo works knows when it evaluates a lot. */
export function demoContext(product: DemoProduct, lot: DemoSchedule): EvaluationContext {
  const rig = rigOf(lot.rig)
  return {
    gravity: { value: gravity, u: gravity * NORMAL_GRAVITY_RELATIVE_U },
    air: { celsius: demoWorks.airTemperatureCelsius, pascals: 101325, humidity: 0.5 },
    material: materialOf(product.materialCode),
    specification: specificationFor(product, lot.index),
    rig: {
      ...rig,
      span: { value: rig.spanMetres, u: rig.uSpanMetres },
      hangingLength: rig.hangingLengthMetres,
    },
    weights: demoWeights.map(({ code, kind, conventionalMass, uMass }) => ({
      code,
      kind,
      mass: { value: conventionalMass, u: uMass },
    })),
    micrometer: gaugeFacts(lot.micrometer),
    balance: gaugeFacts(rig.balanceCode),
    rule: gaugeFacts(rig.ruleCode),
    counter: gaugeFacts(rig.counterCode),
  }
}

/**
 * The demo works without a database: generator → `evaluateSpecimen` → summaries, lot by lot in the order in
 * which they were made. Seed 0 is the demo itself; others give works of the same kind with other luck.
 */
export const simulateDemo = (
  seed = 0,
  wanted: (lot: DemoSchedule) => boolean = () => true,
): readonly SimulatedLot[] =>
  demoSchedule()
    .filter(wanted)
    .map((lot) => {
      const product = productOf(lot.productCode)
      const context = demoContext(product, lot)
      const evaluations = readLot(product, lot, seed).map((sheet) => evaluateSpecimen(sheet, context))
      const summaries = summariseSpecimens(
        evaluations.map(({ results }, index) => ({ number: index + 1, results })),
      )
      return { lot, product, evaluations, summaries }
    })
