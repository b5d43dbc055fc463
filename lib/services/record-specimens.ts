import type { Actor } from '@/lib/access/actor'
import { permit } from '@/lib/access/permit'
import { database, type Tx } from '@/lib/data/database'
import { sha256 } from '@/lib/data/hash'
import { appendLedger } from '@/lib/data/ledger'
import { lockLot } from '@/lib/data/locks'
import { findLotId, getLotRow } from '@/lib/data/lots'
import { storePlan } from '@/lib/data/store-plan'
import { problem } from '@/lib/domain/errors'
import { isFinal, type LotState } from '@/lib/domain/record/lot-state'
import { planSpecimenWrite } from '@/lib/domain/record/plan-specimen-write'
import type { SpecimenWritePlan } from '@/lib/domain/record/write-plan'
import type { SpecimenEntry } from '@/lib/domain/record/write-state'
import type { RecordSpecimensInput, SpecimenEntryInput } from '@/lib/input/specimen'
import { checkEquipment } from './check-equipment'
import { once } from './once'
import { refusal } from './refusal'
import { loadWriteState } from './write-state'

/** How far a clock at the bench may run ahead. */
const CLOCK_SLACK_MS = 5 * 60_000

export interface RecordedSpecimen {
  readonly number: number
  /** `already-there`: equal content was stored before, nothing was written. */
  readonly outcome: 'stored' | 'already-there'
}

/** The stored reply: the same for the same request, however often it is sent. */
export interface RecordReply {
  readonly lotCode: string
  readonly lotState: LotState
  readonly lotVersion: number
  readonly specimens: readonly RecordedSpecimen[]
  /** Signals that these readings raised. */
  readonly signalsRaised: number
  readonly storedAt: number
}

/**
 * Records specimens of a lot in one transaction: all of them, or none. Sent again with the same id it answers
 * as before. `at` is for scripts that load what happened in the past.
 * @throws LedgerlineError not-permitted, not-found, bad-input (equipment that is not registered, a time to come),
 *   conflict (other values stored for the same reading; an id used for something else)
 */
export async function recordSpecimens(
  actor: Actor | undefined,
  input: RecordSpecimensInput,
  at: number = Date.now(),
): Promise<RecordReply> {
  permit(actor, 'readings.record')
  return database().write(async (tx) => {
    const lotId = await findLotId(tx, input.lotCode)
    if (lotId === undefined)
      throw problem('not-found', `There is no lot ${input.lotCode}.`, {
        where: 'lotCode',
        mend: 'Open the lot first.',
      })
    await lockLot(tx, lotId)
    let plan: SpecimenWritePlan | undefined
    const { reply } = await once(
      tx,
      { requestId: input.requestId, personId: actor.personId, input, at },
      async () => {
        const lot = await getLotRow(tx, lotId)
        // What leaves the shelf rests on its readings: only those who may correct it may add to it.
        if (isFinal(lot.state)) permit(actor, 'readings.supersede-any')
        const { state, equipment } = await loadWriteState(tx, lot, input.entries.length)
        const entries = input.entries.map((entry) => entryOf(entry, at))
        checkEquipment(equipment, entries)
        const planned = planSpecimenWrite(state, entries, actor, at, sha256)
        if (!planned.ok) throw refusal(planned.problems)
        plan = planned.value
        await storePlan(tx, plan, equipment)
        return replyOf(input, plan, at)
      },
    )
    await appendPlanLedger(tx, plan)
    return reply
  })
}

function entryOf({ specimen, reading }: SpecimenEntryInput, at: number): SpecimenEntry {
  const measuredAt = reading.measuredAt ?? at
  if (measuredAt > at + CLOCK_SLACK_MS)
    throw problem('bad-input', `Specimen ${specimen.number} can’t have been measured in the future.`, {
      where: 'measuredAt',
      mend: 'Set the clock of this device.',
    })
  const { clientId, kind, sheet, equipment } = reading
  return { specimen, reading: { clientId, kind, values: sheet, equipment, measuredAt } }
}

function replyOf(input: RecordSpecimensInput, plan: SpecimenWritePlan, at: number): RecordReply {
  return {
    lotCode: input.lotCode,
    lotState: plan.lot.state,
    lotVersion: plan.ledger === undefined ? plan.lot.version - 1 : plan.lot.version,
    specimens: input.entries.map(({ specimen: { number } }) => ({
      number,
      outcome: plan.alreadyThere.includes(number) ? 'already-there' : 'stored',
    })),
    signalsRaised: plan.signals.reduce((sum, chart) => sum + chart.raised.length, 0),
    storedAt: at,
  }
}

/** The last write of a transaction that stored a plan. */
export async function appendPlanLedger(tx: Tx, plan: SpecimenWritePlan | undefined): Promise<void> {
  if (plan?.ledger) await appendLedger(tx, plan.ledger)
}
