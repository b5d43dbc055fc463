import type { Actor } from '@/lib/access/actor'
import { permit } from '@/lib/access/permit'
import { database, type Tx } from '@/lib/data/database'
import { type DispositionRow, insertDisposition, listDispositions } from '@/lib/data/dispositions'
import { sha256 } from '@/lib/data/hash'
import { appendLedger } from '@/lib/data/ledger'
import { frozenLimitsOf, type LimitSetRow, listLimitSets } from '@/lib/data/limit-sets'
import { lockLot, lockRow } from '@/lib/data/locks'
import { findLotId, getLotRow, type LotRow, updateLotState } from '@/lib/data/lots'
import { listPersonNames } from '@/lib/data/people-names'
import { problem } from '@/lib/domain/errors'
import { MODEL_VERSION } from '@/lib/domain/metrology/model-version'
import type { DispositionVerb, Stop } from '@/lib/domain/quality/propose-disposition'
import { canonicalJson } from '@/lib/domain/record/canonical-json'
import { limitsAt } from '@/lib/domain/record/chart-history'
import { isCharted, type LotState, stateAfter } from '@/lib/domain/record/lot-state'
import type { DecideLotInput } from '@/lib/input/decision'
import { askMachineRules, askRules } from './ask-rules'
import { changedMeanwhile } from './changed-meanwhile'
import { type LoadedLot, loadLot } from './lot-assessment'

export interface LotDecision {
  readonly lotCode: string
  readonly verb: DispositionVerb
  readonly number: number
  readonly state: LotState
  readonly lotVersion: number
}

/** What a decision rests on, as it is kept with it. */
export interface DecisionEvidence {
  readonly lot: string
  /** Version of the lot that was decided on. */
  readonly lotVersion: number
  readonly modelVersion: string
  readonly specificationRevision: number
  readonly evaluations: readonly {
    readonly specimen: number
    readonly evaluation: number
    readonly inputHash: string
  }[]
  readonly limitSets: readonly {
    readonly characteristic: string
    readonly statistic: string
    readonly number: number
  }[]
  readonly signals: readonly {
    readonly id: number
    readonly sentence: string
    readonly state: string
    readonly cause: string
  }[]
}

/** Decisions after which the lot may reach a customer: everything that stops a proposal has to be answered. */
const leavesTheWorks: readonly DispositionVerb[] = ['release', 'concession']

/**
 * A named person decides a lot and says why. The proposal as it was shown and the evidence it rests on are kept
 * with the decision. Two people at once: one decides, the other is told by whom it was decided.
 * @throws LedgerlineError not-permitted, not-found, already-decided, conflict (the lot changed since it was
 *   looked at), not-ready (unanswered signals or stops before a release)
 */
export async function decideLot(
  actor: Actor | undefined,
  lotCode: string,
  input: DecideLotInput,
  at: number = Date.now(),
): Promise<LotDecision> {
  permit(actor, 'lots.decide')
  return database().write(async (tx) => {
    const lotId = await findLotId(tx, lotCode)
    if (lotId === undefined) throw problem('not-found', `There is no lot ${lotCode}.`)
    await lockLot(tx, lotId)
    const lot = await getLotRow(tx, lotId)
    const before = await listDispositions(tx, lotId)
    if (lot.version !== input.lotVersion) throw await meanwhile(tx, lot, before[0], input.lotVersion)
    // Signals of the product stay as they are read here until the decision is stored.
    await lockRow(tx, 'Product', lot.product.id)
    const loaded = await loadLot(tx, lot)
    const { proposal } = loaded.assessment
    if (leavesTheWorks.includes(input.verb)) requireAnswers(input, lot, proposal.stops)

    const evidence = canonicalJson(await evidenceOf(tx, lot, loaded))
    const number = (before[0]?.number ?? 0) + 1
    const state = stateAfter[input.verb]
    await insertDisposition(tx, {
      lotId,
      number,
      verb: input.verb,
      reason: input.reason,
      decidedAt: at,
      decidedById: actor.personId,
      proposal: canonicalJson({
        proposal,
        judgements: loaded.assessment.judgements,
        summaries: loaded.assessment.summaries,
        answers: input.answers,
      }),
      evidence,
      evidenceHash: sha256(evidence),
    })
    if (!(await updateLotState(tx, lot, { state, evidenceChanged: false })))
      throw changedMeanwhile(`Lot ${lot.code}`)
    // A lot that is decided before its plan is complete comes onto the charts now.
    if (!isCharted(lot.state)) {
      await askRules(tx, lot.product.id)
      await askMachineRules(tx, lot.product.id)
    }
    await appendLedger(tx, {
      at,
      personId: actor.personId,
      verb: `decide-${input.verb}`,
      subject: `lot ${lot.code}`,
      body: {
        lot: lot.code,
        number,
        verb: input.verb,
        proposed: proposal.verb ?? null,
        reason: input.reason,
        answers: input.answers,
        state: { from: lot.state, to: state },
        evidenceHash: sha256(evidence),
      },
    })
    return { lotCode: lot.code, verb: input.verb, number, state, lotVersion: lot.version + 1 }
  })
}

async function meanwhile(tx: Tx, lot: LotRow, newest: DispositionRow | undefined, seen: number) {
  const decidedOn = newest ? (JSON.parse(newest.evidence) as DecisionEvidence).lotVersion : 0
  if (!newest || decidedOn < seen) return changedMeanwhile(`Lot ${lot.code}`)
  const id = newest.decidedById
  const name = id === undefined ? undefined : (await listPersonNames(tx, [id])).get(id)
  return problem(
    'already-decided',
    `Lot ${lot.code} was decided in the meantime${name ? ` by ${name}` : ''}: ${newest.verb}.`,
    {
      mend: 'Load the page again to see the decision and its reason.',
      details: { decidedBy: name ?? null, verb: newest.verb, decidedAt: newest.decidedAt },
    },
  )
}

/** A signal is answered where it stands, in Drift; every other stop here, in words. */
function requireAnswers(input: DecideLotInput, lot: LotRow, stops: readonly Stop[]): void {
  const signals = stops.filter((stop) => stop.id.startsWith('signal-'))
  if (signals.length > 0)
    throw problem(
      'not-ready',
      `Lot ${lot.code} has ${signals.length === 1 ? 'a signal' : `${signals.length} signals`} without an answer.`,
      {
        where: 'signals',
        mend: 'Answer each signal first: a control chart never rejects a lot, but it asks.',
        details: Object.fromEntries(signals.map((stop) => [stop.id, stop.text])),
      },
    )
  const answered = new Set(input.answers.map((one) => one.stopId))
  const open = stops.filter((stop) => !stop.id.startsWith('signal-') && !answered.has(stop.id))
  if (open.length > 0)
    throw problem('not-ready', `To be answered first: ${open.map((stop) => stop.text).join(' ')}`, {
      where: 'answers',
      mend: 'Say for each why the lot may go all the same, or hold it.',
      details: Object.fromEntries(open.map((stop) => [stop.id, stop.text])),
    })
}

async function evidenceOf(tx: Tx, lot: LotRow, loaded: LoadedLot): Promise<DecisionEvidence> {
  const sets = await listLimitSets(tx, lot.product.id)
  const isInForce = ({ characteristic, id, statistic }: LimitSetRow): boolean => {
    const own = sets.filter((one) => one.characteristic === characteristic && one.statistic === statistic)
    return limitsAt(own.map(frozenLimitsOf), lot.madeAt)?.id === id
  }
  return {
    lot: lot.code,
    lotVersion: lot.version,
    modelVersion: MODEL_VERSION,
    specificationRevision: loaded.revision.number,
    evaluations: loaded.specimens.flatMap(({ number, evaluation }) =>
      evaluation
        ? [{ specimen: number, evaluation: evaluation.number, inputHash: evaluation.inputHash }]
        : [],
    ),
    limitSets: sets
      .filter(isInForce)
      .map(({ characteristic, number, statistic }) => ({ characteristic, statistic, number })),
    signals: loaded.signals.map(({ id, sentence, state, cause }) => ({ id, sentence, state, cause })),
  }
}
