import type { Actor } from '@/lib/access/actor'
import { permit } from '@/lib/access/permit'
import { database } from '@/lib/data/database'
import { loadEquipment } from '@/lib/data/evaluation-facts'
import type { GaugeRow } from '@/lib/data/gauges'
import { findLotByCode, type LotRow, listLotRows } from '@/lib/data/lots'
import { listPersonNames } from '@/lib/data/people-names'
import { listProductSignals } from '@/lib/data/signals'
import { loadSpecimens } from '@/lib/data/specimens'
import { problem } from '@/lib/domain/errors'
import type { EvaluationContext } from '@/lib/domain/metrology/evaluation'
import type { SpecimenSheet } from '@/lib/domain/metrology/sheet'
import { currentSheet } from '@/lib/domain/record/current-sheet'
import { contextFor } from '@/lib/domain/record/evaluation-facts'
import type { EquipmentCodes } from '@/lib/domain/record/reading'
import { loadFacts } from './evaluation-facts'
import { type WorksFacts, worksFactsOf } from './get-works'
import { type SignalView, signalViews } from './signal-views'

export interface BenchGauge {
  readonly code: string
  readonly name: string
  readonly dueAt: number | undefined
}

/** Everything the bench needs to measure a lot: the same context that a stored evaluation will rest on. */
export interface BenchFacts {
  readonly lot: LotRow
  readonly makerName: string | undefined
  readonly materialName: string
  readonly revision: number
  readonly works: WorksFacts
  readonly context: EvaluationContext
  readonly rigName: string | undefined
  readonly equipment: EquipmentCodes
  readonly gauges: readonly BenchGauge[]
  /** Specimens that are stored, with the sheet in force and when it was recorded. */
  readonly specimens: readonly {
    readonly number: number
    readonly sheet: SpecimenSheet
    readonly storedAt: number
  }[]
  /** Unanswered signals of the product, newest first. */
  readonly openSignals: readonly SignalView[]
}

const emptySheet: SpecimenSheet = { diameters: [], weighedState: 'slack', frequencies: [], keptDoubts: [] }

/** @throws LedgerlineError not-permitted, not-found, not-ready while the works is not set up */
export async function getBench(actor: Actor | undefined, lotCode: string): Promise<BenchFacts> {
  permit(actor, 'readings.record')
  const { read } = database()
  const lot = await findLotByCode(read, lotCode)
  if (!lot)
    throw problem('not-found', `There is no lot ${lotCode}.`, { mend: 'Scan it again, or open it first.' })
  const known = await loadEquipment(read)
  const { facts, revision, works } = await loadFacts(read, lot.specificationRevisionId, known)
  const rig = known.rigs.find((one) => one.code === facts.specification.plan.rigCode)
  const code = (text: string | undefined): string | undefined => (text ? text : undefined)
  const equipment: EquipmentCodes = {
    rig: rig?.code,
    micrometer: code(rig?.micrometerCode),
    balance: code(rig?.balanceCode),
    rule: code(rig?.ruleCode),
    counter: code(rig?.counterCode),
  }
  const sheet: SpecimenSheet = rig
    ? { ...emptySheet, load: { kind: 'weights', hanger: rig.hangerCode, weights: rig.weightCodes } }
    : emptySheet
  const gauge = (one: string | undefined): readonly GaugeRow[] =>
    known.gauges.filter(({ code: own }) => own === one)
  const used = [equipment.micrometer, equipment.balance, equipment.rule, equipment.counter].flatMap(gauge)
  const worksFacts = worksFactsOf(works)
  const signals = (await listProductSignals(read, lot.product.id)).filter((one) => one.state === 'open')
  const specimens = (await loadSpecimens(read, lot.id, known)).map(({ number, readings }) => ({
    number,
    sheet: currentSheet(readings).sheet,
    storedAt: Math.max(...readings.map((one) => one.recordedAt)),
  }))
  return {
    lot,
    makerName:
      lot.makerId === undefined ? undefined : (await listPersonNames(read, [lot.makerId])).get(lot.makerId),
    materialName: revision.material.name,
    revision: revision.number,
    works: worksFacts,
    context: contextFor(facts, { sheet, equipment }),
    rigName: rig?.name,
    equipment,
    gauges: used.map(({ calibrationDueAt, code: own, name }) => ({
      code: own,
      name,
      dueAt: calibrationDueAt,
    })),
    specimens,
    openSignals: await signalViews(read, signals, worksFacts),
  }
}

export interface LotToMeasure {
  readonly code: string
  readonly productName: string
  readonly machine: string | undefined
  readonly madeAt: number
  readonly specimens: number
}

/** Lots that are being measured, newest first. */
export async function listLotsToMeasure(actor: Actor | undefined): Promise<readonly LotToMeasure[]> {
  permit(actor, 'readings.record')
  const rows = await listLotRows(database().read, { states: ['measuring'] }, { skip: 0, take: 50 })
  return rows.map((row) => ({
    code: row.code,
    productName: row.product.name,
    machine: row.machine?.name,
    madeAt: row.madeAt,
    specimens: row.specimenCount,
  }))
}
