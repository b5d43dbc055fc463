import type { Actor } from '@/lib/access/actor'
import { may, permit } from '@/lib/access/permit'
import { database } from '@/lib/data/database'
import { gauges } from '@/lib/data/gauges'
import { countLotRows, type LotRow, listLotRows } from '@/lib/data/lots'
import type { LotState } from '@/lib/domain/record/lot-state'
import { listSignals } from './list-signals'
import type { SignalView } from './signal-views'

export interface WaitingLot {
  readonly code: string
  readonly productName: string
  readonly machine: string | undefined
  readonly madeAt: number
  readonly specimens: number
  readonly evidenceChanged: boolean
  /** Unanswered signals that this lot belongs to. */
  readonly signals: number
}

export interface TodayFacts {
  readonly signals: readonly SignalView[]
  readonly toDecide: { readonly lots: readonly WaitingLot[]; readonly count: number }
  readonly held: { readonly lots: readonly WaitingLot[]; readonly count: number }
  readonly toMeasure: { readonly lots: readonly WaitingLot[]; readonly count: number }
  readonly equipmentDue: readonly {
    readonly code: string
    readonly name: string
    readonly dueAt: number
    readonly overdue: boolean
  }[]
  readonly released: number
}

const SHOWN = 12
const DUE_WITHIN = 30 * 24 * 3600_000

/** What waits, for the desks that measure and decide; sales sees how many lots are released. */
export async function getToday(actor: Actor | undefined, at: number = Date.now()): Promise<TodayFacts> {
  permit(actor, 'settings.read')
  const { read } = database()
  const released = await countLotRows(read, { states: ['released'] })
  const none = { lots: [], count: 0 }
  if (!may(actor, 'lots.read'))
    return { signals: [], toDecide: none, held: none, toMeasure: none, equipmentDue: [], released }
  const open = await listSignals(actor)
  const signalsOf = (lotId: number): number => open.filter((one) => one.memberIds.includes(lotId)).length
  const waitingOf = (row: LotRow & { readonly specimenCount: number }): WaitingLot => ({
    code: row.code,
    productName: row.product.name,
    machine: row.machine?.name,
    madeAt: row.madeAt,
    specimens: row.specimenCount,
    evidenceChanged: row.evidenceChanged,
    signals: signalsOf(row.id),
  })
  const inState = async (state: LotState) => ({
    lots: (await listLotRows(read, { states: [state] }, { skip: 0, take: SHOWN })).map(waitingOf),
    count: await countLotRows(read, { states: [state] }),
  })
  const due = (await gauges.list(read))
    .filter(
      (gauge) =>
        gauge.active && gauge.calibrationDueAt !== undefined && gauge.calibrationDueAt < at + DUE_WITHIN,
    )
    .sort((a, b) => (a.calibrationDueAt ?? 0) - (b.calibrationDueAt ?? 0))
  return {
    signals: open,
    toDecide: await inState('to-decide'),
    held: await inState('held'),
    toMeasure: await inState('measuring'),
    equipmentDue: due.map(({ calibrationDueAt = 0, code, name }) => ({
      code,
      name,
      dueAt: calibrationDueAt,
      overdue: calibrationDueAt < at,
    })),
    released,
  }
}
