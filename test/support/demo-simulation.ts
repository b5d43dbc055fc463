import { proposeLimits } from '@/lib/domain/control/propose-limits'
import type { Side } from '@/lib/domain/control/rule-point'
import type { CharacteristicId } from '@/lib/domain/metrology/characteristics'
import { evaluateSpecimen } from '@/lib/domain/metrology/evaluate-specimen'
import type { EvaluationContext, GaugeFacts, SpecimenEvaluation } from '@/lib/domain/metrology/evaluation'
import { chartDepartures } from '@/lib/domain/record/chart-departures'
import type { ChartPoint, FrozenLimits } from '@/lib/domain/record/chart-history'
import { chartValue } from '@/lib/domain/record/chart-value'
import { machineDepartures } from '@/lib/domain/record/machine-departures'
import type { RaisedSignal } from '@/lib/domain/record/reconcile-signals'
import { type LotSummaries, summariseSpecimens } from '@/lib/domain/record/summarise-specimens'
import { targetOf } from '@/lib/domain/record/target-of'
import type { MaterialBody } from '@/lib/domain/strings/material'
import { handbookMaterials } from '@/lib/domain/strings/materials-table'
import { localGravity, NORMAL_GRAVITY_RELATIVE_U } from '@/lib/domain/strings/normal-gravity'
import { alderNylon } from '@/prisma/demo/alder'
import { areAlike, defaultCharts } from '@/prisma/demo/default-charts'
import { demoGauges, demoWeights, demoWorks, rigOf } from '@/prisma/demo/equipment'
import { type DemoProduct, specificationFor } from '@/prisma/demo/product'
import { productOf } from '@/prisma/demo/products'
import { readLot } from '@/prisma/demo/readings'
import { type DemoSchedule, demoSchedule } from '@/prisma/demo/schedule'
import type { DemoStory } from '@/prisma/demo/stories'
import { withoutStory } from './demo-switches'

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
 * which they were made. Seed 0 is the demo itself; others give works of the same kind with other luck. With the
 * key of a decoy it is left out of the works, everything else being alike.
 */
export function simulateDemo(
  seed = 0,
  wanted: (lot: DemoSchedule) => boolean = () => true,
  without?: string,
): readonly SimulatedLot[] {
  const off = without === undefined ? undefined : withoutStory(without)
  return demoSchedule()
    .filter(wanted)
    .map((made) => {
      const lot = off?.lot(made) ?? made
      const known = productOf(lot.productCode)
      const product = off?.product(known) ?? known
      const context = demoContext(product, lot)
      const evaluations = readLot(product, lot, seed).map((sheet) => evaluateSpecimen(sheet, context))
      const summaries = summariseSpecimens(
        evaluations.map(({ results }, index) => ({ number: index + 1, results })),
      )
      return { lot, product, evaluations, summaries }
    })
}

/** What the default charts find on simulated lots, as the rules would raise it in the works. */
export interface FoundSignal {
  readonly characteristic: CharacteristicId
  readonly statistic: 'mean' | 'within-lot-sd'
  readonly rule: string
  readonly side: Side
  /** The lot that completed the pattern. */
  readonly lot: string
  readonly members: readonly string[]
  /** Set when several products of the machine make the pattern together. */
  readonly machine: string | undefined
}

/** Signals of all charts of all products and machines; limits are those that quality freezes first. */
export function demoSignals(lots: readonly SimulatedLot[]): readonly FoundSignal[] {
  const ids = new Map(lots.map(({ lot }, index) => [lot.code, index + 1]))
  const codeOf = (id: number): string => lots[id - 1]?.lot.code ?? ''
  const machines = [...new Set(lots.map(({ lot }) => lot.machine))]
  return defaultCharts.flatMap(({ characteristic, statistic }) => {
    const charts = [...new Set(lots.map(({ product }) => product))].map((product, place) => {
      const points = lots
        .filter((one) => one.product === product)
        .flatMap(({ lot, summaries }): ChartPoint[] => {
          const summary = summaries[characteristic]
          const value = summary && chartValue(statistic, summary)
          if (value === undefined) return []
          const target = targetOf(specificationFor(product, lot.index), characteristic, statistic)
          return [
            {
              lotId: ids.get(lot.code) ?? 0,
              code: lot.code,
              madeAt: lot.madeAt,
              value,
              evaluatedAt: lot.measuredAt,
              machineId: machines.indexOf(lot.machine),
              ...(target === undefined ? {} : { target }),
            },
          ]
        })
      const proposal = proposeLimits(
        points
          .slice(0, product.baseline)
          .map(({ code, lotId, value }) => ({ lotId, code, value, n: 5, leftOut: false })),
        statistic,
        false,
        areAlike(product, characteristic) ? true : undefined,
      )
      if (!proposal.ok) throw new Error(proposal.problems[0]?.message)
      const { centre, lower, rules, sigma, upper } = proposal.value
      const target = targetOf(product.specification, characteristic, statistic)
      const set: FrozenLimits = {
        id: place + 1,
        number: 1,
        centre,
        sigma,
        lower,
        upper,
        rules,
        effectiveFrom: 0,
        frozenAt: 0,
        leftOut: [],
        ...(target === undefined ? {} : { target }),
      }
      return { productId: place + 1, points, limitSets: [set] }
    })
    const told =
      (machine: string | undefined) =>
      (signal: RaisedSignal): FoundSignal => ({
        characteristic,
        statistic,
        rule: signal.rule,
        side: signal.side,
        lot: codeOf(signal.lotId),
        members: signal.members.map(codeOf),
        machine,
      })
    return [
      ...charts.flatMap((chart) => chartDepartures(chart).map(told(undefined))),
      ...machines.flatMap((machine, id) => machineDepartures(id, charts).map(told(machine))),
    ]
  })
}

/** Signals of a story’s charts that one of its own lots completes: of a fault on the side to which it moves. */
export function signalsOf(story: DemoStory, signals: readonly FoundSignal[]): readonly FoundSignal[] {
  const own = new Set(story.lots)
  return signals.filter(
    ({ characteristic, lot, side, statistic }) =>
      statistic === story.statistic &&
      story.touches.includes(characteristic) &&
      own.has(lot) &&
      (story.side === undefined || side === story.side),
  )
}

/** The first of a story’s own lots (from 1) at which its chart raises a signal; undefined when none does. */
export function foundAt(story: DemoStory, signals: readonly FoundSignal[]): number | undefined {
  const places = signalsOf(story, signals)
    .filter(({ characteristic }) => characteristic === story.characteristic)
    .map(({ lot }) => story.lots.indexOf(lot) + 1)
  return places.length > 0 ? Math.min(...places) : undefined
}
