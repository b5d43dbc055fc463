import type { EvaluationContext } from '@/lib/domain/metrology/evaluation'
import type { SpecimenSheet } from '@/lib/domain/metrology/sheet'
import type { InspectionPlan } from '@/lib/domain/metrology/specification'

/** Everything the bench sheet of one lot needs; made by the page from the bench service. */
export interface BenchView {
  readonly personId: number
  readonly lot: {
    readonly code: string
    readonly productName: string
    readonly productCode: string
    /** One line under the title: material, machine, die, made when and by whom. */
    readonly line: string
    readonly state: string
  }
  readonly plan: InspectionPlan
  readonly context: EvaluationContext
  readonly equipment: {
    readonly rig?: string
    readonly micrometer?: string
    readonly balance?: string
    readonly rule?: string
    readonly counter?: string
  }
  /** Display units by what is shown. */
  readonly units: {
    readonly diameter: string
    readonly length: string
    readonly mass: string
    readonly massPerLength: string
    readonly force: string
  }
  readonly decimal: 'point' | 'comma'
  /** Specimens already stored. */
  readonly stored: readonly {
    readonly number: number
    readonly sheet: SpecimenSheet
    readonly storedAt: string
  }[]
  /** Texts of the foot: rig, equipment with due dates, and a sentence of the control position if any. */
  readonly rigLine: string
  readonly equipmentLines: readonly {
    readonly text: string
    readonly due?: string
    readonly soon?: boolean
    readonly overdue: boolean
  }[]
  readonly driftLine?: string
}
