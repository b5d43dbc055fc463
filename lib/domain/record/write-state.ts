import type { CharacteristicId } from '../metrology/characteristics'
import type { EvaluationContext, SpecimenEvaluation } from '../metrology/evaluation'
import type { ChartedStatistic, ChartHistory, StoredSignal } from './chart-history'
import type { EvaluationFacts } from './evaluation-facts'
import type { LotState } from './lot-state'
import type { EquipmentCodes, ReadingFact, ReadingKind, SheetPart } from './reading'

/** What is already stored about a lot, as the plan of a further entry needs it. Instants are epoch milliseconds. */
export interface LotWriteState {
  readonly lot: {
    readonly id: number
    readonly code: string
    readonly state: LotState
    readonly version: number
    readonly evidenceChanged: boolean
    readonly productId: number
    readonly machineId: number | null
    readonly madeAt: number
    /** When the first of its readings was taken. */
    readonly measuredAt?: number
  }
  readonly facts: EvaluationFacts
  readonly specimens: readonly SpecimenState[]
  /** Charts of the product that have a limit set; the lot itself may be among the points or not. */
  readonly charts: readonly ChartHistory[]
  /** Charts of the other products that the lot’s machine makes, and the signals of the machine’s own chart. */
  readonly machine?: {
    readonly id: number
    readonly products: readonly { readonly productId: number; readonly charts: readonly ChartHistory[] }[]
    readonly signals: readonly MachineSignals[]
  }
  /** The decision in force. */
  readonly disposition?: {
    readonly id: number
    readonly evidenceChanged: boolean
    readonly decidedAt: number
  }
  /** Published revisions that rest on this lot and are not marked yet. */
  readonly datasheetRevisions: readonly number[]
}

/** Signals kept for one chart of a machine. */
export interface MachineSignals {
  readonly characteristic: CharacteristicId
  readonly statistic: ChartedStatistic
  readonly signals: readonly StoredSignal[]
}

export interface SpecimenState {
  readonly clientId: string
  readonly number: number
  readonly createdAt: number
  /** In the order they were recorded. */
  readonly readings: readonly ReadingFact[]
  /** Of the newest evaluation; undefined before the first. */
  readonly evaluation?: {
    readonly number: number
    readonly at: number
    readonly inputHash: string
    readonly context: EvaluationContext
    readonly results: SpecimenEvaluation['results']
  }
}

/** One entry: a first sheet, an addition by a second person, or (with `supersedes`) a correction. */
export interface SpecimenEntry {
  readonly specimen: { readonly clientId: string; readonly number: number }
  readonly reading: {
    readonly clientId: string
    readonly kind: ReadingKind
    readonly values: SheetPart
    readonly equipment: EquipmentCodes
    readonly measuredAt: number
    /** Who measured, where that is not the person who enters it. */
    readonly personId?: number
    readonly supersedes?: string
    readonly reason?: string
  }
}
