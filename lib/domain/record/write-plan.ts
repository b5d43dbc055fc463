import type { CharacteristicId } from '../metrology/characteristics'
import type { LotSummaryBody } from '../quality/lot-summary'
import type { ChartedStatistic } from './chart-history'
import type { LotState } from './lot-state'
import type { EquipmentCodes, ReadingKind } from './reading'
import type { RaisedSignal, SignalChange } from './reconcile-signals'
import type { ResultRow } from './result-row'

/**
 * Everything that one entry writes, as plain rows: two executors store it, and neither computes anything. Rows
 * that have no key yet are named by their client ids and by the numbers a person knows. Instants are epoch
 * milliseconds; bodies are canonical JSON.
 */
export interface SpecimenWritePlan {
  readonly lot: LotRowChange
  readonly specimens: readonly SpecimenRow[]
  readonly readings: readonly ReadingRow[]
  readonly snapshots: readonly SnapshotRow[]
  readonly evaluations: readonly EvaluationRow[]
  /** The lot's whole summary; a characteristic that is not in it any more is removed. */
  readonly summaries: readonly SummaryRow[]
  readonly signals: readonly SignalRows[]
  readonly evidenceChanged: {
    readonly dispositions: readonly number[]
    readonly datasheetRevisions: readonly number[]
  }
  /** Undefined when nothing was written. */
  readonly ledger: LedgerDraft | undefined
  /** Numbers of specimens whose entry was there already. */
  readonly alreadyThere: readonly number[]
}

export interface LotRowChange {
  readonly id: number
  readonly state: LotState
  readonly evidenceChanged: boolean
  readonly version: number
  /** When the first of its readings was taken; undefined before there is any. */
  readonly measuredAt?: number
}

export interface SpecimenRow {
  readonly clientId: string
  readonly lotId: number
  readonly number: number
  readonly takenAt: string
  readonly createdAt: number
}

export interface ReadingRow {
  readonly clientId: string
  readonly specimenClientId: string
  readonly kind: ReadingKind
  readonly body: string
  readonly hash: string
  readonly personId: number
  readonly measuredAt: number
  readonly recordedAt: number
  readonly equipment: EquipmentCodes
  readonly supersedes?: string
  readonly reason: string
}

export interface SnapshotRow {
  readonly hash: string
  readonly body: string
  readonly createdAt: number
}

export type EvaluationCause =
  | 'first'
  | 'superseded'
  | 'calibration'
  | 'rig'
  | 'material'
  | 'settings'
  | 'model'

/** With its wide row; the specimen's pointer moves to it. */
export interface EvaluationRow {
  readonly specimenClientId: string
  readonly number: number
  readonly modelVersion: string
  readonly snapshotHash: string
  readonly inputHash: string
  readonly cause: EvaluationCause
  readonly at: number
  readonly result: ResultRow
}

export interface SummaryRow extends LotSummaryBody {
  readonly lotId: number
  readonly characteristic: CharacteristicId
  readonly modelVersion: string
  readonly productId: number
  readonly machineId: number | null
  readonly madeAt: number
}

export interface SignalRows {
  /** Of the lots of the chart; on a machine’s chart of the lot that was written, and each signal names its own. */
  readonly productId: number
  /** Set for the chart of a machine over its products. */
  readonly machineId?: number
  readonly characteristic: CharacteristicId
  readonly statistic: ChartedStatistic
  readonly raised: readonly RaisedSignal[]
  readonly changed: readonly SignalChange[]
}

/** A ledger entry before it has its place in the chain. */
export interface LedgerDraft {
  readonly at: number
  readonly personId: number | null
  readonly verb: string
  readonly subject: string
  readonly body: Readonly<Record<string, unknown>>
}
