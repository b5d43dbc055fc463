import type { Actor } from '@/lib/access/actor'
import { permit } from '@/lib/access/permit'
import { statisticOf } from '@/lib/data/chart-histories'
import { database, type Tx } from '@/lib/data/database'
import { listDispositions } from '@/lib/data/dispositions'
import { listImportBatches, listLedgerOf } from '@/lib/data/ledger-reading'
import { frozenLimitsOf, listLimitSets } from '@/lib/data/limit-sets'
import { listLotMaterials } from '@/lib/data/lot-materials'
import { findLotByCode, type LotRow } from '@/lib/data/lots'
import { listPersonNames } from '@/lib/data/people-names'
import { problem } from '@/lib/domain/errors'
import type { SpecificationBody } from '@/lib/domain/metrology/specification'
import type { DispositionVerb, Proposal } from '@/lib/domain/quality/propose-disposition'
import type { LotAssessment } from '@/lib/domain/record/assess-lot'
import { type ChartedStatistic, limitsAt } from '@/lib/domain/record/chart-history'
import type { LotState } from '@/lib/domain/record/lot-state'
import type { LotMaterialRole, MaterialInKind } from '@/lib/domain/record/material-in'
import type { DecisionEvidence } from './decide-lot'
import type { WorksFacts } from './get-works'
import { loadLot } from './lot-assessment'
import type { SignalView } from './signal-views'
import { type SpecimenView, specimenView } from './specimen-view'

export interface DispositionView {
  readonly number: number
  readonly verb: DispositionVerb
  readonly reason: string
  readonly decidedAt: number
  readonly decidedBy: string | undefined
  readonly current: boolean
  readonly evidenceChanged: boolean
  /** As it was shown when it was decided. */
  readonly proposal: Proposal
  readonly answers: readonly { readonly stopId: string; readonly answer: string }[]
  readonly evidence: DecisionEvidence
  readonly evidenceHash: string
}

/** A coil, spool or resin batch that went into the lot, and where along it where that is known. */
export interface LotMaterialView {
  readonly role: LotMaterialRole
  /** From 1 within the role, along the lot. */
  readonly place: number
  readonly code: string
  readonly name: string
  readonly kind: MaterialInKind
  readonly heat: string
  readonly parentCode: string | undefined
  readonly fromMetre: number | undefined
  readonly toMetre: number | undefined
}

export interface HistoryEntry {
  readonly sequence: number
  /** What it was done to: the lot, or the import that brought it. */
  readonly subject: string
  readonly at: number
  readonly person: string | undefined
  readonly verb: string
  readonly body: Readonly<Record<string, unknown>>
}

/** The control limits in force at the lot's place, SI. */
export interface ControlLimits {
  readonly characteristic: string
  readonly statistic: ChartedStatistic
  readonly number: number
  readonly centre: number
  readonly sigma: number
  readonly lower: number | undefined
  readonly upper: number | undefined
  readonly provisional: boolean
}

export interface LotView {
  readonly lot: {
    readonly code: string
    readonly state: LotState
    readonly version: number
    readonly evidenceChanged: boolean
    readonly madeAt: number
    readonly madeBy: string | undefined
    readonly lengthMetres: number | undefined
    readonly setting: string
    readonly createdAt: number
    readonly machine: { readonly code: string; readonly name: string } | undefined
    readonly die: { readonly code: string; readonly name: string } | undefined
  }
  readonly product: { readonly code: string; readonly name: string; readonly construction: string }
  readonly material: { readonly code: string; readonly name: string }
  /** What it is made of, by role and place. */
  readonly materials: readonly LotMaterialView[]
  readonly specification: {
    readonly number: number
    readonly effectiveFrom: number
    readonly body: SpecificationBody
  }
  readonly works: WorksFacts
  readonly specimens: readonly SpecimenView[]
  readonly assessment: LotAssessment
  readonly controlLimits: readonly ControlLimits[]
  /** Signals whose pattern the lot belongs to, newest first. */
  readonly signals: readonly SignalView[]
  /** Newest first. */
  readonly dispositions: readonly DispositionView[]
  /** What the ledger says about the lot, oldest first. */
  readonly history: readonly HistoryEntry[]
}

/**
 * Everything about one lot. Each evaluation in force is computed again from what is stored, which gives its
 * budgets and corrections and shows whether the stored results are still what the readings come to.
 * @throws LedgerlineError not-found; not-permitted (sales reads released lots only)
 */
export async function getLot(actor: Actor | undefined, code: string): Promise<LotView> {
  permit(actor, 'lots.read-released')
  const { read } = database()
  const lot = await findLotByCode(read, code)
  if (!lot) throw problem('not-found', `There is no lot ${code}.`)
  if (lot.state !== 'released') permit(actor, 'lots.read')
  const loaded = await loadLot(read, lot)
  const dispositions = await listDispositions(read, lot.id)
  const materials = (await listLotMaterials(read, [lot.id])).get(lot.id) ?? []
  const own = await listLedgerOf(read, `lot ${lot.code}`)
  // What came from a file was stored with others in one entry, which carries the same instant.
  const written = [
    lot.createdAt,
    ...loaded.specimens.flatMap((one) => one.readings.map((reading) => reading.recordedAt)),
  ]
  const batches = await listImportBatches(read, [...new Set(written)])
  const imports = batches.filter(
    (one, index) => batches.findIndex(({ subject }) => subject === one.subject) === index,
  )
  const ledger = [...own, ...imports].sort((a, b) => a.sequence - b.sequence)
  const names = await listPersonNames(
    read,
    [
      lot.makerId,
      ...loaded.specimens.flatMap((one) => one.readings.map((reading) => reading.personId)),
      ...dispositions.map((one) => one.decidedById),
      ...ledger.map((one) => one.personId),
    ].flatMap((id) => id ?? []),
  )
  const nameOf = (id: number | undefined) => (id === undefined ? undefined : names.get(id))
  return {
    lot: {
      code: lot.code,
      state: lot.state,
      version: lot.version,
      evidenceChanged: lot.evidenceChanged,
      madeAt: lot.madeAt,
      madeBy: nameOf(lot.makerId),
      lengthMetres: lot.lengthMetres,
      setting: lot.setting,
      createdAt: lot.createdAt,
      machine: lot.machine && { code: lot.machine.code, name: lot.machine.name },
      die: lot.die && { code: lot.die.code, name: lot.die.name },
    },
    product: {
      code: lot.product.code,
      name: lot.product.name,
      construction: lot.product.construction,
    },
    material: { code: loaded.revision.material.code, name: loaded.revision.material.name },
    materials: materials.map(({ lotId: _, materialInId: __, ...one }) => one),
    specification: {
      number: loaded.revision.number,
      effectiveFrom: loaded.revision.effectiveFrom,
      body: loaded.revision.specification,
    },
    works: loaded.works,
    specimens: loaded.specimens.map((one) =>
      specimenView(
        one,
        loaded.assessment.specimens.find((assessed) => assessed.number === one.number),
        nameOf,
      ),
    ),
    assessment: loaded.assessment,
    controlLimits: await controlLimitsAt(read, lot),
    signals: loaded.signals,
    dispositions: dispositions.map(({ decidedById, proposal, evidence, id: _, ...one }) => {
      const kept = JSON.parse(proposal) as Pick<DispositionView, 'proposal' | 'answers'>
      return {
        ...one,
        decidedBy: nameOf(decidedById),
        proposal: kept.proposal,
        answers: kept.answers,
        evidence: JSON.parse(evidence) as DecisionEvidence,
      }
    }),
    history: ledger.map(({ sequence, subject, at, personId, verb, body }) => ({
      sequence,
      subject,
      at,
      person: nameOf(personId),
      verb,
      body: JSON.parse(body) as Readonly<Record<string, unknown>>,
    })),
  }
}

async function controlLimitsAt(tx: Tx, lot: LotRow): Promise<readonly ControlLimits[]> {
  const sets = await listLimitSets(tx, lot.product.id)
  const charts = [...new Set(sets.map((one) => `${one.characteristic} ${one.statistic}`))]
  return charts.flatMap((chart): ControlLimits[] => {
    const own = sets.filter((one) => `${one.characteristic} ${one.statistic}` === chart)
    const inForce = limitsAt(own.map(frozenLimitsOf), lot.madeAt)
    const set = own.find((one) => one.id === inForce?.id)
    return set
      ? [
          {
            characteristic: set.characteristic,
            statistic: statisticOf(set.statistic),
            number: set.number,
            centre: set.centre,
            sigma: set.sigma,
            lower: set.lower,
            upper: set.upper,
            provisional: set.provisional,
          },
        ]
      : []
  })
}
