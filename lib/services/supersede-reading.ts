import type { Actor } from '@/lib/access/actor'
import { may, permit } from '@/lib/access/permit'
import { database } from '@/lib/data/database'
import { sha256 } from '@/lib/data/hash'
import { lockLot } from '@/lib/data/locks'
import { getLotRow } from '@/lib/data/lots'
import { findReadingPlace } from '@/lib/data/specimens'
import { storePlan } from '@/lib/data/store-plan'
import { problem } from '@/lib/domain/errors'
import { isFinal, type LotState } from '@/lib/domain/record/lot-state'
import { planSpecimenWrite } from '@/lib/domain/record/plan-specimen-write'
import type { SpecimenWritePlan } from '@/lib/domain/record/write-plan'
import type { SpecimenEntry } from '@/lib/domain/record/write-state'
import type { SupersedeReadingInput } from '@/lib/input/specimen'
import { checkEquipment } from './check-equipment'
import { once } from './once'
import { appendPlanLedger } from './record-specimens'
import { refusal } from './refusal'
import { loadWriteState } from './write-state'

export interface SupersedeReply {
  readonly lotCode: string
  readonly specimen: number
  readonly lotState: LotState
  readonly lotVersion: number
  readonly signalsRaised: number
  /** Decisions and published datasheets that rested on the older value and are marked now. */
  readonly evidenceChanged: { readonly decisions: number; readonly datasheets: number }
  readonly storedAt: number
}

/**
 * Corrects one act of one specimen: a further reading with a reason takes the place of the older one, which
 * stays readable. What was decided or published on the older value is marked.
 * @throws LedgerlineError not-permitted (readings of others, or of a decided lot, without that right), not-found,
 *   conflict when someone corrected the same reading meanwhile
 */
export async function supersedeReading(
  actor: Actor | undefined,
  input: SupersedeReadingInput,
  at: number = Date.now(),
): Promise<SupersedeReply> {
  permit(actor, 'readings.supersede-own')
  return database().write(async (tx) => {
    const place = await findReadingPlace(tx, input.supersedes)
    if (!place)
      throw problem('not-found', 'There is no such reading.', {
        where: 'supersedes',
        mend: 'Load the lot again and choose the reading to correct.',
      })
    await lockLot(tx, place.lot.id)
    let plan: SpecimenWritePlan | undefined
    const { reply } = await once(
      tx,
      { requestId: input.requestId, personId: actor.personId, input, at },
      async () => {
        const lot = await getLotRow(tx, place.lot.id)
        const own = place.personId === actor.personId
        if ((!own || isFinal(lot.state)) && !may(actor, 'readings.supersede-any'))
          permit(actor, 'readings.supersede-any')
        const { state, equipment } = await loadWriteState(tx, lot)
        const entry: SpecimenEntry = {
          specimen: place.specimen,
          reading: {
            clientId: input.reading.clientId,
            kind: input.reading.kind,
            values: input.reading.sheet,
            equipment: input.reading.equipment,
            measuredAt: input.reading.measuredAt ?? at,
            supersedes: input.supersedes,
            reason: input.reason,
          },
        }
        checkEquipment(equipment, [entry])
        const planned = planSpecimenWrite(state, [entry], actor, at, sha256)
        if (!planned.ok) throw refusal(planned.problems)
        plan = planned.value
        await storePlan(tx, plan, equipment)
        return replyOf(plan, place, at)
      },
    )
    await appendPlanLedger(tx, plan)
    return reply
  })
}

const replyOf = (
  plan: SpecimenWritePlan,
  place: { readonly lot: { readonly code: string }; readonly specimen: { readonly number: number } },
  at: number,
): SupersedeReply => ({
  lotCode: place.lot.code,
  specimen: place.specimen.number,
  lotState: plan.lot.state,
  lotVersion: plan.lot.version,
  signalsRaised: plan.signals.reduce((sum, chart) => sum + chart.raised.length, 0),
  evidenceChanged: {
    decisions: plan.evidenceChanged.dispositions.length,
    datasheets: plan.evidenceChanged.datasheetRevisions.length,
  },
  storedAt: at,
})
